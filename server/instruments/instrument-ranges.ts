import { type Db } from '#db/open-database';
import { preparedOnce } from '#db/prepared-once';
import { instrumentRanges } from '#db/schema/instruments';
import { rangeBody, type InstrumentRange, type RangeBody } from '#shared/contract/instruments';
import { asc, eq, isNull, sql } from 'drizzle-orm';
import { isDeepStrictEqual } from 'node:util';

const rangeById = preparedOnce((db) =>
  db
    .select()
    .from(instrumentRanges)
    .where(eq(instrumentRanges.id, sql.placeholder('id')))
    .prepare(),
);

/** A range as it was when a reading was taken on it, retired since or not; undefined where there is none. */
export function findRange(db: Db, id: number): (InstrumentRange & { instrumentId: number }) | undefined {
  const row = rangeById(db).get({ id });
  return row && { ...row.specification, id: row.id, instrumentId: row.instrumentId };
}

/** The ranges in use of every instrument, by instrument. */
export function rangesInUse(db: Db): ReadonlyMap<number, InstrumentRange[]> {
  const rows = db
    .select()
    .from(instrumentRanges)
    .where(isNull(instrumentRanges.retiredAt))
    .orderBy(asc(instrumentRanges.position))
    .all();
  const ranges = new Map<number, InstrumentRange[]>();
  for (const { id, instrumentId, specification } of rows) {
    const range = { ...specification, id };
    const known = ranges.get(instrumentId);
    if (known) known.push(range);
    else ranges.set(instrumentId, [range]);
  }
  return ranges;
}

/** Brings the ranges of an instrument to what is given: those that stay as they are keep their identity, all others are new. */
export function keepRanges(db: Db, instrumentId: number, given: readonly RangeBody[], at: Date): void {
  const left = [...(rangesInUse(db).get(instrumentId) ?? [])];
  given.forEach((specification, position) => {
    const index = left.findIndex((known) => isDeepStrictEqual(rangeBody.parse(known), specification));
    const [kept] = index < 0 ? [] : left.splice(index, 1);
    if (kept) db.update(instrumentRanges).set({ position }).where(eq(instrumentRanges.id, kept.id)).run();
    else db.insert(instrumentRanges).values({ instrumentId, position, specification }).run();
  });
  for (const { id } of left)
    db.update(instrumentRanges).set({ retiredAt: at.toISOString() }).where(eq(instrumentRanges.id, id)).run();
}
