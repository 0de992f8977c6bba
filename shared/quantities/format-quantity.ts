import { unitParts, type UnitParts } from './display-unit';
import { formatNumber } from './format-number';
import { PREFIX_PLACES } from './prefixes';
import { shiftDecimal } from './shift-decimal';
import { withUnit } from './unit-label';

export { displayUnit, fromDisplayUnit, inDisplayUnit } from './display-unit';
export { formatLimits } from './format-limits';
export { formatNumber } from './format-number';

/** How a quantity is shown. */
export interface FormatQuantityOptions {
  /** Decimals behind the prefixed number. */
  decimals?: number;
  /** Significant digits, where decimals are not given. With neither, up to four, without trailing zeros. */
  significant?: number;
  /** The prefix: by size ("auto"), never ("none"), or a given one. */
  prefix?: 'auto' | 'none' | 'p' | 'n' | 'µ' | 'm' | 'k' | 'M' | 'G';
}

const USUAL_DIGITS = 4;

/** A number rounded to significant digits shows so many decimals. */
function decimalsFor(value: number, significant: number): number {
  if (value === 0) return 0;
  const rounded = Number(Math.abs(value).toPrecision(significant));
  return Math.max(0, significant - 1 - Math.floor(Math.log10(rounded)));
}

function roundedTo(value: number, { decimals, significant = USUAL_DIGITS }: FormatQuantityOptions): number {
  if (decimals === undefined) return Number(Math.abs(value).toPrecision(significant));
  return shiftDecimal(Math.round(shiftDecimal(Math.abs(value), decimals)), -decimals);
}

/** The largest prefix that leaves at least 1, judged on the rounded number so that 999.96 mV becomes 1.0 V. */
function prefixBySize(value: number, prefixes: readonly string[], options: FormatQuantityOptions): string {
  const placesOf = (prefix: string) => PREFIX_PLACES.get(prefix) ?? 0;
  if (value === 0) return '';
  const fits = (prefix: string) => roundedTo(shiftDecimal(value, 3 - placesOf(prefix)), options) >= 1000;
  return prefixes.findLast(fits) ?? prefixes[0] ?? '';
}

function prefixFor(value: number, { unit }: UnitParts, options: FormatQuantityOptions): string {
  const { prefix = 'auto' } = options;
  const known = unit?.prefixes ?? [''];
  if (known.length === 1 || prefix === 'none') return '';
  return prefix === 'auto' ? prefixBySize(value, known, options) : prefix;
}

function digitsOf(value: number, { decimals, significant }: FormatQuantityOptions): string {
  if (decimals !== undefined) return formatNumber(value, decimals);
  if (significant !== undefined) return formatNumber(value, decimalsFor(value, significant));
  const digits = formatNumber(value, decimalsFor(value, USUAL_DIGITS));
  return digits.includes('.') ? digits.replace(/\.?0+$/, '') : digits;
}

/**
 * A quantity as pages print it, its prefix chosen so that 1 to 999 show: 185 mV, 1.85 V, 100 MΩ. Capacitances stay in
 * microfarads up to the farad: 2 200 µF.
 *
 * @param value in SI base units
 * @param unit the unit, of which a prefix is dropped: "V" and "mV" are the same here
 * @throws {UnitNotKnown}
 * @throws {RangeError} for a value that is not finite, or digits that cannot be shown
 */
export function formatQuantity(value: number, unit: string, options: FormatQuantityOptions = {}): string {
  const parts = unitParts(unit);
  if (!Number.isFinite(value)) throw new RangeError(`value must be a finite number, not ${value}.`);
  const prefix = prefixFor(value, parts, options);
  const places = (PREFIX_PLACES.get(prefix) ?? 0) + (parts.unit?.places ?? 0);
  const label = [prefix + (parts.unit?.symbol ?? ''), parts.qualifier].filter((word) => word !== null).join(' ');
  return withUnit(digitsOf(shiftDecimal(value, -places), options), label);
}
