import { acceptanceLimits, leavesNoAcceptance, type DecisionRule } from '../uncertainty/guard-band';
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

/** What a decision rule says of a reading; `side` tells on which side of the limit a conditional one lies. */
export interface ReadingJudgement {
  verdict: ReadingVerdict | 'not judged';
  side: 'inside' | 'outside' | null;
}

/** The decision rule of a plan with the expanded uncertainty of the reading; null where that is not known. */
export interface Decision {
  rule: DecisionRule;
  expandedUncertainty: number | null;
}

function accepts(value: number, limits: Limits, width: number): boolean {
  return !leavesNoAcceptance(limits, width) && judgeValue(value, acceptanceLimits(limits, width)) === 'conforming';
}

/**
 * Judges a reading by the plan's decision rule; limits themselves belong to the better side.
 *
 * Simple acceptance: the limits as they are. Guarded acceptance: the limits pulled in by U. Non-binary: a guard band of U on
 * both sides of each limit, in which a reading is conditional. A reading whose uncertainty is not known is not judged by a
 * rule that needs it: it is never taken for a pass.
 *
 * Source: ILAC-G8:09/2019, 4.2 and Table 2.
 *
 * @param value reading in the unit of the limits
 * @throws {ReadingNotFinite} for NaN or an infinite value
 * @throws {RangeError} where the lower limit is above the upper one
 */
export function judgeReading(value: number, limits: Limits, { rule, expandedUncertainty }: Decision): ReadingJudgement {
  const plain = judgeValue(value, limits);
  if (rule === 'simple' || (limits.lower === null && limits.upper === null)) return { verdict: plain, side: null };
  if (expandedUncertainty === null) return { verdict: 'not judged', side: null };
  if (accepts(value, limits, expandedUncertainty)) return { verdict: 'conforming', side: null };
  if (rule === 'guarded' || !accepts(value, limits, -expandedUncertainty))
    return { verdict: 'nonconforming', side: null };
  return { verdict: 'conditional', side: plain === 'conforming' ? 'inside' : 'outside' };
}

/** Judges an attribute: a pass conforms, a fail does not. */
export function judgeAttribute(pass: boolean): ReadingVerdict {
  return pass ? 'conforming' : 'nonconforming';
}
