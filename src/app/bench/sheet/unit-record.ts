import { countingReading } from '#shared/verdict/counting-reading';
import { type UnitReadings } from '#shared/verdict/sample-verdict';
import { type BenchReading, type ReadingValue } from './bench-reading';

/** One unit of the sample with everything read on it. Records are never changed, only replaced. */
export interface UnitRecord {
  readonly unit: number;
  readonly position: number;
  readonly carton: number;
  readonly setAside: string | null;
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

/** What the verdicts need of a unit. */
export function judgedReadings(record: UnitRecord): UnitReadings {
  const values = new Map<string, ReadingValue>();
  for (const { characteristicKey, value, pass, withdrawn, state } of record.readings) {
    const worth = value ?? pass;
    if (!withdrawn && state !== 'refused' && worth !== null) values.set(characteristicKey, worth);
  }
  return { unit: record.unit, values, setAside: record.setAside };
}

/** The record with one more reading, or with the same reading in its newer state. */
export function withReading(record: UnitRecord, reading: BenchReading): UnitRecord {
  const known = record.readings.some(({ id }) => id === reading.id);
  const readings = known
    ? record.readings.map((each) => (each.id === reading.id ? reading : each))
    : [...record.readings, reading];
  return { ...record, readings };
}

/** The record with a reading taken back; it stays on record. */
export function withWithdrawn(record: UnitRecord, readingId: string): UnitRecord {
  const readings = record.readings.map((each) => (each.id === readingId ? { ...each, withdrawn: true } : each));
  return { ...record, readings };
}

/** The record without a refused reading that the person gave up. */
export function withoutReading(record: UnitRecord, readingId: string): UnitRecord {
  return { ...record, readings: record.readings.filter(({ id }) => id !== readingId) };
}
