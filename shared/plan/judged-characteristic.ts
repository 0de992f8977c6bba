import { type Characteristic } from '../contract/plans';
import { type FormulaKey } from '../measurement/formula';
import { type SampledCharacteristic } from '../sampling/lot-sampling';
import { type JudgedCharacteristic } from '../verdict/sample-verdict';

function formulaOf(characteristic: Characteristic): JudgedCharacteristic['formula'] {
  if (characteristic.kind !== 'computed') return null;
  const { key, inputs, constants } = characteristic.formula;
  return { key: key satisfies FormulaKey, inputs, constants };
}

/** A plan's characteristic as the verdicts see it. An attribute has no limits. */
export function judgedCharacteristic(characteristic: Characteristic): JudgedCharacteristic {
  const limits =
    characteristic.kind === 'attribute'
      ? { lowerLimit: null, upperLimit: null }
      : { lowerLimit: characteristic.lowerLimit, upperLimit: characteristic.upperLimit };
  const { key, kind, class: nonconformityClass } = characteristic;
  return { key, kind, class: nonconformityClass, ...limits, formula: formulaOf(characteristic) };
}

/** A plan's characteristic as sampling sees it. */
export function sampledCharacteristic(characteristic: Characteristic): SampledCharacteristic {
  const { key, class: nonconformityClass, ownLevel, ownAql } = characteristic;
  return { key, class: nonconformityClass, level: ownLevel, aql: ownAql };
}
