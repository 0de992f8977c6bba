import { type Routes } from '@angular/router';
import { leaveGuard } from '../shell/leave-guard';

export default [
  {
    path: '',
    title: 'Site',
    canDeactivate: [leaveGuard],
    loadComponent: () => import('./site-page/site-page').then((file) => file.SitePage),
  },
] satisfies Routes;
