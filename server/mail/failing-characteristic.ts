import { failingReadingText, missBy } from '#server/documents/paper-reading';
import { type Failure } from '#shared/contract/nonconformances';
import { formatLimits } from '#shared/quantities/format-quantity';
import { oneLine } from './one-line';

/** One failing characteristic as the notice shows it. */
export interface FailingCharacteristic {
  name: string;
  class: string;
  limits: string;
  worst: string;
  units: number;
  readings: { text: string; measured: boolean }[];
  /** How many readings are not listed. */
  more: number;
}

/** Readings listed by name. */
const MOST_LISTED = 40;

type Reading = Failure['readings'][number];

function found(failure: Failure, { value, reason }: Reading): string {
  if (value !== null) return failingReadingText(value, failure);
  return reason === null ? 'fail' : oneLine(reason);
}

function readingLine(failure: Failure, reading: Reading) {
  const repeat = reading.attempt > 1 ? ` (repeat ${reading.attempt - 1})` : '';
  return { text: `unit ${reading.unit}: ${found(failure, reading)}${repeat}`, measured: reading.value !== null };
}

function worstOf(failure: Failure): string {
  const values = failure.readings.flatMap(({ value }) => (value === null ? [] : [value]));
  const [first, ...others] = values;
  if (first === undefined) return 'fail';
  const worst = others.reduce((far, value) => (missBy(value, failure) > missBy(far, failure) ? value : far), first);
  return failingReadingText(worst, failure);
}

function limitsOf({ unit, decimals, lowerLimit, upperLimit, requirement }: Failure): string {
  if (requirement !== null) return oneLine(requirement);
  return formatLimits(lowerLimit, upperLimit, unit ?? '', decimals);
}

export function failingCharacteristic(failure: Failure): FailingCharacteristic {
  return {
    name: oneLine(failure.name),
    class: failure.class,
    limits: limitsOf(failure),
    worst: worstOf(failure),
    units: new Set(failure.readings.map((reading) => reading.unit)).size,
    readings: failure.readings.slice(0, MOST_LISTED).map((reading) => readingLine(failure, reading)),
    more: Math.max(0, failure.readings.length - MOST_LISTED),
  };
}
