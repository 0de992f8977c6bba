import { ChangeDetectionStrategy, Component } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { RouterLink } from '@angular/router';
import { addPlan, listPlans } from '#shared/contract/plans';
import { endpointResource } from '../../data/api';
import { may } from '../../session/may';
import { Icon } from '../../ui/marks/icon';
import { Loaded } from '../../ui/page-state/loaded';
import { PageState } from '../../ui/page-state/page-state';
import { EmptyState } from '../../ui/states/empty-state';
import { MomentPipe } from '../../ui/values/moment-pipe';
import { STATUS_WORDS } from '../revision-status';

/** All plans that the person may see, with the revision in force and the one being worked on. */
@Component({
  selector: 'qr-plan-list-page',
  imports: [EmptyState, Icon, Loaded, MatButton, MomentPipe, PageState, RouterLink],
  templateUrl: './plan-list-page.html',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class PlanListPage {
  protected readonly plans = endpointResource(listPlans, () => ({}));
  protected readonly mayAdd = may(addPlan);
  protected readonly statusWords = STATUS_WORDS;
}
