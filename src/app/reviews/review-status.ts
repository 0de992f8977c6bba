import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import { type Review } from '#shared/contract/calibrations';
import { VerdictChip } from '../ui/marks/verdict-chip';

/** Where a review stands: closed, or open with how many of its lots are assessed. */
@Component({
  selector: 'qr-review-status',
  imports: [VerdictChip],
  template: `<qr-verdict-chip [look]="of().closedAt ? 'ok' : 'hold'" [word]="word()" />`,
  styles: `
    qr-verdict-chip {
      font: 500 13px/18px var(--qr-sans);
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ReviewStatus {
  readonly of = input.required<Pick<Review, 'closedAt' | 'lots' | 'assessed'>>();

  protected readonly word = computed(() => {
    const { closedAt, lots, assessed } = this.of();
    if (closedAt !== null) return 'Closed';
    if (lots === 0) return 'Open, no lot rests on it';
    return `Open, ${assessed} of ${lots} assessed`;
  });
}
