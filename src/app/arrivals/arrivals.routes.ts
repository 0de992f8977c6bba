import { type Routes } from '@angular/router';
import { bookLot, correctLot } from '#shared/contract/lots';
import { areaFor } from '../session/role-guard';
import { leaveGuard } from '../shell/leave-guard';

export default [
  {
    path: '',
    title: 'Arrivals',
    loadComponent: () => import('./arrivals-page/arrivals-page').then((file) => file.ArrivalsPage),
  },
  ...areaFor(bookLot.who, {
    path: 'new',
    title: 'Receive lot',
    canDeactivate: [leaveGuard],
    loadComponent: () => import('./receive-page/receive-page').then((file) => file.ReceivePage),
  }),
  {
    path: ':id',
    title: 'Arrived lot',
    loadComponent: () => import('./arrival-page/arrival-page').then((file) => file.ArrivalPage),
  },
  ...areaFor(correctLot.who, {
    path: ':id/correct',
    title: 'Correct lot',
    canDeactivate: [leaveGuard],
    loadComponent: () => import('./correct-page/correct-page').then((file) => file.CorrectPage),
  }),
] satisfies Routes;
