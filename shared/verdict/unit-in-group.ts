import { type SamplingGroup } from '../sampling/sampling-group';
import { classRank, type JudgingRule } from './judging-rules';
import { type UnitVerdict } from './sample-verdict';

/** What one unit means to one sampling group. */
export interface UnitInGroup {
  /** Whether the unit counts as nonconforming in the group. */
  counts: boolean;
  /** Whether something of the group is left to be judged on the unit; a unit beyond the group's sample is "outside". */
  state: 'judged' | 'undecided' | 'open' | 'outside';
}

function stateOf(group: SamplingGroup, unit: UnitVerdict): UnitInGroup['state'] {
  if (unit.unit > group.sampleSize) return 'outside';
  if (unit.setAside && unit.verdict === 'undecided') return 'undecided';
  if (unit.worstClass !== null && classRank(unit.worstClass) < classRank(group.class)) return 'judged';
  if (group.characteristicKeys.some((key) => unit.failed.includes(key))) return 'judged';
  let undecided = false;
  for (const key of group.characteristicKeys) {
    const verdict = unit.characteristics.get(key)?.verdict;
    if (verdict === 'conforming' || verdict === 'nonconforming') continue;
    if (unit.missing.includes(key)) return 'open';
    undecided = true;
  }
  return undecided ? 'undecided' : 'judged';
}

/**
 * What one unit means to one sampling group.
 *
 * A unit counts at its worst class only, once in each group of that class in which it fails, on the units that the group
 * covers; a critical failure counts on every unit. A unit that counts, here or at a worse class, is judged: what is
 * missing on it could not change this group any more. A unit set aside is undecided in all its groups, one with a conditional
 * reading in those that judge it.
 * Source: MIL-STD-105E, definitions of the critical, major and minor nonconforming unit.
 */
export function unitInGroup(group: SamplingGroup, unit: UnitVerdict): UnitInGroup {
  const state = stateOf(group, unit);
  const reached = state !== 'outside' || group.class === 'critical';
  const fails = group.characteristicKeys.some((key) => unit.failed.includes(key));
  return { counts: reached && fails && unit.worstClass === group.class, state };
}

/**
 * Whether a unit that counts stays at its class: nothing worse is still open on it. A unit counted as minor moves to major
 * when a major reading, taken later, fails.
 */
export function staysAtClass(rules: readonly JudgingRule[], unit: UnitVerdict): boolean {
  if (unit.worstClass === null) return true;
  const rank = classRank(unit.worstClass);
  return rules.every((rule) => {
    if (rule.rank >= rank || unit.unit > rule.requiredTo) return true;
    const { key } = rule.characteristic;
    const verdict = unit.characteristics.get(key)?.verdict;
    return verdict === 'conforming' || unit.failed.includes(key);
  });
}
