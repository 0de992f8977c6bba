import { formatNumber } from '#shared/quantities/format-number';
import { displayUnit, inDisplayUnit } from '#shared/quantities/format-quantity';

const SPACE = '\u00a0';

/** A reading's digits in its characteristic's unit; `value` is in SI base units. */
export function readingDigits(value: number, unit: string, decimals: number): string {
  return formatNumber(inDisplayUnit(value, unit), decimals);
}

/** A reading with its unit: 1.85 V p-p. */
export function readingText(value: number, unit: string, decimals: number): string {
  const label = unit === '' ? '' : `${SPACE}${displayUnit(unit).label}`;
  return `${readingDigits(value, unit, decimals)}${label}`;
}
