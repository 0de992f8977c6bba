import { ChangeDetectionStrategy, Component, effect, inject, input, numberAttribute } from '@angular/core';
import { RouterLink } from '@angular/router';
import { readNonconformance } from '#shared/contract/nonconformances';
import { endpointResource } from '../../data/api';
import { PageTitle } from '../../page-title';
import { BackLink } from '../../shell/back-link';
import { Loaded } from '../../ui/page-state/loaded';
import { PageState } from '../../ui/page-state/page-state';
import { MomentPipe } from '../../ui/values/moment-pipe';
import { NoticeList } from '../notice-list';
import { FailureSheet } from './failure-sheet';

/** One nonconformance: what failed with its readings, how the lot is contained, and who was told. */
@Component({
  selector: 'qr-nonconformance-page',
  imports: [BackLink, FailureSheet, Loaded, MomentPipe, NoticeList, PageState, RouterLink],
  templateUrl: './nonconformance-page.html',
  styles: `
    .stack {
      grid-template-columns: minmax(0, 1fr);
    }
    h2 {
      margin-bottom: 8px;
    }
    p {
      overflow-wrap: anywhere;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class NonconformancePage {
  readonly id = input.required({ transform: numberAttribute });

  protected readonly nonconformance = endpointResource(readNonconformance, () => ({ params: { id: this.id() } }));

  constructor() {
    const title = inject(PageTitle);
    effect(() => {
      if (this.nonconformance.hasValue()) title.show(this.nonconformance.value().number);
    });
  }
}
