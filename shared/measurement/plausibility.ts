import { formatBand } from '../quantities/format-band';
import { formatQuantity } from '../quantities/format-quantity';

/** What a part ought to give, in the unit of the reading. */
export interface ExpectedBand {
  low: number;
  high: number;
}

/** How a scope was set when a reading was taken off it; null for a reading that was typed as it stood on a display. */
export type ScopeSetting = { voltsPerDivision: number; probeFactor: number } | null;

/** The likeliest slip: what a reading is divided by to lie in the band. */
export interface Slip {
  kind: 'factor' | 'scale-step';
  /** 10: ten times too much; 0.1: a tenth. 2, 2.5, 4 or 5, or one over these, for a neighbouring step of the scale. */
  factor: number;
}

/** Whether a reading is what its part can give. */
export type Plausibility =
  | { state: 'inside' }
  /** Noted beside the value. `ratio`: times above the band, or (below 1) of it. */
  | { state: 'outside'; ratio: number; slip: Slip | null }
  /** To be corrected, or confirmed with a reason. */
  | { state: 'question'; ratio: number; slip: Slip | null };

/**
 * A reading beyond this many times the band is a question rather than a note. Three times is more than any sound tolerance
 * leaves and less than the smallest slip by ten. Common practice, no source.
 */
export const QUESTION_FACTOR = 3;

/** Slips by a power of ten: the probe's switch first, then a prefix (m for µ or none), then both at once. */
const FACTORS = [10, 1000, 100] as const;
/** From a step of the 1-2-5 sequence to its neighbours, near ones first. */
const SCALE_STEPS = [2, 2.5, 5, 4] as const;

/** Twelve digits: what lies at a bound is inside, whatever binary arithmetic made of it. */
const ROUNDING = 1e-12;

function isInside(value: number, { low, high }: ExpectedBand): boolean {
  return value >= low * (1 - ROUNDING) && value <= high * (1 + ROUNDING);
}

/** Of several factors the first in their order that brings the value into the band, upwards and downwards. */
function slipOf(value: number, band: ExpectedBand, kind: Slip['kind'], factors: readonly number[]): Slip | null {
  for (const factor of factors) {
    if (isInside(value / factor, band)) return { kind, factor };
    if (isInside(value * factor, band)) return { kind, factor: 1 / factor };
  }
  return null;
}

function likeliestSlip(value: number, band: ExpectedBand, scope: ScopeSetting): Slip | null {
  const factor = slipOf(value, band, 'factor', FACTORS);
  if (factor || scope === null) return factor;
  return slipOf(value, band, 'scale-step', SCALE_STEPS);
}

/**
 * Compares a reading with what its part ought to give. It is advice: it asks, and never changes a verdict.
 *
 * @param value in the unit of the band, SI base unit
 * @throws {RangeError} for a value that is not finite, or a band without a positive lower bound below its upper one
 */
export function plausibility(
  value: number,
  band: ExpectedBand,
  { scope = null }: { scope?: ScopeSetting } = {},
): Plausibility {
  if (!Number.isFinite(value)) throw new RangeError('value must be a number.');
  if (!(band.low > 0 && band.high >= band.low && Number.isFinite(band.high)))
    throw new RangeError('band must be from a number above 0 to one not below it.');
  if (isInside(value, band)) return { state: 'inside' };
  const ratio = value > band.high ? value / band.high : value / band.low;
  const wide = { low: band.low / QUESTION_FACTOR, high: band.high * QUESTION_FACTOR };
  const slip = likeliestSlip(value, band, scope);
  return { state: isInside(value, wide) ? 'outside' : 'question', ratio, slip };
}

/** The value that would have been read without the slip. */
export function correctedBy({ factor }: Slip, value: number): number {
  return Number((value / factor).toPrecision(12));
}

function bandWords({ low, high }: ExpectedBand, unit: string): string {
  return formatBand(low, high, unit, { significant: 3 });
}

const TIMES = new Map([
  [10, 'ten times'],
  [100, 'a hundred times'],
  [1000, 'a thousand times'],
]);

/** Factors that a probe's switch can be set to. */
const PROBES: readonly number[] = [1, 10, 100];

/**
 * What to look at, for the likeliest slip.
 *
 * @param scope how the scope was set; null for a display, undefined where it is not known
 */
export function slipAdvice(slip: Slip, scope?: ScopeSetting): string {
  if (scope === null) return 'Look at the decimal point and at the prefix of the unit.';
  const size = slip.factor > 1 ? slip.factor : 1 / slip.factor;
  if (slip.kind === 'scale-step') return 'Look at the volts per division: a neighbouring step would fit.';
  if (Math.round(size) !== 10) return 'Look at the prefix of the unit, and at the probe.';
  const isProbe = scope === undefined || PROBES.includes(Number((scope.probeFactor / slip.factor).toPrecision(6)));
  return isProbe ? 'Look at the switch on the probe.' : 'Look at the volts per division.';
}

function slipWords({ factor, kind }: Slip): string {
  const size = factor > 1 ? factor : 1 / factor;
  const times = kind === 'factor' ? (TIMES.get(Math.round(size)) ?? '') : `${Number(size.toPrecision(3))} times`;
  return `${times} ${factor > 1 ? 'less' : 'more'} would fit`;
}

function farWords(ratio: number): string {
  if (ratio <= 0) return 'not';
  const size = ratio > 1 ? ratio : 1 / ratio;
  const times = size < 1.05 ? 'a little' : `${formatQuantity(size, '', { significant: 2 })} times`;
  return `${times} ${ratio > 1 ? 'more' : 'less'} than`;
}

/**
 * The question in words: the value, how far it is from what the part can give, the expected band, and the likeliest slip.
 *
 * @param unit display unit of the value, whose SI base unit value and band are in
 * @param scope how the scope was set; null for a display, undefined where it is not known
 */
export function plausibilitySentence(
  value: number,
  band: ExpectedBand,
  found: Exclude<Plausibility, { state: 'inside' }>,
  unit: string,
  scope?: ScopeSetting,
): string {
  const shown = formatQuantity(value, unit, { significant: 3 });
  const can = `what this part can give (${bandWords(band, unit)})`;
  if (found.slip === null)
    return `${shown} is ${farWords(found.ratio)} ${can}. Look at the load, the connection and the ${scope === null ? 'range' : 'scale'}.`;
  const side = found.ratio > 1 ? 'more' : 'less';
  return `${shown} is ${side} than ${can}; ${slipWords(found.slip)}. ${slipAdvice(found.slip, scope)}`;
}
