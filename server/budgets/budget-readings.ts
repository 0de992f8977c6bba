import { type Db } from '#db/open-database';
import { calibrations } from '#db/schema/calibrations';
import { instruments } from '#db/schema/instruments';
import { type BenchNames } from '#server/bench/bench-names';
import { dayOf } from '#server/instruments/instrument-queries';
import { findRange } from '#server/instruments/instrument-ranges';
import { type ReadingRow } from '#server/judging/lot-judging';
import { type BudgetReading } from '#shared/contract/budgets';
import { rangeBody } from '#shared/contract/instruments';
import { type Characteristic } from '#shared/contract/plans';
import { and, desc, eq, lte } from 'drizzle-orm';

type UsedInstrument = NonNullable<BudgetReading['instrument']>;

/** A reading with the characteristic it is of, and the input of a formula that it stands for. */
export interface BudgetSource {
  input: string | null;
  row: ReadingRow;
  /** That of the row, which has one. */
  value: number;
  characteristic: Characteristic;
}

/** The last calibration on the day of a reading or before it. */
function calibrationAt(db: Db, instrumentId: number, day: string): UsedInstrument['calibration'] {
  const row = db
    .select()
    .from(calibrations)
    .where(and(eq(calibrations.instrumentId, instrumentId), lte(calibrations.calibratedOn, day)))
    .orderBy(desc(calibrations.calibratedOn), desc(calibrations.id))
    .get();
  if (!row) return null;
  const { calibratedOn, dueOn, laboratory, certificateNumber, asFound } = row;
  return { calibratedOn, dueOn, laboratory, certificateNumber, asFound };
}

function rangeOf(db: Db, rangeId: number | null): UsedInstrument['range'] {
  const found = rangeId === null ? undefined : findRange(db, rangeId);
  return found ? { ...rangeBody.parse(found), id: found.id } : null;
}

function instrumentOf(db: Db, { instrumentId, rangeId, takenAt }: ReadingRow): BudgetReading['instrument'] {
  if (instrumentId === null) return null;
  const row = db.select().from(instruments).where(eq(instruments.id, instrumentId)).get();
  if (!row) return null;
  const { id, assetNumber, kind, description } = row;
  const calibration = calibrationAt(db, instrumentId, dayOf(new Date(takenAt)));
  return { id, assetNumber, kind, description, range: rangeOf(db, rangeId), calibration };
}

/** A reading that a budget rests on, with the instrument as it stood when the reading was taken. */
export function budgetReading(
  db: Db,
  names: BenchNames,
  { input, row, value, characteristic }: BudgetSource,
): BudgetReading {
  return {
    id: row.id,
    input,
    characteristic,
    value,
    entry: row.entry,
    attempt: row.attempt,
    withdrawn: row.withdrawnAt !== null,
    takenAt: row.takenAt,
    takenBy: row.takenById === null ? null : (names.people.get(row.takenById) ?? null),
    rack: row.rackId === null ? null : (names.racks.get(row.rackId) ?? null),
    expandedUncertainty: row.expandedUncertainty,
    instrument: instrumentOf(db, row),
  };
}
