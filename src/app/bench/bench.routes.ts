import { type Routes } from '@angular/router';
import { importRackFile } from '#shared/contract/bench';
import { areaFor } from '../session/role-guard';
import { leaveGuard } from '../shell/leave-guard';

export default [
  {
    path: '',
    title: 'Bench',
    loadComponent: () => import('./bench-list-page/bench-list-page').then((file) => file.BenchListPage),
  },
  ...areaFor(importRackFile.who, {
    path: ':id/rack-file',
    title: 'Rack file',
    loadComponent: () => import('./rack-file-page/rack-file-page').then((file) => file.RackFilePage),
  }),
  {
    path: ':id',
    title: 'Bench',
    canDeactivate: [leaveGuard],
    loadComponent: () => import('./bench-page/bench-page').then((file) => file.BenchPage),
  },
] satisfies Routes;
