import { type Db } from '#db/open-database';
import { calibrations, instrumentChecks, instrumentReviews } from '#db/schema/calibrations';
import { instruments } from '#db/schema/instruments';
import { NotFound } from '#server/problems';
import { findSite } from '#server/site/site-queries';
import { type Instrument } from '#shared/contract/instruments';
import { asc, eq, isNull } from 'drizzle-orm';
import { dailyReferenceOf } from './daily-reference';
import { rangesInUse } from './instrument-ranges';

const DAY = 24 * 60 * 60 * 1000;

export type InstrumentRow = typeof instruments.$inferSelect;

/** The day of an instant, UTC, as 2026-09-30. */
export function dayOf(instant: Date): string {
  return instant.toISOString().slice(0, 10);
}

/** The last check of each instrument on a day. */
function checksOn(db: Db, day: string): ReadonlyMap<number, boolean> {
  const rows = db
    .select({ instrumentId: instrumentChecks.instrumentId, passed: instrumentChecks.passed })
    .from(instrumentChecks)
    .where(eq(instrumentChecks.day, day))
    .orderBy(asc(instrumentChecks.id))
    .all();
  return new Map(rows.map(({ instrumentId, passed }) => [instrumentId, passed]));
}

/** The open review of each instrument that has one. */
function openReviews(db: Db): ReadonlyMap<number, { id: number; number: string }> {
  const rows = db
    .select({ instrumentId: calibrations.instrumentId, id: instrumentReviews.id, number: instrumentReviews.number })
    .from(instrumentReviews)
    .innerJoin(calibrations, eq(calibrations.id, instrumentReviews.calibrationId))
    .where(isNull(instrumentReviews.closedAt))
    .all();
  return new Map(rows.map(({ instrumentId, ...review }) => [instrumentId, review]));
}

/** Makes of rows what the contract shows of instruments on a day: on its due date one may still be used, after it no more. */
function viewer(db: Db, today: string): (row: InstrumentRow) => Instrument {
  const ranges = rangesInUse(db);
  const reviews = openReviews(db);
  const checks = findSite(db).dailyChecks ? checksOn(db, today) : undefined;
  const checkOf = (row: InstrumentRow): Instrument['dailyCheck'] => {
    if (!checks || row.checkName === null) return 'not-asked';
    const passed = checks.get(row.id);
    return passed === undefined ? 'due' : passed ? 'passed' : 'failed';
  };
  return (row) => {
    const { id, version, assetNumber, kind, description, serialNumber, place, calibrationDue, status } = row;
    const daysLeft = Math.round((Date.parse(calibrationDue) - Date.parse(today)) / DAY);
    const dailyCheck = checkOf(row);
    return {
      ...{ id, version, assetNumber, kind, description, serialNumber, place, calibrationDue, status, daysLeft },
      dailyReference: dailyReferenceOf(row),
      ranges: ranges.get(id) ?? [],
      dailyCheck,
      openReview: reviews.get(id) ?? null,
      usable: status === 'in-service' && daysLeft >= 0 && dailyCheck !== 'due' && dailyCheck !== 'failed',
    };
  };
}

/** All instruments as they stand on a day, the next calibration due first. */
export function listInstruments(db: Db, today: string): Instrument[] {
  const rows = db
    .select()
    .from(instruments)
    .orderBy(asc(instruments.calibrationDue), asc(instruments.assetNumber))
    .all();
  return rows.map(viewer(db, today));
}

/** @throws {NotFound} */
export function findInstrument(db: Db, id: number, today: string): Instrument {
  const row = db.select().from(instruments).where(eq(instruments.id, id)).get();
  if (!row) throw new NotFound('This instrument');
  return viewer(db, today)(row);
}
