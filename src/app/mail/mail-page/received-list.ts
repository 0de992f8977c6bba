import { ChangeDetectionStrategy, Component, computed, inject } from '@angular/core';
import { RouterLink } from '@angular/router';
import { listReceived } from '#shared/contract/mail';
import { ApiClient, endpointResource, type Reply } from '../../data/api';
import { MorePages } from '../../data/more-pages';
import { LoadMore } from '../../ui/load-more';
import { Loaded } from '../../ui/page-state/loaded';
import { PageState } from '../../ui/page-state/page-state';
import { EmptyState } from '../../ui/states/empty-state';
import { MomentPipe } from '../../ui/values/moment-pipe';

/** What the local mail fake has received, newest first. */
@Component({
  selector: 'qr-received-list',
  imports: [EmptyState, LoadMore, Loaded, MomentPipe, PageState, RouterLink],
  templateUrl: './received-list.html',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ReceivedList {
  private readonly api = inject(ApiClient);

  protected readonly first = endpointResource(listReceived, () => ({ query: {} }));
  protected readonly pages = new MorePages<Reply<typeof listReceived>['items'][number]>(
    computed(() => (this.first.hasValue() ? this.first.value() : undefined)),
    (after) => this.api.call(listReceived, { query: { after } }),
  );
}
