import { ChangeDetectionStrategy, Component, input } from '@angular/core';
import { type Lot, LOT_STATUS_TITLES } from '#shared/contract/lots';
import { CountPipe } from '../../ui/values/count-pipe';
import { MomentPipe } from '../../ui/values/moment-pipe';

/** What was booked in, and who drew, submitted and decided. */
@Component({
  selector: 'qr-lot-facts',
  imports: [CountPipe, MomentPipe],
  templateUrl: './lot-facts.html',
  styles: `
    h2 {
      margin-bottom: 8px;
    }
    dd {
      overflow-wrap: anywhere;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class LotFacts {
  readonly lot = input.required<Lot>();

  protected readonly statuses = LOT_STATUS_TITLES;
}
