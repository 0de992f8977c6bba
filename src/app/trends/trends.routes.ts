import { type Routes } from '@angular/router';

export default [
  {
    path: '',
    title: 'Trends',
    loadComponent: () => import('./trends-page/trends-page').then((file) => file.TrendsPage),
  },
] satisfies Routes;
