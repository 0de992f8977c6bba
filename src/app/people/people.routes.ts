import { type Routes } from '@angular/router';
import { addPerson } from '#shared/contract/people';
import { areaFor } from '../session/role-guard';
import { leaveGuard } from '../shell/leave-guard';

export default [
  {
    path: '',
    title: 'People',
    loadComponent: () => import('./people-page/people-page').then((file) => file.PeoplePage),
  },
  ...areaFor(addPerson.who, {
    path: 'new',
    title: 'New person',
    canDeactivate: [leaveGuard],
    loadComponent: () => import('./new-person-page/new-person-page').then((file) => file.NewPersonPage),
  }),
  {
    path: ':id',
    title: 'Person',
    canDeactivate: [leaveGuard],
    loadComponent: () => import('./person-page/person-page').then((file) => file.PersonPage),
  },
] satisfies Routes;
