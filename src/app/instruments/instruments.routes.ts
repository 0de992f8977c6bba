import { type Routes } from '@angular/router';
import { recordCalibration } from '#shared/contract/calibrations';
import { addInstrument, changeInstrument } from '#shared/contract/instruments';
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
    loadComponent: () => import('./instrument-page/instrument-page').then((file) => file.InstrumentPage),
  },
  ...areaFor(changeInstrument.who, {
    path: ':id/facts',
    title: 'Instrument',
    canDeactivate: [leaveGuard],
    loadComponent: () =>
      import('./instrument-facts-page/instrument-facts-page').then((file) => file.InstrumentFactsPage),
  }),
  ...areaFor(recordCalibration.who, {
    path: ':id/calibrations/new',
    title: 'Record a calibration',
    canDeactivate: [leaveGuard],
    loadComponent: () =>
      import('./record-calibration-page/record-calibration-page').then((file) => file.RecordCalibrationPage),
  }),
] satisfies Routes;
