import { type Characteristic } from '#shared/contract/plans';
import { NONCONFORMITY_CLASSES, type NonconformityClass } from '#shared/sampling/scheme';
import { type JudgingRules } from '#shared/verdict/judging-rules';

/** A place of the focus in a row: one characteristic, with the units it is asked of. */
export interface BenchStop {
  readonly characteristic: Characteristic;
  readonly typed: boolean;
  readonly requiredTo: number;
}

/** A column as shown: one characteristic, or on a narrow screen all attributes together. */
export interface BenchColumn {
  readonly key: string;
  readonly title: string;
  readonly stops: readonly BenchStop[];
  readonly shape: 'attribute' | 'attributes' | 'strip' | 'number';
  readonly class: NonconformityClass;
}

/** The columns of a plan in its order; merged, the attributes stand together where the first of them stood. */
export function benchColumns(
  characteristics: readonly Characteristic[],
  rules: JudgingRules,
  merged: boolean,
): BenchColumn[] {
  const stops = characteristics.map((characteristic) => stopOf(characteristic, rules));
  const attributes = stops.filter(({ characteristic }) => characteristic.kind === 'attribute');
  const together = merged && attributes.length > 1;
  return stops.flatMap((stop) => {
    if (!together || stop.characteristic.kind !== 'attribute') return [columnOf(stop)];
    return stop === attributes[0] ? [attributesColumn(attributes)] : [];
  });
}

/** The limits of a column that has its own; none for attributes. */
export function limitsOf({ stops: [stop] }: BenchColumn): { lower: number | null; upper: number | null } {
  const characteristic = stop?.characteristic;
  if (characteristic === undefined || characteristic.kind === 'attribute') return { lower: null, upper: null };
  return { lower: characteristic.lowerLimit, upper: characteristic.upperLimit };
}

function stopOf(characteristic: Characteristic, rules: JudgingRules): BenchStop {
  const rule = rules.characteristics.find((each) => each.characteristic.key === characteristic.key);
  return { characteristic, typed: characteristic.kind !== 'computed', requiredTo: rule?.requiredTo ?? 0 };
}

function columnOf(stop: BenchStop): BenchColumn {
  const { key, name } = stop.characteristic;
  return { key, title: name, stops: [stop], shape: shapeOf(stop.characteristic), class: stop.characteristic.class };
}

function shapeOf(characteristic: Characteristic): BenchColumn['shape'] {
  if (characteristic.kind === 'attribute') return 'attribute';
  return characteristic.lowerLimit === null && characteristic.upperLimit === null ? 'number' : 'strip';
}

function attributesColumn(stops: readonly BenchStop[]): BenchColumn {
  const worst = NONCONFORMITY_CLASSES.find((each) => stops.some(({ characteristic }) => characteristic.class === each));
  return { key: 'attributes', title: 'Attributes', stops, shape: 'attributes', class: worst ?? 'minor' };
}
