import { type Assessment } from '#shared/contract/decision';
import { type NonconformityClass } from '#shared/sampling/scheme';
import { type RugReading } from '../../ui/limit-strip/limit-rug';

type Result = Assessment['characteristics'][number];

/** What the sample shows of one characteristic, ready to be drawn. Values in SI base units. */
export interface CharacteristicRow {
  readonly key: string;
  readonly name: string;
  readonly condition: string;
  readonly class: NonconformityClass;
  /** Null for an attribute. */
  readonly scale: { unit: string; decimals: number; lower: number | null; upper: number | null } | null;
  readonly requirement: string;
  readonly rug: readonly RugReading[];
  readonly n: number;
  readonly min: number | null;
  readonly mean: number | null;
  readonly max: number | null;
  readonly s: number | null;
  readonly worst: number | null;
  /** The largest U of its readings; null where that of one is not known. */
  readonly uncertainty: number | null;
  readonly failedUnits: readonly number[];
  readonly failReasons: readonly string[];
  readonly readings: Result['readings'];
}

export function characteristicRow(result: Result): CharacteristicRow {
  const { characteristic, readings } = result;
  const failed = new Set(result.failedUnits);
  const attribute = characteristic.kind === 'attribute';
  const { min, mean, max, s, worst, failedUnits, failReasons, n } = result;
  return {
    key: characteristic.key,
    name: characteristic.name,
    condition: characteristic.condition,
    class: characteristic.class,
    scale: attribute
      ? null
      : {
          unit: characteristic.unit,
          decimals: characteristic.decimals,
          lower: characteristic.lowerLimit,
          upper: characteristic.upperLimit,
        },
    requirement: attribute ? characteristic.requirement : '',
    rug: readings.flatMap(({ value, unit }) => (value === null ? [] : [{ value, nonconforming: failed.has(unit) }])),
    uncertainty: result.expandedUncertainty,
    ...{ n, min, mean, max, s, worst, failedUnits, failReasons, readings },
  };
}
