import { unitParts } from './display-unit';
import { type NumeralOptions } from './numeral';
import { readQuantity, toNumber } from './read-quantity';

/** Reads texts as readings of one characteristic, in SI base units. */
export type ReadingReader = (text: string, options?: NumeralOptions) => number;

/**
 * What parseReading does, for many readings of one characteristic: its unit is looked at once.
 *
 * @param unit display unit of the characteristic, "" for a plain number
 * @throws {UnitNotKnown} for an unknown unit
 */
export function readingReader(unit: string): ReadingReader {
  const wanted = unitParts(unit);
  return (text, options = {}) => {
    const written = readQuantity(text, wanted, options);
    return toNumber(written, text, written.bare ? wanted.places : 0);
  };
}

/**
 * Reads a reading typed for a characteristic and gives it in SI base units.
 *
 * A number alone is in the characteristic's own unit (185 under "mV p-p" is 0.185 V); with a prefix or a unit it is
 * absolute (0.185 V, 185m). What is understood is told at parseQuantity.
 *
 * @param unit display unit of the characteristic, "" for a plain number
 * @throws {AmbiguousQuantity} for what can be read in two ways, with a hint
 * @throws {QuantityNotUnderstood} for what cannot be read, or is in another unit, with a hint
 * @throws {UnitNotKnown} for an unknown unit
 */
export function parseReading(text: string, unit: string, options: NumeralOptions = {}): number {
  return readingReader(unit)(text, options);
}
