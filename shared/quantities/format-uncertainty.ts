import { inDisplayUnit } from './display-unit';
import { formatNumber } from './format-number';
import { withUnit } from './unit-label';

/**
 * An expanded uncertainty as it stands beside its value, ± 0.08 V: rounded to one significant digit, two where the first is 1.
 * Common practice; JCGM 100:2008, 7.2.6 asks for two at most.
 *
 * @param halfWidth in SI base units
 * @param unit display unit of the value; whether the value is peak to peak is said there and not again
 * @throws {UnitNotKnown}
 */
export function formatUncertainty(halfWidth: number, unit: string): string {
  return `±\u00a0${withUnit(uncertaintyDigits(halfWidth, unit), unit.replace(/ (p-p|rms)$/, ''))}`;
}

/** Decimals an uncertainty has in its display unit when it is written so; 0 for none. */
export function uncertaintyDecimals(halfWidth: number, unit: string): number {
  const { digits, rounded } = significant(inDisplayUnit(halfWidth, unit));
  return rounded === 0 ? 0 : Math.max(0, digits - 1 - Math.floor(Math.log10(rounded)));
}

/** The digits of an uncertainty in its display unit, without sign and unit. @throws {UnitNotKnown} */
export function uncertaintyDigits(halfWidth: number, unit: string): string {
  return formatNumber(significant(inDisplayUnit(halfWidth, unit)).rounded, uncertaintyDecimals(halfWidth, unit));
}

function significant(shown: number): { digits: number; rounded: number } {
  const digits = shown.toExponential().startsWith('1') ? 2 : 1;
  return { digits, rounded: Number(shown.toPrecision(digits)) };
}
