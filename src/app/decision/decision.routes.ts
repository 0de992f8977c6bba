import { type Routes } from '@angular/router';

export default [
  {
    path: '',
    title: 'Decision',
    loadComponent: () => import('./decision-list-page/decision-list-page').then((file) => file.DecisionListPage),
  },
  {
    path: ':id',
    title: 'Decision',
    loadComponent: () => import('./decision-page/decision-page').then((file) => file.DecisionPage),
  },
] satisfies Routes;
