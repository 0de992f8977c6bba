import { ChangeDetectionStrategy, Component } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { RouterLink } from '@angular/router';
import { addPart, FORM_TITLES, listParts, TOPOLOGY_TITLES } from '#shared/contract/parts';
import { listPlans } from '#shared/contract/plans';
import { endpointResource } from '../../data/api';
import { may } from '../../session/may';
import { Icon } from '../../ui/marks/icon';
import { Loaded } from '../../ui/page-state/loaded';
import { PageState } from '../../ui/page-state/page-state';
import { EmptyState } from '../../ui/states/empty-state';
import { QuantityPipe } from '../../ui/values/quantity-pipe';

/** All parts, with their ratings and the plan they are inspected to. */
@Component({
  selector: 'qr-part-list-page',
  imports: [EmptyState, Icon, Loaded, MatButton, PageState, QuantityPipe, RouterLink],
  templateUrl: './part-list-page.html',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class PartListPage {
  protected readonly parts = endpointResource(listParts, () => ({}));
  protected readonly mayAdd = may(addPart);
  protected readonly mayReadPlans = may(listPlans);
  protected readonly forms = FORM_TITLES;
  protected readonly topologies = TOPOLOGY_TITLES;
}
