import { type Routes } from '@angular/router';
import { addGaugeStudy, changeGaugeStudy } from '#shared/contract/gauge-studies';
import { areaFor } from '../session/role-guard';
import { leaveGuard } from '../shell/leave-guard';

export default [
  {
    path: '',
    title: 'Gauge studies',
    loadComponent: () =>
      import('./gauge-study-list-page/gauge-study-list-page').then((file) => file.GaugeStudyListPage),
  },
  ...areaFor(addGaugeStudy.who, {
    path: 'new',
    title: 'New gauge study',
    canDeactivate: [leaveGuard],
    loadComponent: () => import('./new-gauge-study-page/new-gauge-study-page').then((file) => file.NewGaugeStudyPage),
  }),
  {
    path: ':id',
    title: 'Gauge study',
    canDeactivate: [leaveGuard],
    loadComponent: () => import('./gauge-study-page/gauge-study-page').then((file) => file.GaugeStudyPage),
  },
  ...areaFor(changeGaugeStudy.who, {
    path: ':id/facts',
    title: 'Gauge study',
    canDeactivate: [leaveGuard],
    loadComponent: () =>
      import('./gauge-study-facts-page/gauge-study-facts-page').then((file) => file.GaugeStudyFactsPage),
  }),
] satisfies Routes;
