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
const isOpen = (judged: JudgedRule) => judged.verdict.verdict === 'not judged' || isConditional(judged);
const keyOf = ({ rule }: JudgedRule) => rule.characteristic.key;

/** A conditional reading as quality ruled on it. */
function settledBy(ruling: UnitReadings['ruling'], verdict: CharacteristicVerdict): CharacteristicVerdict {
  return ruling && verdict.verdict === 'conditional' ? { ...verdict, verdict: ruling } : verdict;
}

/** The worst class among failures that count on this unit; where none counts, the worst of all. */
function worstClassOf(failures: readonly JudgedRule[], unit: number): NonconformityClass | null {
  const counting = failures.filter(({ rule }) => unit <= rule.countsTo);
  const ranks = (counting.length > 0 ? counting : failures).map(({ rule }) => rule.rank);
  return NONCONFORMITY_CLASSES[Math.min(...ranks)] ?? null;
}

/**
 * What an undecided unit is taken to fail in when the sample is submitted: its conditional readings and, where it was set
 * aside, every characteristic left open on it. Where none is open, the doubt is about the unit as a whole: it fails in all it
 * was drawn for but the critical ones, since those were measured and conform (in these too where there are no others).
 */
function takenAsFailed(required: readonly JudgedRule[], setAside: boolean): readonly JudgedRule[] {
  const open = required.filter(setAside ? isOpen : isConditional);
  if (open.length > 0 || !setAside) return open;
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
 * Quality's ruling settles conditional readings, and a unit set aside; where it rules a unit set aside nonconforming, the unit
 * fails as it would on submission.
 *
 * @throws {RangeError} for a unit number that is not a whole number of at least 1, or a value that cannot be judged
 */
export function judgeUnit(rules: JudgingRules, readings: UnitReadings, options: JudgingOptions = {}): UnitVerdict {
  const { unit, ruling = null } = readings;
  if (!Number.isSafeInteger(unit) || unit < 1) throw new RangeError(`unit must be a whole number from 1, not ${unit}.`);
  const judged = rules.characteristics.map((rule) => ({
    rule,
    verdict: settledBy(ruling, judgeCharacteristic(rule.characteristic, readings, rules.decision)),
  }));
  const required = judged.filter(({ rule }) => unit <= rule.requiredTo);
  const setAside = readings.setAside !== null && ruling === null;
  const undecided = setAside || judged.some(isConditional);
  const ruledOut = ruling === 'nonconforming' && readings.setAside !== null;
  const settled =
    ruledOut || (undecided && options.submitting === true) ? takenAsFailed(required, setAside || ruledOut) : [];
  const failures = judged.filter((each) => fails(each) || settled.includes(each));
  const missing = setAside || ruledOut ? [] : required.filter(({ verdict }) => verdict.verdict === 'not judged');
  return {
    unit,
    verdict: unitVerdict(failures, undecided, missing.length),
    failed: failures.map(keyOf),
    worstClass: worstClassOf(failures, unit),
    missing: missing.map(keyOf),
    characteristics: new Map(judged.map((each) => [keyOf(each), each.verdict])),
  };
}
