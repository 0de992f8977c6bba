import { type Db } from '#db/open-database';
import { readings } from '#db/schema/readings';
import { and, eq, gte, isNull, lte, type SQL, sql } from 'drizzle-orm';

/** Days in which an instrument's readings are in doubt, first and last; no first day where no good calibration is known. */
export interface Doubt {
  instrumentId: number;
  from: string | null;
  to: string;
}

const takenOn = sql<string>`substr(${readings.takenAt}, 1, 10)`;

/** The readings in doubt: taken with the instrument in those days, and not withdrawn since. */
export function inDoubt({ instrumentId, from, to }: Doubt): SQL | undefined {
  return and(
    eq(readings.instrumentId, instrumentId),
    isNull(readings.withdrawnAt),
    from === null ? undefined : gte(takenOn, from),
    lte(takenOn, to),
  );
}

/** How many readings of each lot are in doubt. */
export function lotsInDoubt(db: Db, doubt: Doubt): { lotId: number; readings: number }[] {
  return db
    .select({ lotId: readings.lotId, readings: sql<number>`count(*)` })
    .from(readings)
    .where(inDoubt(doubt))
    .groupBy(readings.lotId)
    .all();
}
