import { type ReadingBody, type ReadingEntry } from '#shared/contract/bench';
import { type Characteristic } from '#shared/contract/plans';
import { asTyped } from './as-typed';
import { type Chance } from './chance';
import { slipOf } from './slips';
import { type UnitTruth } from './unit-readings';
import { later } from './work-days';

/** A characteristic with the units it is read on: 1 to this one, in draw order. */
export interface WorkOfCharacteristic {
  content: Characteristic;
  requiredTo: number;
}

/** One reading as it is typed at the bench. */
export interface TypedReading {
  at: Date;
  unit: number;
  key: string;
  entry: ReadingEntry;
  note: string;
  repeat: ReadingBody['repeat'];
}

/** How long a reading takes, in minutes; a unit is changed meanwhile. */
const FASTEST = 0.13;
const SLOWEST = 0.21;
/** How often a reading is a slip that its inspector sees and repeats. */
const SLIPS = 0.003;

function entryOf(content: Characteristic, { values, failures }: UnitTruth): ReadingEntry {
  if (content.kind === 'measured') {
    const value = values.get(content.key);
    if (value === undefined) throw new RangeError(`The model gives no ${content.key}.`);
    return asTyped(value, content);
  }
  const reason = failures.get(content.key);
  return { kind: 'attribute', pass: reason === undefined, reason: reason ?? '' };
}

/** The reading, before it in a few cases a slip that it repeats. */
function typed(content: Characteristic, truth: UnitTruth, chance: Chance): Pick<TypedReading, 'entry' | 'repeat'>[] {
  const entry = entryOf(content, truth);
  const slip = chance.happens(SLIPS) ? slipOf(content, entry) : undefined;
  if (!slip) return [{ entry, repeat: null }];
  return [
    { entry: slip.entry, repeat: null },
    { entry, repeat: slip.repeat },
  ];
}

/**
 * What an inspector types of a sample, unit by unit in draw order.
 *
 * @param truths of the units in draw order
 */
export function benchWork(
  characteristics: readonly WorkOfCharacteristic[],
  truths: readonly UnitTruth[],
  from: Date,
  chance: Chance,
): TypedReading[] {
  const work: TypedReading[] = [];
  let at = from;
  truths.forEach((truth, index) => {
    for (const { content, requiredTo } of characteristics) {
      if (content.kind === 'computed' || index >= requiredTo) continue;
      for (const one of typed(content, truth, chance)) {
        at = later(at, chance.between(FASTEST, SLOWEST));
        work.push({ ...one, at, unit: index + 1, key: content.key, note: '' });
      }
    }
  });
  return work;
}
