import { type Db } from '#db/open-database';
import { instruments } from '#db/schema/instruments';
import { NotFound } from '#server/problems';
import { type Instrument } from '#shared/contract/instruments';
import { asc, eq } from 'drizzle-orm';

const DAY = 24 * 60 * 60 * 1000;

/** The day of an instant, UTC, as 2026-09-30. */
export function dayOf(instant: Date): string {
  return instant.toISOString().slice(0, 10);
}

/** An instrument as it stands on a day: on its due date it may still be used, after it no more. */
export function instrumentView(row: typeof instruments.$inferSelect, today: string): Instrument {
  const daysLeft = Math.round((Date.parse(row.calibrationDue) - Date.parse(today)) / DAY);
  return { ...row, daysLeft, usable: row.status === 'in-service' && daysLeft >= 0 };
}

/** All instruments as they stand on a day, the next calibration due first. */
export function listInstruments(db: Db, today: string): Instrument[] {
  const rows = db
    .select()
    .from(instruments)
    .orderBy(asc(instruments.calibrationDue), asc(instruments.assetNumber))
    .all();
  return rows.map((row) => instrumentView(row, today));
}

/** @throws {NotFound} */
export function findInstrument(db: Db, id: number, today: string): Instrument {
  const row = db.select().from(instruments).where(eq(instruments.id, id)).get();
  if (!row) throw new NotFound('This instrument');
  return instrumentView(row, today);
}
