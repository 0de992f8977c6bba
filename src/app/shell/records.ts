import { listAudit } from '#shared/contract/audit';
import { listReviews } from '#shared/contract/calibrations';
import { listCertificates } from '#shared/contract/certificates';
import { type readRecordCounts } from '#shared/contract/counts';
import { type Who } from '#shared/contract/endpoint';
import { listGaugeStudies } from '#shared/contract/gauge-studies';
import { listInstruments } from '#shared/contract/instruments';
import { listMessages } from '#shared/contract/mail';
import { listNonconformances } from '#shared/contract/nonconformances';
import { listParts } from '#shared/contract/parts';
import { listPeople } from '#shared/contract/people';
import { listPlans } from '#shared/contract/plans';
import { listRacks } from '#shared/contract/racks';
import { readSite } from '#shared/contract/site';
import { listSuppliers } from '#shared/contract/suppliers';
import { type Reply } from '../data/api';

type RecordCounts = Reply<typeof readRecordCounts>;

/** A collection of records in the menu. Who sees it is what the contract says of its list. */
export interface RecordArea {
  readonly path: string;
  readonly title: string;
  readonly who: Who;
  readonly count?: keyof RecordCounts;
}

/** The groups of the records menu. */
export const RECORDS: readonly (readonly RecordArea[])[] = [
  [
    { path: 'plans', title: 'Plans', who: listPlans.who, count: 'plans' },
    { path: 'parts', title: 'Parts', who: listParts.who, count: 'parts' },
    { path: 'suppliers', title: 'Suppliers', who: listSuppliers.who, count: 'suppliers' },
    { path: 'instruments', title: 'Instruments', who: listInstruments.who, count: 'instruments' },
    { path: 'reviews', title: 'Reviews', who: listReviews.who },
    { path: 'gauge-studies', title: 'Gauge studies', who: listGaugeStudies.who },
    { path: 'racks', title: 'Racks', who: listRacks.who, count: 'racks' },
  ],
  [
    { path: 'certificates', title: 'Certificates', who: listCertificates.who, count: 'certificates' },
    {
      path: 'nonconformances',
      title: 'Nonconformances',
      who: listNonconformances.who,
      count: 'openNonconformances',
    },
  ],
  [
    { path: 'people', title: 'People', who: listPeople.who, count: 'people' },
    { path: 'audit', title: 'Audit trail', who: listAudit.who },
    { path: 'mail', title: 'Mail', who: listMessages.who },
    { path: 'site', title: 'Site', who: readSite.who },
  ],
];
