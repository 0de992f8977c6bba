import { ReadingNotFinite } from '../measurement/reading-not-finite';

/** What a reading says about its characteristic; "conditional" belongs to decision rules with guard bands on both sides. */
export type ReadingVerdict = 'conforming' | 'conditional' | 'nonconforming';

/** Limits in the unit of the reading; null is no limit. */
export interface Limits {
  lower: number | null;
  upper: number | null;
}

/**
 * Share of a limit by which a value may pass it and still count as at it. Binary arithmetic leaves the last digit of a
 * computed value uncertain at about 1e-16; no instrument resolves 1e-12.
 */
const ROUNDING = 1e-12;

/**
 * Judges a reading by simple acceptance: it conforms inside the limits and at them.
 *
 * Source: ILAC-G8:09/2019, simple acceptance (guard band 0).
 *
 * @param value reading in the unit of the limits
 * @throws {ReadingNotFinite} for NaN or an infinite value
 * @throws {RangeError} where the lower limit is above the upper one
 */
export function judgeValue(value: number, { lower, upper }: Limits): ReadingVerdict {
  if (!Number.isFinite(value)) throw new ReadingNotFinite('value', value);
  if (lower !== null && upper !== null && lower > upper) {
    throw new RangeError(`limits: the lower limit ${lower} is above the upper limit ${upper}.`);
  }
  if (lower !== null && value < lower - ROUNDING * Math.abs(lower)) return 'nonconforming';
  if (upper !== null && value > upper + ROUNDING * Math.abs(upper)) return 'nonconforming';
  return 'conforming';
}

/** Judges an attribute: a pass conforms, a fail does not. */
export function judgeAttribute(pass: boolean): ReadingVerdict {
  return pass ? 'conforming' : 'nonconforming';
}
