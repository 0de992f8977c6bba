import { ChangeDetectionStrategy, Component, computed, inject } from '@angular/core';
import { RouterLink } from '@angular/router';
import { listMessages, type MessageHead } from '#shared/contract/mail';
import { ApiClient, endpointResource } from '../../data/api';
import { MorePages } from '../../data/more-pages';
import { LoadMore } from '../../ui/load-more';
import { Loaded } from '../../ui/page-state/loaded';
import { PageState } from '../../ui/page-state/page-state';
import { EmptyState } from '../../ui/states/empty-state';
import { MomentPipe } from '../../ui/values/moment-pipe';
import { MessageStatus } from '../message-status';

/** What was queued, newest first. */
@Component({
  selector: 'qr-outbox-list',
  imports: [EmptyState, LoadMore, Loaded, MessageStatus, MomentPipe, PageState, RouterLink],
  templateUrl: './outbox-list.html',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class OutboxList {
  private readonly api = inject(ApiClient);

  protected readonly first = endpointResource(listMessages, () => ({ query: {} }));
  protected readonly pages = new MorePages<MessageHead>(
    computed(() => (this.first.hasValue() ? this.first.value() : undefined)),
    (after) => this.api.call(listMessages, { query: { after } }),
  );
}
