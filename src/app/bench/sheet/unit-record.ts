import { type Bench } from '#shared/contract/bench';
import { type Component } from '#shared/uncertainty/component';
import { countingReading } from '#shared/verdict/counting-reading';
import { type UnitReadings } from '#shared/verdict/sample-verdict';
import { type BenchReading, type ReadingValue } from './bench-reading';
import { type ReadingBudgets } from './reading-budgets';

/** One unit of the sample with everything read on it. Records are never changed, only replaced. */
export interface UnitRecord {
  readonly unit: number;
  readonly position: number;
  readonly carton: number;
  readonly setAside: string | null;
  /** Quality's ruling on the unit while it was undecided. */
  readonly ruling: Bench['units'][number]['ruling'];
  /** In the order they were taken, withdrawn and refused ones too. */
  readonly readings: readonly BenchReading[];
}

/** The readings of one cell that are on record or on their way there, withdrawn ones too. */
export function readingsAt(record: UnitRecord, key: string): BenchReading[] {
  return record.readings.filter((reading) => reading.characteristicKey === key && reading.state !== 'refused');
}

/** The reading of a cell that counts. */
export function countingAt(record: UnitRecord, key: string): BenchReading | undefined {
  return countingReading(readingsAt(record, key));
}

/** The reading of a cell that the server refused last. */
export function refusedAt(record: UnitRecord, key: string): BenchReading | undefined {
  return record.readings.findLast((reading) => reading.characteristicKey === key && reading.state === 'refused');
}

/** Whether a reading raised a question that nobody has answered, as a rack's may. */
export function isOpenQuestion({ question, withdrawn }: BenchReading): boolean {
  return !withdrawn && question?.given.answer === 'open';
}

/** The counting readings of a unit that wait for an answer. */
export function openQuestions(record: UnitRecord): BenchReading[] {
  return record.readings.filter(
    (reading) => isOpenQuestion(reading) && countingAt(record, reading.characteristicKey) === reading,
  );
}

/** What the verdicts need of a unit. */
export function judgedReadings(record: UnitRecord, budgets: ReadingBudgets): UnitReadings {
  const values = new Map<string, ReadingValue>();
  const components = new Map<string, readonly Component[]>();
  for (const reading of record.readings) {
    const { characteristicKey: key, value, pass, withdrawn, state } = reading;
    const worth = value ?? pass;
    if (withdrawn || state === 'refused' || worth === null) continue;
    values.set(key, worth);
    if (budgets.asked) setOrDelete(components, key, budgets.of(reading));
  }
  const { unit, setAside, ruling } = record;
  return {
    unit,
    values,
    setAside,
    ruling: ruling?.ruling ?? null,
    components: budgets.asked ? components : undefined,
  };
}

/** The readings of a unit as if one more, not kept yet, counted. */
export function withTyped(
  readings: UnitReadings,
  key: string,
  value: ReadingValue,
  budget: readonly Component[] | undefined,
): UnitReadings {
  const components = readings.components && new Map(readings.components);
  if (components) setOrDelete(components, key, budget);
  return { ...readings, values: new Map(readings.values).set(key, value), components };
}

function setOrDelete<K, V>(map: Map<K, V>, key: K, value: V | undefined): void {
  if (value === undefined) map.delete(key);
  else map.set(key, value);
}

/**
 * The record with one more reading, or with the same reading in its newer state. One the server has stands before those on
 * their way to it.
 */
export function withReading(record: UnitRecord, reading: BenchReading): UnitRecord {
  const known = record.readings.some(({ id }) => id === reading.id);
  if (known) return { ...record, readings: record.readings.map((each) => (each.id === reading.id ? reading : each)) };
  const behind = record.readings.filter(({ state }) => reading.state === 'kept' && state !== 'kept');
  const before = record.readings.filter((each) => !behind.includes(each));
  return { ...record, readings: [...before, reading, ...behind] };
}

/** The record with a reading taken back; it stays on record. */
export function withWithdrawn(record: UnitRecord, readingId: string): UnitRecord {
  return withChanged(record, readingId, (reading) => ({ ...reading, withdrawn: true }));
}

/** The record with one of its readings changed. */
export function withChanged(
  record: UnitRecord,
  readingId: string,
  change: (reading: BenchReading) => BenchReading,
): UnitRecord {
  return { ...record, readings: record.readings.map((each) => (each.id === readingId ? change(each) : each)) };
}

/** The record without a refused reading that the person gave up. */
export function withoutReading(record: UnitRecord, readingId: string): UnitRecord {
  return { ...record, readings: record.readings.filter(({ id }) => id !== readingId) };
}
