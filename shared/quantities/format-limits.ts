import { inDisplayUnit } from './display-unit';
import { formatNumber } from './format-number';
import { withUnit } from './unit-label';

/**
 * Limits in words: "max 2.40 V", "min 100 MΩ", "15.80 to 18.20 V", "no limit".
 *
 * @param lower in SI base units, null for none
 * @param upper in SI base units, null for none
 * @param unit display unit of the characteristic
 * @throws {UnitNotKnown}
 * @throws {RangeError} for a limit that is not finite or decimals outside 0 to 15
 */
export function formatLimits(lower: number | null, upper: number | null, unit: string, decimals: number): string {
  const digits = (limit: number) => formatNumber(inDisplayUnit(limit, unit), decimals);
  if (lower !== null && upper !== null) return withUnit(`${digits(lower)} to ${digits(upper)}`, unit);
  if (lower !== null) return withUnit(`min ${digits(lower)}`, unit);
  return upper === null ? 'no limit' : withUnit(`max ${digits(upper)}`, unit);
}
