import { inDisplayUnit } from '#shared/quantities/display-unit';
import { formatNumber } from '#shared/quantities/format-number';
import { withUnit } from '#shared/quantities/unit-label';

/** A reading's digits in its characteristic's unit; `value` is in SI base units. */
export function readingDigits(value: number, unit: string, decimals: number): string {
  return formatNumber(inDisplayUnit(value, unit), decimals);
}

/** A reading with its unit: 1.85 V p-p. */
export function readingText(value: number, unit: string, decimals: number): string {
  return withUnit(readingDigits(value, unit, decimals), unit);
}
