import { type Routes } from '@angular/router';
import { addInstrument } from '#shared/contract/instruments';
import { areaFor } from '../session/role-guard';
import { leaveGuard } from '../shell/leave-guard';

export default [
  {
    path: '',
    title: 'Instruments',
    loadComponent: () => import('./instrument-list-page/instrument-list-page').then((file) => file.InstrumentListPage),
  },
  ...areaFor(addInstrument.who, {
    path: 'new',
    title: 'New instrument',
    canDeactivate: [leaveGuard],
    loadComponent: () => import('./new-instrument-page/new-instrument-page').then((file) => file.NewInstrumentPage),
  }),
  {
    path: ':id',
    title: 'Instrument',
    canDeactivate: [leaveGuard],
    loadComponent: () => import('./instrument-page/instrument-page').then((file) => file.InstrumentPage),
  },
] satisfies Routes;
