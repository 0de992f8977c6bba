import { type Db } from '#db/open-database';
import { instruments } from '#db/schema/instruments';
import { countingReadings, type ReadingRow } from './lot-judging';
import { type JudgedLot } from './sample-judging';
import { type Assessment } from '#shared/contract/decision';
import { INSTRUMENT_KIND_TITLES } from '#shared/contract/instruments';
import { asc, inArray } from 'drizzle-orm';

/** The readings that count, of all units. */
export function readingsThatCount({ units }: JudgedLot): ReadingRow[] {
  return units.flatMap(({ readings }) => [...countingReadings(readings).values()]);
}

/**
 * How often a reading was taken again. One that was taken back first counts too: otherwise a unit could be measured into
 * compliance unseen.
 */
export function repeatsOf({ units }: JudgedLot): number {
  return units.flatMap(({ readings }) => readings).filter(({ attempt }) => attempt > 1).length;
}

/** The instruments that the counting readings name, with how many each took. */
export function instrumentsUsed(db: Db, counting: readonly ReadingRow[]): Assessment['instruments'] {
  const counts = new Map<number, number>();
  for (const { instrumentId } of counting)
    if (instrumentId !== null) counts.set(instrumentId, (counts.get(instrumentId) ?? 0) + 1);
  return db
    .select()
    .from(instruments)
    .where(inArray(instruments.id, [...counts.keys()]))
    .orderBy(asc(instruments.assetNumber))
    .all()
    .map(({ id, assetNumber, kind, description, calibrationDue }) => ({
      assetNumber,
      kind: INSTRUMENT_KIND_TITLES[kind],
      description,
      calibrationDue,
      readings: counts.get(id) ?? 0,
    }));
}
