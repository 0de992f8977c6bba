import { countingReadings } from './lot-judging';
import { type JudgedLot } from './sample-judging';
import { type Assessment } from '#shared/contract/decision';
import { type Characteristic } from '#shared/contract/plans';
import { summary } from '#shared/statistics/summary';

/** What the sample shows of a characteristic, without its uncertainty, which takes the instruments to tell. */
type Result = Omit<Assessment['characteristics'][number], 'expandedUncertainty'>;

/** How far a value lies outside its limits, or (negative) inside the nearest one. */
function excess(value: number, lower: number | null, upper: number | null): number {
  return Math.max(lower === null ? -Infinity : lower - value, upper === null ? -Infinity : value - upper);
}

function worstOf(values: readonly number[], content: Characteristic): number | null {
  if (content.kind === 'attribute') return null;
  const { lowerLimit, upperLimit } = content;
  if (lowerLimit === null && upperLimit === null) return null;
  return values.reduce<number | null>(
    (worst, value) =>
      worst === null || excess(value, lowerLimit, upperLimit) > excess(worst, lowerLimit, upperLimit) ? value : worst,
    null,
  );
}

/** Reasons given for failing an attribute, each once. */
function failReasons({ units }: JudgedLot, characteristicId: number): string[] {
  const reasons = units.flatMap(({ readings }) => {
    const entry = countingReadings(readings).get(characteristicId)?.entry;
    return entry?.kind === 'attribute' && !entry.pass && entry.reason !== '' ? [entry.reason] : [];
  });
  return [...new Set(reasons)];
}

/** Per characteristic of the plan: what the sample showed, every counting reading in draw order. SI base units. */
export function characteristicResults(judged: JudgedLot): Result[] {
  const { rules, verdict } = judged;
  return rules.characteristics.map(({ id, content }) => {
    const readings = verdict.units.map((unit) => {
      const value = unit.characteristics.get(content.key)?.value ?? null;
      return {
        unit: unit.unit,
        value: typeof value === 'number' ? value : null,
        pass: typeof value === 'boolean' ? value : null,
      };
    });
    const values = readings.flatMap(({ value }) => (value === null ? [] : [value]));
    const failedUnits = verdict.units.filter((unit) => unit.failed.includes(content.key)).map(({ unit }) => unit);
    const group = rules.rules.groups.find(({ characteristicKeys }) => characteristicKeys.includes(content.key));
    if (!group) throw new Error(`${content.key} is in no sampling group.`);
    const shown = values.length > 0 ? summary(values) : undefined;
    return {
      characteristic: content,
      n: readings.filter(({ value, pass }) => value !== null || pass !== null).length,
      found: failedUnits.length,
      acceptance: group.acceptance,
      rejection: group.rejection,
      min: shown?.min ?? null,
      mean: shown?.mean ?? null,
      max: shown?.max ?? null,
      s: shown?.s ?? null,
      worst: worstOf(values, content),
      failedUnits,
      failReasons: failReasons(judged, id),
      readings,
    };
  });
}
