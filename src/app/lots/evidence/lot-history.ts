import { ChangeDetectionStrategy, Component, input } from '@angular/core';
import { type Lot } from '#shared/contract/lots';
import { MomentPipe } from '../../ui/values/moment-pipe';

/** What happened to a lot, newest first, along one line; a rejection breaks it. */
@Component({
  selector: 'qr-lot-history',
  imports: [MomentPipe],
  template: `
    <h2>History</h2>
    <ol>
      @for (line of lines(); track $index) {
        <li [class]="line.tone">
          <time [attr.datetime]="line.at">{{ line.at | moment }}</time>
          <div>
            <b>{{ line.what }}</b>
            <p>{{ line.person }}{{ line.detail ? ', ' + line.detail : '' }}</p>
          </div>
        </li>
      }
    </ol>
  `,
  styleUrl: './lot-history.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class LotHistory {
  readonly lines = input.required<Lot['history']>();
}
