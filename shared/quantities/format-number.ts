import { shiftDecimal } from './shift-decimal';

/** Narrow no-break space, between groups of three digits. */
const THOUSANDS = '\u202f';

/** The true minus sign. */
const MINUS = '\u2212';

function demandDecimals(decimals: number): void {
  if (!Number.isInteger(decimals) || decimals < 0 || decimals > 15) {
    throw new RangeError(`decimals must be a whole number from 0 to 15, not ${decimals}.`);
  }
}

/** Digits of a rounded magnitude with a fixed number of decimals; halves round away from zero, as written in decimal. */
function fixedDigits(magnitude: number, decimals: number): string {
  const steps = Math.round(shiftDecimal(magnitude, decimals));
  if (!Number.isSafeInteger(steps)) return magnitude.toFixed(decimals);
  const digits = String(steps).padStart(decimals + 1, '0');
  const whole = digits.slice(0, digits.length - decimals);
  return decimals === 0 ? whole : `${whole}.${digits.slice(digits.length - decimals)}`;
}

/**
 * A number as every page and paper prints it: decimal point, narrow no-break space between thousands, true minus sign,
 * a fixed number of decimals. Halves round away from zero on the decimal value (1.005 to two decimals is 1.01).
 *
 * @throws {RangeError} for a value that is not finite or below 1e21 in magnitude, or decimals outside 0 to 15
 */
export function formatNumber(value: number, decimals: number): string {
  if (!Number.isFinite(value) || Math.abs(value) >= 1e21) {
    throw new RangeError(`value must be a finite number below 1e21, not ${value}.`);
  }
  demandDecimals(decimals);
  const [whole = '', fraction] = fixedDigits(Math.abs(value), decimals).split('.');
  const grouped = whole.replace(/\B(?=(\d{3})+$)/g, THOUSANDS);
  const text = fraction === undefined ? grouped : `${grouped}.${fraction}`;
  return value < 0 && /[1-9]/.test(text) ? MINUS + text : text;
}
