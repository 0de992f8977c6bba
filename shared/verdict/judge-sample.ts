import { type SamplingGroup } from '../sampling/sampling-group';
import { judgeGroups } from './judge-groups';
import { judgeLot } from './judge-lot';
import { judgeUnit, type JudgingOptions } from './judge-unit';
import { judgingRules } from './judging-rules';
import { type JudgedCharacteristic, type SampleVerdict, type UnitReadings } from './sample-verdict';

export type {
  CharacteristicVerdict,
  GroupVerdict,
  JudgedCharacteristic,
  LotVerdict,
  SampleVerdict,
  UnitReadings,
  UnitVerdict,
} from './sample-verdict';

/** A sample to be judged. */
export interface JudgeSampleInput extends JudgingOptions {
  characteristics: readonly JudgedCharacteristic[];
  groups: readonly SamplingGroup[];
  /** The units with readings, in any order; units not yet measured may be left out. */
  units: readonly UnitReadings[];
}

/**
 * Judges a whole sample: every unit, every sampling group and the lot, each with its reason. Values are in SI base units.
 *
 * For one keystroke keep {@link judgingRules}, judge the one unit with {@link judgeUnit} and combine again with
 * {@link judgeGroups} and {@link judgeLot}.
 *
 * @throws {RangeError} for a unit given twice, a characteristic outside every group, or a value that cannot be judged
 */
export function judgeSample({ characteristics, groups, units, submitting }: JudgeSampleInput): SampleVerdict {
  const numbers = new Set(units.map(({ unit }) => unit));
  if (numbers.size !== units.length) throw new RangeError('units must name each unit once.');
  const rules = judgingRules(characteristics, groups);
  const unitVerdicts = units.map((unit) => judgeUnit(rules, unit, { submitting }));
  const groupVerdicts = judgeGroups(rules, unitVerdicts);
  return { units: unitVerdicts, groups: groupVerdicts, lot: judgeLot(rules, unitVerdicts, groupVerdicts) };
}
