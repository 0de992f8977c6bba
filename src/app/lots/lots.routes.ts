import { type Routes } from '@angular/router';
import { readBudget } from '#shared/contract/budgets';
import { areaFor } from '../session/role-guard';

const loadList = () => import('./lot-list-page/lot-list-page').then((file) => file.LotListPage);

export default [
  { path: 'released', title: 'Released', data: { station: 'released' }, loadComponent: loadList },
  { path: 'on-hold', title: 'On hold', data: { station: 'on-hold' }, loadComponent: loadList },
  {
    path: 'lots/:id',
    title: 'Lot',
    loadComponent: () => import('./lot-page/lot-page').then((file) => file.LotPage),
  },
  {
    path: 'lots/:id/pull-list',
    title: 'Pull list',
    loadComponent: () => import('./pull-list-page/pull-list-page').then((file) => file.PullListPage),
  },
  ...areaFor(readBudget.who, {
    path: 'lots/:id/units/:unit/budgets/:key',
    title: 'Uncertainty budget',
    loadComponent: () => import('./budget-page/budget-page').then((file) => file.BudgetPage),
  }),
] satisfies Routes;
