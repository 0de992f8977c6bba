import { type Routes } from '@angular/router';
import { addPlan } from '#shared/contract/plans';
import { areaFor } from '../session/role-guard';
import { leaveGuard } from '../shell/leave-guard';

export default [
  {
    path: '',
    title: 'Plans',
    loadComponent: () => import('./plan-list-page/plan-list-page').then((file) => file.PlanListPage),
  },
  ...areaFor(addPlan.who, {
    path: 'new',
    title: 'New plan',
    canDeactivate: [leaveGuard],
    loadComponent: () => import('./new-plan-page/new-plan-page').then((file) => file.NewPlanPage),
  }),
  {
    path: ':id',
    title: 'Plan',
    canDeactivate: [leaveGuard],
    loadComponent: () => import('./plan-page/plan-page').then((file) => file.PlanPage),
  },
] satisfies Routes;
