import { type Db } from '#db/open-database';
import { preparedOnce } from '#db/prepared-once';
import { instrumentRanges } from '#db/schema/instruments';
import { Refused } from '#server/problems';
import { type ReadingEntry } from '#shared/contract/bench';
import { type InstrumentRange } from '#shared/contract/instruments';
import { unitParts } from '#shared/quantities/display-unit';
import { formatQuantity } from '#shared/quantities/format-quantity';
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

function refuse(message: string): never {
  throw new Refused('range-refused', message, [{ path: ['rangeId'], message }]);
}

/** The unit of a range that reads a characteristic in this display unit; a thermometer's is K, as its errors are differences. */
function quantityUnit(unit: string): string {
  const symbol = unitParts(unit).unit?.symbol ?? '';
  return symbol === '°C' ? 'K' : symbol;
}

/** Whether a range reads this kind of quantity in this way: divisions come off a screen, digits off a display. */
function fits(range: InstrumentRange, { unit, entry }: RangedReading): boolean {
  if (range.unit !== quantityUnit(unit)) return false;
  if (entry?.kind === 'scope') return range.form === 'graticule';
  return entry?.kind === 'waveform' || range.form === 'digital';
}

/** Whether the value is on the range's scale. What a screen shows is on it, or it could not have been read. */
function holds(range: InstrumentRange, { value }: RangedReading): boolean {
  return range.form === 'graticule' || Math.abs(value) <= range.fullScale;
}

/** The smallest range first, alternating current last: a supply's output is direct. */
function byChoice(a: InstrumentRange, b: InstrumentRange): number {
  const isAc = (range: InstrumentRange) => Number(range.form === 'digital' && range.current === 'ac');
  const scale = (range: InstrumentRange) => (range.form === 'digital' ? range.fullScale : 0);
  return isAc(a) - isAc(b) || scale(a) - scale(b);
}

function named(ranges: readonly InstrumentRange[], id: number, reading: RangedReading): InstrumentRange {
  const range = ranges.find((one) => one.id === id);
  if (!range) return refuse('The instrument has no such range now. Choose another one.');
  if (!fits(range, reading)) return refuse(`The range ${range.name} does not read this. Choose another one.`);
  if (!holds(range, reading))
    return refuse(`${formatQuantity(reading.value, reading.unit)} is above the range ${range.name}.`);
  return range;
}

/**
 * The range a reading was taken on: the one it names, or else the smallest that holds the value.
 *
 * @param ranges those in use of its instrument
 * @returns undefined where the instrument has no accuracy specification for this quantity
 * @throws {Refused} for a range that cannot have shown the value
 */
export function chosenRange(
  ranges: readonly InstrumentRange[],
  rangeId: number | null,
  reading: RangedReading,
): InstrumentRange | undefined {
  if (rangeId !== null) return named(ranges, rangeId, reading);
  const fitting = ranges.filter((range) => fits(range, reading)).sort(byChoice);
  const found = fitting.find((range) => holds(range, reading));
  if (found || fitting.length === 0) return found;
  return refuse(`${formatQuantity(reading.value, reading.unit)} is above every range of this instrument.`);
}
