import {
  ChangeDetectionStrategy,
  Component,
  computed,
  effect,
  inject,
  input,
  numberAttribute,
  viewChild,
  viewChildren,
} from '@angular/core';
import { MatSnackBar } from '@angular/material/snack-bar';
import { closeReview, readReview, type Review } from '#shared/contract/calibrations';
import { endpointResource } from '../../data/api';
import { PageTitle } from '../../page-title';
import { may } from '../../session/may';
import { BackLink } from '../../shell/back-link';
import { type HoldsTyping } from '../../shell/leave-guard';
import { Loaded } from '../../ui/page-state/loaded';
import { PageState } from '../../ui/page-state/page-state';
import { EmptyState } from '../../ui/states/empty-state';
import { ReadOnlyNote } from '../../ui/states/read-only-note';
import { MomentPipe } from '../../ui/values/moment-pipe';
import { ReviewStatus } from '../review-status';
import { CloseReview } from './close-review';
import { LotAssessment } from './lot-assessment';
import { ReviewFacts } from './review-facts';

/** One review: what an instrument was found at, every lot and certificate that rests on it, and what is said of each. */
@Component({
  selector: 'qr-review-page',
  imports: [
    BackLink,
    CloseReview,
    EmptyState,
    Loaded,
    LotAssessment,
    MomentPipe,
    PageState,
    ReadOnlyNote,
    ReviewFacts,
    ReviewStatus,
  ],
  templateUrl: './review-page.html',
  styleUrl: './review-page.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ReviewPage implements HoldsTyping {
  private readonly snackBar = inject(MatSnackBar);
  private readonly lots = viewChildren(LotAssessment);
  private readonly closing = viewChild(CloseReview);

  readonly id = input.required({ transform: numberAttribute });

  protected readonly review = endpointResource(readReview, () => ({ params: { id: this.id() } }));
  protected readonly mayClose = may(closeReview);
  protected readonly sums = computed(() => {
    if (!this.review.hasValue()) return '';
    const { affected } = this.review.value();
    const readings = affected.reduce((sum, one) => sum + one.readings, 0);
    const certificates = affected.reduce((sum, one) => sum + one.certificates.length, 0);
    const counted = (count: number, one: string, many: string) => `${count} ${count === 1 ? one : many}`;
    return [
      counted(affected.length, 'lot', 'lots'),
      counted(readings, 'reading', 'readings'),
      counted(certificates, 'certificate', 'certificates'),
    ].join(', ');
  });

  constructor() {
    const title = inject(PageTitle);
    effect(() => {
      if (this.review.hasValue()) title.show(this.review.value().number);
    });
  }

  hasUnsaved(): boolean {
    return this.lots().some((lot) => lot.hasUnsaved()) || (this.closing()?.hasUnsaved() ?? false);
  }

  protected showClosed(review: Review): void {
    this.review.set(review);
    this.snackBar.open(`Review ${review.number} closed`);
  }
}
