import { type Routes } from '@angular/router';

export default [
  {
    path: '',
    title: 'Nonconformances',
    loadComponent: () =>
      import('./nonconformance-list-page/nonconformance-list-page').then((file) => file.NonconformanceListPage),
  },
  {
    path: ':id',
    title: 'Nonconformance',
    loadComponent: () => import('./nonconformance-page/nonconformance-page').then((file) => file.NonconformancePage),
  },
] satisfies Routes;
