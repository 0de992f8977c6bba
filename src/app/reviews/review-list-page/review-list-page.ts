import { ChangeDetectionStrategy, Component, computed } from '@angular/core';
import { RouterLink } from '@angular/router';
import { listReviews } from '#shared/contract/calibrations';
import { endpointResource } from '../../data/api';
import { FigureBlock } from '../../ui/figure-block';
import { Loaded } from '../../ui/page-state/loaded';
import { PageState } from '../../ui/page-state/page-state';
import { EmptyState } from '../../ui/states/empty-state';
import { MomentPipe } from '../../ui/values/moment-pipe';
import { doubtWords } from '../doubt-words';
import { ReviewStatus } from '../review-status';

/** All reviews of instruments found out of tolerance, open ones first. */
@Component({
  selector: 'qr-review-list-page',
  imports: [EmptyState, FigureBlock, Loaded, MomentPipe, PageState, ReviewStatus, RouterLink],
  templateUrl: './review-list-page.html',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ReviewListPage {
  protected readonly reviews = endpointResource(listReviews, () => ({}));
  protected readonly open = computed(() =>
    this.reviews.hasValue() ? this.reviews.value().items.filter(({ closedAt }) => closedAt === null).length : null,
  );
  protected readonly doubtWords = doubtWords;
}
