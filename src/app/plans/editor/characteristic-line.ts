import { type Characteristic, type DecisionRule, type RevisionBody } from '#shared/contract/plans';
import { formatLimits, inDisplayUnit } from '#shared/quantities/format-quantity';
import { type SamplingGroup } from '#shared/sampling/lot-sampling';

/** What the table of a plan says of one characteristic. */
export interface CharacteristicLine {
  readonly limits: string;
  readonly unit: string;
  readonly aql: string;
  readonly sampleSize: number | null;
  readonly rule: string;
}

/** The decision rules as short as a column of the table; they are explained beside it. */
const RULE_WORDS: Readonly<Record<DecisionRule, string>> = {
  simple: 'Simple',
  guarded: 'Guarded',
  'non-binary': 'Both sides',
};

/** The line of a characteristic in the table of its plan. */
export function characteristicLine(
  characteristic: Characteristic,
  plan: RevisionBody,
  groups: readonly SamplingGroup[],
): CharacteristicLine {
  const ofClass = plan.classAqls.find((entry) => entry.class === characteristic.class)?.aql;
  const aql = characteristic.ownAql ?? ofClass;
  const level = characteristic.ownLevel ?? plan.level;
  const group = groups.find((each) => each.class === characteristic.class && each.aql === aql && each.level === level);
  return {
    limits: characteristic.kind === 'attribute' ? characteristic.requirement : limitsWithoutUnit(characteristic),
    unit: characteristic.kind === 'attribute' ? '' : characteristic.unit,
    aql: aql ?? 'none',
    sampleSize: group?.sampleSize ?? null,
    rule: characteristic.kind === 'attribute' ? 'Pass or fail' : RULE_WORDS[plan.decisionRule],
  };
}

/** The unit has a column of its own. */
function limitsWithoutUnit(characteristic: Exclude<Characteristic, { kind: 'attribute' }>): string {
  const { lowerLimit, upperLimit, unit, decimals } = characteristic;
  const shown = (limit: number | null) => (limit === null ? null : inDisplayUnit(limit, unit));
  return formatLimits(shown(lowerLimit), shown(upperLimit), '', decimals);
}
