import { combinedStandardUncertainty } from '../uncertainty/combine';
import { expandedUncertainty } from '../uncertainty/expanded-uncertainty';
import { computedUncertainty } from './computed-uncertainty';
import { computedValue } from './computed-value';
import { type DecisionRules } from './judging-rules';
import { judgeAttribute, judgeReading } from './reading-verdict';
import { type CharacteristicVerdict, type JudgedCharacteristic, type UnitReadings } from './sample-verdict';

type Readings = Pick<UnitReadings, 'values' | 'components'>;

const NOT_JUDGED: CharacteristicVerdict = { value: null, verdict: 'not judged', side: null, expandedUncertainty: null };

function judgeAgainstLimits(
  value: number,
  { lowerLimit, upperLimit }: JudgedCharacteristic,
  rule: DecisionRules['rule'],
  uncertainty: number | null,
): CharacteristicVerdict {
  const limits = { lower: lowerLimit, upper: upperLimit };
  return {
    value,
    ...judgeReading(value, limits, { rule, expandedUncertainty: uncertainty }),
    expandedUncertainty: uncertainty,
  };
}

function uncertaintyOfMeasured(key: string, { components }: Readings, decision: DecisionRules): number | null {
  const own = decision.rule === 'simple' ? undefined : components?.get(key);
  return own === undefined ? null : expandedUncertainty(own, decision.coverageFactor);
}

function uncertaintyOfComputed(
  characteristic: JudgedCharacteristic,
  { values, components }: Readings,
  decision: DecisionRules,
): number | null {
  if (decision.rule === 'simple' || components === undefined) return null;
  const propagated = computedUncertainty(characteristic, values, components);
  return propagated === undefined ? null : decision.coverageFactor * combinedStandardUncertainty(propagated.components);
}

function judgeComputed(
  characteristic: JudgedCharacteristic,
  readings: Readings,
  decision: DecisionRules,
): CharacteristicVerdict {
  const computed = computedValue(characteristic, readings.values);
  if (computed.state === 'missing') return NOT_JUDGED;
  if (computed.state === 'no value') return { ...NOT_JUDGED, verdict: 'nonconforming' };
  const uncertainty = uncertaintyOfComputed(characteristic, readings, decision);
  return judgeAgainstLimits(computed.value, characteristic, decision.rule, uncertainty);
}

/**
 * Judges one characteristic of one unit. A missing reading is "not judged", never a pass, and so is one whose uncertainty a
 * rule with guard bands needs and does not know; readings for which a formula has no value (a regulation against 0 V)
 * cannot conform.
 *
 * @param readings the counting readings of the unit by characteristic key, in SI base units, with their budgets
 * @throws {RangeError} for a value of the wrong kind, one that is not finite, or limits in the wrong order
 */
export function judgeCharacteristic(
  characteristic: JudgedCharacteristic,
  readings: Readings,
  decision: DecisionRules,
): CharacteristicVerdict {
  const { key, kind } = characteristic;
  if (kind === 'computed') return judgeComputed(characteristic, readings, decision);
  const value = readings.values.get(key);
  if (value === undefined) return NOT_JUDGED;
  if (kind === 'attribute') {
    if (typeof value === 'boolean') return { ...NOT_JUDGED, value, verdict: judgeAttribute(value) };
    throw new RangeError(`values: ${key} is an attribute and takes pass or fail, not ${value}.`);
  }
  if (typeof value !== 'number') throw new RangeError(`values: ${key} is measured and takes a number.`);
  return judgeAgainstLimits(value, characteristic, decision.rule, uncertaintyOfMeasured(key, readings, decision));
}
