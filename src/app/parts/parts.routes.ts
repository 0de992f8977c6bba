import { type Routes } from '@angular/router';
import { addPart } from '#shared/contract/parts';
import { areaFor } from '../session/role-guard';
import { leaveGuard } from '../shell/leave-guard';

export default [
  {
    path: '',
    title: 'Parts',
    loadComponent: () => import('./part-list-page/part-list-page').then((file) => file.PartListPage),
  },
  ...areaFor(addPart.who, {
    path: 'new',
    title: 'New part',
    canDeactivate: [leaveGuard],
    loadComponent: () => import('./new-part-page/new-part-page').then((file) => file.NewPartPage),
  }),
  {
    path: ':id',
    title: 'Part',
    canDeactivate: [leaveGuard],
    loadComponent: () => import('./part-page/part-page').then((file) => file.PartPage),
  },
] satisfies Routes;
