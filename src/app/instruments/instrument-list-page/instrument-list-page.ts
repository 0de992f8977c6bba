import { ChangeDetectionStrategy, Component, computed } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { RouterLink } from '@angular/router';
import { listGaugeStudies } from '#shared/contract/gauge-studies';
import { addInstrument, INSTRUMENT_KIND_TITLES, listInstruments } from '#shared/contract/instruments';
import { endpointResource } from '../../data/api';
import { may } from '../../session/may';
import { FigureBlock } from '../../ui/figure-block';
import { Icon } from '../../ui/marks/icon';
import { Loaded } from '../../ui/page-state/loaded';
import { PageState } from '../../ui/page-state/page-state';
import { EmptyState } from '../../ui/states/empty-state';
import { InstrumentState } from '../instrument-state';

/** Days before the due date from which a calibration is worth a mark (common practice, no source). */
const WARNED_BEFORE = 30;

/** All instruments, the next calibration due first. */
@Component({
  selector: 'qr-instrument-list-page',
  imports: [EmptyState, FigureBlock, Icon, InstrumentState, Loaded, MatButton, PageState, RouterLink],
  templateUrl: './instrument-list-page.html',
  styles: `
    .serial {
      overflow-wrap: anywhere;
    }
    .state {
      display: grid;
      gap: 2px;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class InstrumentListPage {
  protected readonly instruments = endpointResource(listInstruments, () => ({}));
  protected readonly mayAdd = may(addInstrument);
  protected readonly maySeeStudies = may(listGaugeStudies);
  protected readonly kinds = INSTRUMENT_KIND_TITLES;

  protected readonly counts = computed(() => {
    if (!this.instruments.hasValue()) return null;
    const { items } = this.instruments.value();
    const days = items.filter(({ status }) => status === 'in-service').map(({ daysLeft }) => daysLeft);
    return {
      inService: days.length,
      soon: days.filter((left) => left >= 0 && left <= WARNED_BEFORE).length,
      past: days.filter((left) => left < 0).length,
      reviews: items.filter(({ openReview }) => openReview !== null).length,
    };
  });
}
