import { formatQuantity } from '../quantities/format-quantity';
import { unitParts } from '../quantities/display-unit';
import { type DigitalRange, type GraticuleRange } from './instrument-range';

/** A range among those of its instrument. */
export type ChoosableRange = (DigitalRange & { current?: 'dc' | 'ac' | 'any' }) | GraticuleRange;

/** What a range is wanted for. */
export interface RangedQuantity {
  /** Display unit of the characteristic. */
  unit: string;
  /** How it is read: divisions come off a screen, digits off a display, a captured file off either. */
  readAs: 'scope' | 'waveform' | 'direct';
}

/** A range that cannot have shown the value; the message is a sentence for the person who measures. */
export class RangeRefused extends RangeError {
  override readonly name = 'RangeRefused';
}

/** The unit of a range that reads a characteristic in this display unit; a thermometer's is K, as its errors are differences. */
function quantityUnit(unit: string): string {
  const symbol = unitParts(unit).unit?.symbol ?? '';
  return symbol === '°C' ? 'K' : symbol;
}

/** Whether a range reads this kind of quantity in this way. */
function fits(range: ChoosableRange, { unit, readAs }: RangedQuantity): boolean {
  if (range.unit !== quantityUnit(unit)) return false;
  if (readAs === 'scope') return range.form === 'graticule';
  return readAs === 'waveform' || range.form === 'digital';
}

/** Whether the value is on the range's scale. What a screen shows is on it, or it could not have been read. */
function holds(range: ChoosableRange, value: number): boolean {
  return range.form === 'graticule' || Math.abs(value) <= range.fullScale;
}

/** The smallest range first, alternating current last: a supply's output is direct. */
function byChoice(one: ChoosableRange, other: ChoosableRange): number {
  const isAc = (range: ChoosableRange) => Number(range.form === 'digital' && range.current === 'ac');
  const scale = (range: ChoosableRange) => (range.form === 'digital' ? range.fullScale : 0);
  return isAc(one) - isAc(other) || scale(one) - scale(other);
}

/**
 * The ranges that read a quantity, in the order in which one is chosen: the smallest first, alternating current last.
 *
 * @throws {UnitNotKnown} for a unit that is not known
 */
export function fittingRanges<Range extends ChoosableRange>(
  ranges: readonly Range[],
  quantity: RangedQuantity,
): Range[] {
  return ranges.filter((range) => fits(range, quantity)).sort(byChoice);
}

function named<Range extends ChoosableRange>(
  ranges: readonly Range[],
  id: number,
  value: number,
  quantity: RangedQuantity,
): Range {
  const range = ranges.find((one) => one.id === id);
  if (!range) throw new RangeRefused('The instrument has no such range now. Choose another one.');
  if (!fits(range, quantity)) throw new RangeRefused(`The range ${range.name} does not read this. Choose another one.`);
  if (!holds(range, value))
    throw new RangeRefused(`${formatQuantity(value, quantity.unit)} is above the range ${range.name}.`);
  return range;
}

/**
 * The range a reading was taken on: the one it names, or else the smallest that holds the value.
 *
 * @param ranges those in use of its instrument
 * @param rangeId the range named; null lets the smallest be taken
 * @param value SI base unit
 * @returns undefined where the instrument has no accuracy specification for this quantity
 * @throws {RangeRefused} for a range that cannot have shown the value
 */
export function chosenRange<Range extends ChoosableRange>(
  ranges: readonly Range[],
  rangeId: number | null,
  value: number,
  quantity: RangedQuantity,
): Range | undefined {
  if (rangeId !== null) return named(ranges, rangeId, value, quantity);
  const fitting = fittingRanges(ranges, quantity);
  const found = fitting.find((range) => holds(range, value));
  if (found || fitting.length === 0) return found;
  throw new RangeRefused(`${formatQuantity(value, quantity.unit)} is above every range of this instrument.`);
}
