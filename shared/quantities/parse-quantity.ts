import { unitParts } from './display-unit';
import { type NumeralOptions } from './numeral';
import { readQuantity, toNumber } from './read-quantity';

export { AmbiguousQuantity, QuantityNotUnderstood } from './quantity-not-understood';

/** How a quantity is read. */
export interface ParseQuantityOptions extends NumeralOptions {
  /** The unit of the field; a typed unit must then be it, with or without prefix. Unless given, any known unit is taken. */
  unit?: string;
}

/**
 * Reads a quantity as people write it and gives it in SI base units; a number alone is in them already.
 *
 * Understood are SI prefixes with or without a unit (35m, 35 mV), a letter as decimal point (4k7, 4u7, 4R7; IEC 60062), a power
 * of ten (1.2e-3), spaces between thousands and the true minus sign. The result is the number nearest to the decimal written.
 *
 * @throws {AmbiguousQuantity} for what can be read in two ways, with a hint
 * @throws {QuantityNotUnderstood} for what cannot be read, or a unit that is not the field's, with a hint
 * @throws {UnitNotKnown} for an unknown options.unit
 * @example parseQuantity('35 mV', { unit: 'V' }) // 0.035
 */
export function parseQuantity(text: string, options: ParseQuantityOptions = {}): number {
  const wanted = options.unit === undefined ? null : unitParts(options.unit);
  return toNumber(readQuantity(text, wanted, options), text);
}
