import { computedValue } from './computed-value';
import { judgeAttribute, judgeValue } from './reading-verdict';
import { type CharacteristicVerdict, type JudgedCharacteristic } from './sample-verdict';

const NOT_JUDGED: CharacteristicVerdict = { value: null, verdict: 'not judged' };

function judgeAgainstLimits(value: number, { lowerLimit, upperLimit }: JudgedCharacteristic): CharacteristicVerdict {
  return { value, verdict: judgeValue(value, { lower: lowerLimit, upper: upperLimit }) };
}

function judgeComputed(
  characteristic: JudgedCharacteristic,
  values: ReadonlyMap<string, number | boolean>,
): CharacteristicVerdict {
  const computed = computedValue(characteristic, values);
  if (computed.state === 'missing') return NOT_JUDGED;
  if (computed.state === 'no value') return { value: null, verdict: 'nonconforming' };
  return judgeAgainstLimits(computed.value, characteristic);
}

/**
 * Judges one characteristic of one unit. A missing reading is "not judged", never a pass; readings for which a formula
 * has no value (a regulation against 0 V) cannot conform.
 *
 * @param values counting readings of the unit by characteristic key, in SI base units
 * @throws {RangeError} for a value of the wrong kind, one that is not finite, or limits in the wrong order
 */
export function judgeCharacteristic(
  characteristic: JudgedCharacteristic,
  values: ReadonlyMap<string, number | boolean>,
): CharacteristicVerdict {
  if (characteristic.kind === 'computed') return judgeComputed(characteristic, values);
  const value = values.get(characteristic.key);
  if (value === undefined) return NOT_JUDGED;
  if (characteristic.kind === 'attribute') {
    if (typeof value === 'boolean') return { value, verdict: judgeAttribute(value) };
    throw new RangeError(`values: ${characteristic.key} is an attribute and takes pass or fail, not ${value}.`);
  }
  if (typeof value === 'number') return judgeAgainstLimits(value, characteristic);
  throw new RangeError(`values: ${characteristic.key} is measured and takes a number.`);
}
