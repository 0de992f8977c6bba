import { type SamplingGroup } from '../sampling/sampling-group';
import { NONCONFORMITY_CLASSES, type NonconformityClass } from '../sampling/scheme';
import { USUAL_COVERAGE_FACTOR } from '../uncertainty/expanded-uncertainty';
import { type DecisionRule } from '../uncertainty/guard-band';
import { type JudgedCharacteristic } from './sample-verdict';

/** A characteristic with the units it is required on. */
export interface JudgingRule {
  characteristic: JudgedCharacteristic;
  /** Its reading is required on units 1 to this one, in draw order. */
  requiredTo: number;
  /** Its failure counts on units 1 to this one; without end for a critical characteristic. */
  countsTo: number;
  /** Rank of its class, 0 for critical. */
  rank: number;
}

/** How measurement uncertainty enters the verdicts: the rule, and k. */
export interface DecisionRules {
  rule: DecisionRule;
  coverageFactor: number;
}
const SIMPLE_ACCEPTANCE: DecisionRules = { rule: 'simple', coverageFactor: USUAL_COVERAGE_FACTOR };

/** What judges the units of one lot, prepared once so that a single unit can be judged again on every keystroke. */
export interface JudgingRules {
  /** In the order of the plan. */
  characteristics: readonly JudgingRule[];
  groups: readonly SamplingGroup[];
  decision: DecisionRules;
  /** Units in the whole sample: the largest of all groups. */
  sampleSize: number;
}

/** Rank of a class, 0 for critical: the smaller, the worse. */
export function classRank(nonconformityClass: NonconformityClass): number {
  return NONCONFORMITY_CLASSES.indexOf(nonconformityClass);
}

/** An input of a computed characteristic is required wherever what is computed from it is. */
function requiredTo(key: string, characteristics: readonly JudgedCharacteristic[], reach: ReadonlyMap<string, number>) {
  const users = characteristics.filter(({ formula }) => formula && Object.values(formula.inputs).includes(key));
  return Math.max(reach.get(key) ?? 0, ...users.map((user) => reach.get(user.key) ?? 0));
}

/**
 * Prepares the judging of a lot's units.
 *
 * Each group is judged on its first units in draw order, as many as its sample size; a critical failure counts on every
 * unit measured.
 *
 * @param decision simple acceptance unless the plan says otherwise
 * @throws {RangeError} where there is no group, or a characteristic belongs to none
 */
export function judgingRules(
  characteristics: readonly JudgedCharacteristic[],
  groups: readonly SamplingGroup[],
  decision: DecisionRules = SIMPLE_ACCEPTANCE,
): JudgingRules {
  if (groups.length === 0) throw new RangeError('groups must hold at least one sampling group.');
  const reach = new Map(groups.flatMap((group) => group.characteristicKeys.map((key) => [key, group.sampleSize])));
  const rules = characteristics.map((characteristic) => {
    const covered = reach.get(characteristic.key);
    if (covered === undefined) throw new RangeError(`characteristics: ${characteristic.key} is in no sampling group.`);
    return {
      characteristic,
      requiredTo: requiredTo(characteristic.key, characteristics, reach),
      countsTo: characteristic.class === 'critical' ? Infinity : covered,
      rank: classRank(characteristic.class),
    };
  });
  const sampleSize = Math.max(...groups.map((group) => group.sampleSize));
  return { characteristics: rules, groups, decision, sampleSize };
}
