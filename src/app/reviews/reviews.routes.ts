import { type Routes } from '@angular/router';
import { leaveGuard } from '../shell/leave-guard';

export default [
  {
    path: '',
    title: 'Reviews',
    loadComponent: () => import('./review-list-page/review-list-page').then((file) => file.ReviewListPage),
  },
  {
    path: ':id',
    title: 'Review',
    canDeactivate: [leaveGuard],
    loadComponent: () => import('./review-page/review-page').then((file) => file.ReviewPage),
  },
] satisfies Routes;
