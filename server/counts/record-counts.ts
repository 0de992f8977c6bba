import { type Db } from '#db/open-database';
import { certificates } from '#db/schema/certificates';
import { instruments } from '#db/schema/instruments';
import { lots } from '#db/schema/lots';
import { nonconformances } from '#db/schema/nonconformances';
import { parts } from '#db/schema/parts';
import { people } from '#db/schema/people';
import { racks } from '#db/schema/racks';
import { suppliers } from '#db/schema/suppliers';
import { type Caller, mayCall } from '#server/caller';
import { dayOf } from '#server/instruments/instrument-queries';
import { visibleTo } from '#server/nonconformances/nonconformance-queries';
import { countPlans } from '#server/plans/plan-queries';
import { listCertificates } from '#shared/contract/certificates';
import { type readRecordCounts } from '#shared/contract/counts';
import { listInstruments } from '#shared/contract/instruments';
import { listNonconformances } from '#shared/contract/nonconformances';
import { listParts } from '#shared/contract/parts';
import { listPeople } from '#shared/contract/people';
import { listPlans } from '#shared/contract/plans';
import { listRacks } from '#shared/contract/racks';
import { listSuppliers } from '#shared/contract/suppliers';
import { and, count, eq, lte } from 'drizzle-orm';
import { type SQLiteTable } from 'drizzle-orm/sqlite-core';
import type * as z from 'zod';

type RecordCounts = z.output<(typeof readRecordCounts)['reply']>;

/** How long before its date a calibration is called due, in days. Common practice, no source. */
const DUE_DAYS = 30;

function rowsOf(db: Db, table: SQLiteTable): number {
  return db.select({ rows: count() }).from(table).get()?.rows ?? 0;
}

function instrumentsDue(db: Db, now: Date): number {
  const soon = new Date(now.getTime() + DUE_DAYS * 24 * 60 * 60 * 1000);
  const due = and(eq(instruments.status, 'in-service'), lte(instruments.calibrationDue, dayOf(soon)));
  return db.select({ rows: count() }).from(instruments).where(due).get()?.rows ?? 0;
}

function openNonconformances(db: Db, caller: Caller): number {
  const row = db
    .select({ rows: count() })
    .from(nonconformances)
    .innerJoin(lots, eq(lots.id, nonconformances.lotId))
    .where(and(eq(nonconformances.status, 'open'), visibleTo(caller)))
    .get();
  return row?.rows ?? 0;
}

/** How many records of each kind the caller may read; what may not be read is not counted either. */
export function countRecords(db: Db, caller: Caller, now: Date): RecordCounts {
  return {
    ...(mayCall(caller, listPlans) && { plans: countPlans(db, caller) }),
    ...(mayCall(caller, listParts) && { parts: rowsOf(db, parts) }),
    ...(mayCall(caller, listSuppliers) && { suppliers: rowsOf(db, suppliers) }),
    ...(mayCall(caller, listInstruments) && {
      instruments: rowsOf(db, instruments),
      instrumentsDue: instrumentsDue(db, now),
    }),
    ...(mayCall(caller, listRacks) && { racks: rowsOf(db, racks) }),
    ...(mayCall(caller, listCertificates) && { certificates: rowsOf(db, certificates) }),
    ...(mayCall(caller, listNonconformances) && { openNonconformances: openNonconformances(db, caller) }),
    ...(mayCall(caller, listPeople) && { people: rowsOf(db, people) }),
  };
}
