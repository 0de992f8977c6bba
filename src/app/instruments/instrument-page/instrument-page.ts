import { ChangeDetectionStrategy, Component, effect, inject, input, numberAttribute } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { RouterLink } from '@angular/router';
import { readInstrumentHistory, recordCalibration } from '#shared/contract/calibrations';
import { changeInstrument, INSTRUMENT_KIND_TITLES, readInstrument } from '#shared/contract/instruments';
import { endpointResource } from '../../data/api';
import { PageTitle } from '../../page-title';
import { may } from '../../session/may';
import { BackLink } from '../../shell/back-link';
import { Loaded } from '../../ui/page-state/loaded';
import { PageState } from '../../ui/page-state/page-state';
import { MessageNote } from '../../ui/states/message-note';
import { ReadOnlyNote } from '../../ui/states/read-only-note';
import { MomentPipe } from '../../ui/values/moment-pipe';
import { InstrumentState } from '../instrument-state';
import { CalibrationsSheet } from './calibrations-sheet';
import { ChecksSheet } from './checks-sheet';
import { InstrumentFacts } from './instrument-facts';
import { RangesSheet } from './ranges-sheet';

/** One instrument: what it reads and how well, its calibrations and checks, and the reviews that rest on them. */
@Component({
  selector: 'qr-instrument-page',
  imports: [
    BackLink,
    CalibrationsSheet,
    ChecksSheet,
    InstrumentFacts,
    InstrumentState,
    Loaded,
    MatButton,
    MessageNote,
    MomentPipe,
    PageState,
    RangesSheet,
    ReadOnlyNote,
    RouterLink,
  ],
  templateUrl: './instrument-page.html',
  styleUrl: './instrument-page.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class InstrumentPage {
  private readonly title = inject(PageTitle);

  readonly id = input.required({ transform: numberAttribute });

  protected readonly instrument = endpointResource(readInstrument, () => ({ params: { id: this.id() } }));
  protected readonly history = endpointResource(readInstrumentHistory, () => ({ params: { id: this.id() } }));
  protected readonly mayChange = may(changeInstrument);
  protected readonly mayCalibrate = may(recordCalibration);
  protected readonly kinds = INSTRUMENT_KIND_TITLES;

  constructor() {
    effect(() => {
      if (this.instrument.hasValue()) this.title.show(this.instrument.value().assetNumber);
    });
  }

  protected reload(): void {
    this.history.reload();
    this.instrument.reload();
  }
}
