import { NONCONFORMITY_CLASSES, type NonconformityClass } from '../sampling/scheme';
import { judgeCharacteristic } from './judge-characteristic';
import { type JudgingRule, type JudgingRules } from './judging-rules';
import { type CharacteristicVerdict, type UnitReadings, type UnitVerdict } from './sample-verdict';

/** How a unit is judged. */
export interface JudgingOptions {
  /** Whether the sample is being submitted: a unit still undecided then counts as nonconforming. */
  submitting?: boolean;
}

interface JudgedRule {
  rule: JudgingRule;
  verdict: CharacteristicVerdict;
}

const fails = ({ verdict }: JudgedRule) => verdict.verdict === 'nonconforming';
const isConditional = ({ verdict }: JudgedRule) => verdict.verdict === 'conditional';
const isUnjudged = ({ verdict }: JudgedRule) => verdict.verdict === 'not judged';
const isRequiredOn =
  (unit: number) =>
  ({ rule }: JudgedRule) =>
    unit <= rule.requiredTo;
const keyOf = ({ rule }: JudgedRule) => rule.characteristic.key;

/** Conditional readings as quality ruled on them. */
function settledBy(ruling: UnitReadings['ruling'], judged: readonly JudgedRule[]): readonly JudgedRule[] {
  if (!ruling) return judged;
  return judged.map((each) =>
    isConditional(each) ? { ...each, verdict: { ...each.verdict, verdict: ruling } } : each,
  );
}

/** The worst class among failures that count on this unit; where none counts, the worst of all. */
function worstClassOf(failures: readonly JudgedRule[], unit: number): NonconformityClass | null {
  const counting = failures.filter(({ rule }) => unit <= rule.countsTo);
  const ranks = (counting.length > 0 ? counting : failures).map(({ rule }) => rule.rank);
  return NONCONFORMITY_CLASSES[Math.min(...ranks)] ?? null;
}

/**
 * What an undecided unit is taken to fail in when the sample is submitted, or quality rules it nonconforming: its conditional
 * readings and, where it was set aside, every characteristic it was drawn for and that is left open on it. Where none is open,
 * the doubt is about the unit as a whole: it fails in all it was drawn for but the critical ones, since those were measured and
 * conform (in these too where there are no others).
 */
function takenAsFailed(judged: readonly JudgedRule[], unit: number, setAside: boolean): readonly JudgedRule[] {
  const conditional = judged.filter(isConditional);
  if (!setAside) return conditional;
  const required = judged.filter(isRequiredOn(unit));
  const open = [...conditional, ...required.filter(isUnjudged)];
  if (open.length > 0) return open;
  const lesser = required.filter(({ rule }) => rule.characteristic.class !== 'critical');
  return lesser.length > 0 ? lesser : required;
}

function unitVerdict(failures: readonly JudgedRule[], undecided: boolean, missing: number): UnitVerdict['verdict'] {
  if (failures.length > 0) return 'nonconforming';
  if (undecided) return 'undecided';
  return missing > 0 ? 'not judged' : 'conforming';
}

/**
 * Judges one unit: nonconforming as soon as one characteristic fails, undecided when it was set aside or a reading is
 * conditional, not judged while a required reading is missing.
 *
 * A characteristic is required only on the units its group covers. Measured beyond them it is judged and shown, and
 * makes the unit nonconforming, but counts in no group unless it is critical.
 *
 * When the sample is submitted, an undecided unit becomes nonconforming in the characteristics left open on it (where none
 * is, in all it was drawn for but the critical) and counts at the worst class among them and what it failed in anyway.
 *
 * Quality's ruling settles conditional readings, and a unit set aside: ruled nonconforming, the unit fails as it would on
 * submission. It makes no failed reading good, and no missing one.
 *
 * @throws {RangeError} for a unit number that is not a whole number of at least 1, or a value that cannot be judged
 */
export function judgeUnit(rules: JudgingRules, readings: UnitReadings, options: JudgingOptions = {}): UnitVerdict {
  const { unit, ruling = null } = readings;
  if (!Number.isSafeInteger(unit) || unit < 1) throw new RangeError(`unit must be a whole number from 1, not ${unit}.`);
  const found = rules.characteristics.map((rule) => ({
    rule,
    verdict: judgeCharacteristic(rule.characteristic, readings, rules.decision),
  }));
  const marked = readings.setAside !== null;
  const setAside = marked && ruling === null;
  const undecided = setAside || (ruling === null && found.some(isConditional));
  const ruledOut = ruling === 'nonconforming' || (undecided && options.submitting === true);
  const taken = ruledOut ? takenAsFailed(found, unit, marked).map(keyOf) : [];
  const judged = settledBy(ruling, found);
  const failures = judged.filter((each) => fails(each) || taken.includes(keyOf(each)));
  const waived = marked && ruling !== 'conforming';
  const missing = waived ? [] : judged.filter(isRequiredOn(unit)).filter(isUnjudged);
  return {
    unit,
    verdict: unitVerdict(failures, undecided, missing.length),
    setAside,
    failed: failures.map(keyOf),
    worstClass: worstClassOf(failures, unit),
    missing: missing.map(keyOf),
    characteristics: new Map(judged.map((each) => [keyOf(each), each.verdict])),
  };
}
