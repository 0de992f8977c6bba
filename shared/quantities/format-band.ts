import { formatQuantity, type FormatQuantityOptions } from './format-quantity';

const BETWEEN_NUMBER_AND_UNIT = '\u00a0';

function apart(quantity: string): { digits: string; unit: string } {
  const at = quantity.indexOf(BETWEEN_NUMBER_AND_UNIT);
  return at < 0 ? { digits: quantity, unit: '' } : { digits: quantity.slice(0, at), unit: quantity.slice(at) };
}

/**
 * A band in words, its unit said once where both ends have the same: "1.5 to 2.3 V", "850 mV to 1.2 V".
 *
 * @param low in SI base units
 * @param high in SI base units
 * @param unit the unit, of which a prefix is dropped, as in formatQuantity
 * @throws {UnitNotKnown}
 * @throws {RangeError} for a value that is not finite, or digits that cannot be shown
 */
export function formatBand(low: number, high: number, unit: string, options: FormatQuantityOptions = {}): string {
  const [from, to] = [formatQuantity(low, unit, options), formatQuantity(high, unit, options)];
  return apart(from).unit === apart(to).unit ? `${apart(from).digits} to ${to}` : `${from} to ${to}`;
}
