import { inDisplayUnit } from '../quantities/display-unit';
import { formatNumber } from '../quantities/format-number';

const NB = '\u00a0';
const SUPERSCRIPTS = new Map([...'-0123456789'].map((digit, nth) => [digit, '⁻⁰¹²³⁴⁵⁶⁷⁸⁹'.charAt(nth)]));

/** Figures of a number whose size is not known beforehand. */
const DIGITS = 4;
/** Below and from these powers of ten a number is written with one. */
const SMALLEST_POWER = -5;
const LARGEST_POWER = 7;

function withPower(value: number): string {
  const [digits = '', power = ''] = value.toExponential(DIGITS - 1).split('e');
  const raised = [...power.replace('+', '')].map((digit) => SUPERSCRIPTS.get(digit) ?? digit).join('');
  return `${digits.replace('-', '−')}${NB}×${NB}10${raised}`;
}

/** A number with four significant digits; very small and very large ones with a power of ten. */
export function figureText(value: number): string {
  if (value === 0) return '0';
  const power = Math.floor(Math.log10(Math.abs(Number(value.toPrecision(DIGITS)))));
  if (power < SMALLEST_POWER || power >= LARGEST_POWER) return withPower(value);
  return formatNumber(value, Math.max(0, DIGITS - 1 - power));
}

/** A fraction as a percentage with one decimal, "27.9 %", or where it is huge as figures; a dash where there is none. */
export function percentText(fraction: number | null): string {
  if (fraction === null) return '–';
  const percent = fraction * 100;
  return `${percent < 10 ** LARGEST_POWER ? formatNumber(percent, 1) : figureText(percent)}${NB}%`;
}

/** A chance with three decimals: "0.974"; below a thousandth only that it is. */
export function chanceText(p: number): string {
  return p < 0.001 ? `<${NB}0.001` : formatNumber(p, 3);
}

/**
 * A standard deviation of a study in its display unit, without the unit.
 *
 * @param sigma in SI base units
 * @throws {UnitNotKnown}
 */
export function sigmaText(sigma: number, unit: string): string {
  return figureText(inDisplayUnit(sigma, unit));
}

/**
 * A sum or a mean of squares of a study in the square of its display unit, without the unit.
 *
 * @param squares in the square of SI base units
 * @throws {UnitNotKnown}
 */
export function squaresText(squares: number, unit: string): string {
  return figureText(inDisplayUnit(inDisplayUnit(squares, unit), unit));
}
