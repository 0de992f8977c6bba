import { type Db } from '#db/open-database';
import { preparedOnce } from '#db/prepared-once';
import { instrumentRanges } from '#db/schema/instruments';
import { Refused } from '#server/problems';
import { type ReadingEntry } from '#shared/contract/bench';
import { type InstrumentRange } from '#shared/contract/instruments';
import { chosenRange, type RangedQuantity, RangeRefused } from '#shared/uncertainty/range-choice';
import { and, asc, eq, isNull, sql } from 'drizzle-orm';

const rangesOfInstrument = preparedOnce((db) =>
  db
    .select()
    .from(instrumentRanges)
    .where(and(eq(instrumentRanges.instrumentId, sql.placeholder('instrumentId')), isNull(instrumentRanges.retiredAt)))
    .orderBy(asc(instrumentRanges.position))
    .prepare(),
);

/** The ranges of an instrument that are in use, in the order of its register. */
export function rangesOf(db: Db, instrumentId: number): InstrumentRange[] {
  return rangesOfInstrument(db)
    .all({ instrumentId })
    .map(({ id, specification }) => ({ ...specification, id }));
}

/** What a reading is, as far as the choice of a range needs it. */
export interface RangedReading {
  /** SI base unit. */
  value: number;
  /** Display unit of the characteristic. */
  unit: string;
  entry: ReadingEntry | null;
}

/** Divisions come off a screen, a captured file off either, all else off a display. */
function readAs(entry: ReadingEntry | null): RangedQuantity['readAs'] {
  return entry?.kind === 'scope' || entry?.kind === 'waveform' ? entry.kind : 'direct';
}

/**
 * The range a reading was taken on, by the rule that the bench shows.
 *
 * @param ranges those in use of its instrument
 * @returns undefined where the instrument has no accuracy specification for this quantity
 * @throws {Refused} for a range that cannot have shown the value
 */
export function rangeOfReading(
  ranges: readonly InstrumentRange[],
  rangeId: number | null,
  { value, unit, entry }: RangedReading,
): InstrumentRange | undefined {
  try {
    return chosenRange(ranges, rangeId, value, { unit, readAs: readAs(entry) });
  } catch (error) {
    if (!(error instanceof RangeRefused)) throw error;
    throw new Refused('range-refused', error.message, [{ path: ['rangeId'], message: error.message }]);
  }
}
