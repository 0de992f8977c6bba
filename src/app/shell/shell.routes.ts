import { inject } from '@angular/core';
import { type Routes } from '@angular/router';
import { listAudit } from '#shared/contract/audit';
import { readBench } from '#shared/contract/bench';
import { listReviews } from '#shared/contract/calibrations';
import { listCertificates } from '#shared/contract/certificates';
import { readAssessment } from '#shared/contract/decision';
import { listGaugeStudies } from '#shared/contract/gauge-studies';
import { listInstruments } from '#shared/contract/instruments';
import { listLots } from '#shared/contract/lots';
import { listMessages } from '#shared/contract/mail';
import { listNonconformances } from '#shared/contract/nonconformances';
import { listParts } from '#shared/contract/parts';
import { listPeople } from '#shared/contract/people';
import { listPlans } from '#shared/contract/plans';
import { listRacks } from '#shared/contract/racks';
import { readSite } from '#shared/contract/site';
import { listSuppliers } from '#shared/contract/suppliers';
import { readWaveform } from '#shared/contract/waveforms';
import { readYields } from '#shared/contract/yields';
import { areaFor } from '../session/role-guard';
import { Session } from '../session/session';
import { materialDefaults } from '../ui/material-defaults';
import { firstAddress } from './stations';

/** Everything behind sign-in; each area is loaded when it is first opened. */
export default [
  {
    path: '',
    providers: materialDefaults,
    loadComponent: () => import('./shell').then((file) => file.Shell),
    children: [
      { path: '', pathMatch: 'full', redirectTo: () => firstAddress((role) => inject(Session).holds(role)) },
      ...areaFor(listLots.who, {
        path: 'arrivals',
        title: 'Arrivals',
        loadChildren: () => import('../arrivals/arrivals.routes'),
      }),
      ...areaFor(readBench.who, { path: 'bench', title: 'Bench', loadChildren: () => import('../bench/bench.routes') }),
      ...areaFor(readAssessment.who, {
        path: 'decision',
        title: 'Decision',
        loadChildren: () => import('../decision/decision.routes'),
      }),
      ...areaFor(readYields.who, {
        path: 'trends',
        title: 'Trends',
        loadChildren: () => import('../trends/trends.routes'),
      }),
      ...areaFor(listPlans.who, { path: 'plans', title: 'Plans', loadChildren: () => import('../plans/plans.routes') }),
      ...areaFor(listParts.who, { path: 'parts', title: 'Parts', loadChildren: () => import('../parts/parts.routes') }),
      ...areaFor(listSuppliers.who, {
        path: 'suppliers',
        title: 'Suppliers',
        loadChildren: () => import('../suppliers/suppliers.routes'),
      }),
      ...areaFor(listInstruments.who, {
        path: 'instruments',
        title: 'Instruments',
        loadChildren: () => import('../instruments/instruments.routes'),
      }),
      ...areaFor(listReviews.who, {
        path: 'reviews',
        title: 'Reviews',
        loadChildren: () => import('../reviews/reviews.routes'),
      }),
      ...areaFor(listGaugeStudies.who, {
        path: 'gauge-studies',
        title: 'Gauge studies',
        loadChildren: () => import('../gauge-studies/gauge-studies.routes'),
      }),
      ...areaFor(readWaveform.who, {
        path: 'waveforms',
        title: 'Waveform',
        loadChildren: () => import('../waveforms/waveforms.routes'),
      }),
      ...areaFor(listRacks.who, { path: 'racks', title: 'Racks', loadChildren: () => import('../racks/racks.routes') }),
      ...areaFor(listCertificates.who, {
        path: 'certificates',
        title: 'Certificates',
        loadChildren: () => import('../certificates/certificates.routes'),
      }),
      ...areaFor(listNonconformances.who, {
        path: 'nonconformances',
        title: 'Nonconformances',
        loadChildren: () => import('../nonconformances/nonconformances.routes'),
      }),
      ...areaFor(listPeople.who, {
        path: 'people',
        title: 'People',
        loadChildren: () => import('../people/people.routes'),
      }),
      ...areaFor(listAudit.who, {
        path: 'audit',
        title: 'Audit trail',
        loadChildren: () => import('../audit/audit.routes'),
      }),
      ...areaFor(listMessages.who, { path: 'mail', title: 'Mail', loadChildren: () => import('../mail/mail.routes') }),
      ...areaFor(readSite.who, { path: 'site', title: 'Site', loadChildren: () => import('../site/site.routes') }),
      {
        path: 'account',
        title: 'Account',
        loadComponent: () => import('../session/account-page/account-page').then((file) => file.AccountPage),
      },
      ...areaFor(listLots.who, { path: '', title: 'Lots', loadChildren: () => import('../lots/lots.routes') }, [
        'released',
        'on-hold',
        'lots',
      ]),
      {
        path: '**',
        title: 'Not found',
        loadComponent: () => import('./not-found-page').then((file) => file.NotFoundPage),
      },
    ],
  },
] satisfies Routes;
