import { type Characteristic } from '#shared/contract/plans';
import { readingText } from '../../ui/values/reading-text';
import { type BenchReading } from './bench-reading';

/** What a reading says, in words: 1.85 V p-p, Pass, Fail. */
export function readingWords({ value, pass }: BenchReading, characteristic: Characteristic): string {
  if (value === null || characteristic.kind === 'attribute') return pass === true ? 'Pass' : 'Fail';
  return readingText(value, characteristic.unit, characteristic.decimals);
}
