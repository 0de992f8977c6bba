import { ChangeDetectionStrategy, Component, input } from '@angular/core';
import { RouterLink } from '@angular/router';
import { type YieldRow } from '#shared/contract/yields';
import { CountPipe } from '../../ui/values/count-pipe';
import { shareText } from '../share-text';
import { ScrollRegion } from '../../ui/scroll-region';

/** Yields as a table: every share with the counts it comes from, and the total below. */
@Component({
  selector: 'qr-yield-table',
  imports: [CountPipe, RouterLink, ScrollRegion],
  templateUrl: './yield-table.html',
  styles: `
    .name {
      max-width: 360px;
      overflow-wrap: break-word;
    }
    .quiet {
      margin-left: 6px;
    }
    tfoot td {
      border-top: 1px solid var(--qr-line-2);
      border-bottom: 0;
      font-weight: 600;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class YieldTable {
  /** Head of the first column: what the rows are. */
  readonly first = input.required<string>();
  /** Where the records of the rows are found by their key. */
  readonly area = input('');
  readonly rows = input.required<readonly YieldRow[]>();
  readonly total = input.required<YieldRow>();

  protected readonly share = shareText;
}
