import { type Routes } from '@angular/router';
import { addRack } from '#shared/contract/racks';
import { areaFor } from '../session/role-guard';
import { leaveGuard } from '../shell/leave-guard';

export default [
  {
    path: '',
    title: 'Racks',
    loadComponent: () => import('./rack-list-page/rack-list-page').then((file) => file.RackListPage),
  },
  ...areaFor(addRack.who, {
    path: 'new',
    title: 'New rack',
    canDeactivate: [leaveGuard],
    loadComponent: () => import('./new-rack-page/new-rack-page').then((file) => file.NewRackPage),
  }),
  {
    path: ':id',
    title: 'Rack',
    canDeactivate: [leaveGuard],
    loadComponent: () => import('./rack-page/rack-page').then((file) => file.RackPage),
  },
] satisfies Routes;
