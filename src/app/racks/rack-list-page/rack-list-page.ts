import { ChangeDetectionStrategy, Component } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { RouterLink } from '@angular/router';
import { addRack, listRacks, type Rack } from '#shared/contract/racks';
import { endpointResource } from '../../data/api';
import { may } from '../../session/may';
import { Icon } from '../../ui/marks/icon';
import { Loaded } from '../../ui/page-state/loaded';
import { PageState } from '../../ui/page-state/page-state';
import { EmptyState } from '../../ui/states/empty-state';
import { CountPipe } from '../../ui/values/count-pipe';
import { MomentPipe } from '../../ui/values/moment-pipe';
import { lastUse, liveTokens } from '../token-use';

/** Part numbers named before the rest is only counted. */
const NAMED = 3;

/** The automated racks that measure, and whether they send by themselves. */
@Component({
  selector: 'qr-rack-list-page',
  imports: [CountPipe, EmptyState, Icon, Loaded, MatButton, MomentPipe, PageState, RouterLink],
  templateUrl: './rack-list-page.html',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class RackListPage {
  protected readonly racks = endpointResource(listRacks, () => ({}));
  protected readonly mayAdd = may(addRack);
  protected readonly lastUse = lastUse;
  protected readonly liveTokens = liveTokens;

  protected partsOf({ parts }: Rack): string {
    const named = parts.slice(0, NAMED).map(({ number }) => number);
    const more = parts.length - named.length;
    return [...named, ...(more > 0 ? [`and ${more} more`] : [])].join(', ') || 'none';
  }
}
