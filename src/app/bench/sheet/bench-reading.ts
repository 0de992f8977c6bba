import { type Bench, type Reading, type ReadingBody, type ReadingEntry } from '#shared/contract/bench';
import { type Characteristic } from '#shared/contract/plans';
import { scopeVolts } from '#shared/measurement/scope-reading';
import { parseReading } from '#shared/quantities/parse-reading';
import { chosenRange } from '#shared/uncertainty/range-choice';
import { questionOnItsWay } from './reading-plausibility';
import { rangedQuantity } from './reading-range';

/** A reading as the bench holds it: acknowledged by the server, on its way, or refused with the server's sentence. */
export interface BenchReading extends Omit<Reading, 'unit' | 'attempt' | 'takenBy' | 'receivedAt'> {
  /** Null when a rack took it. */
  readonly takenBy: string | null;
  readonly state: 'kept' | 'waiting' | 'refused';
  readonly refusal: Refusal | null;
}

/** Why the server did not take something: its code, and its sentence. */
export interface Refusal {
  readonly code: string;
  readonly message: string;
}

/** What a reading is worth: SI base units, or whether an attribute passes. */
export type ReadingValue = number | boolean;

/** A waveform is measured by the server; what it found goes with the entry. */
export type TypedEntry = Exclude<ReadingEntry, { kind: 'waveform' }>;

/**
 * Computes what was typed, as the server will.
 *
 * @throws {RangeError} with a sentence for the person who typed it
 */
export function entryValue(entry: TypedEntry, characteristic: Characteristic): ReadingValue {
  if (entry.kind === 'attribute') return entry.pass;
  if (entry.kind === 'scope') {
    const alternatePeaks = characteristic.kind === 'measured' ? characteristic.alternatePeaks : undefined;
    return scopeVolts(entry.scope, { quantity: scopeQuantity(characteristic), alternatePeaks });
  }
  const unit = characteristic.kind === 'attribute' ? '' : characteristic.unit;
  return parseReading(entry.text, unit, { decimalComma: entry.decimalComma });
}

/** What a scope reading of the characteristic is of; peak-to-peak units are ripple. */
export function scopeQuantity(characteristic: Characteristic): 'ripple' | 'level' {
  return characteristic.kind !== 'attribute' && characteristic.unit.endsWith('p-p') ? 'ripple' : 'level';
}

/** A reading the server has. */
export function keptReading(reading: Reading): BenchReading {
  return { ...reading, state: 'kept', refusal: null };
}

/** Who took a reading that is on its way, what a waveform gave, and why the server refused it where it did. */
export interface OnItsWay {
  readonly takenBy: string | null;
  readonly refusal: Refusal | null;
  readonly measured?: number | null;
}

/** A reading that is on its way to the server or was refused by it. */
export function waitingReading(
  id: string,
  body: ReadingBody,
  characteristic: Characteristic,
  bench: Bench,
  { takenBy, refusal, measured = null }: OnItsWay,
): BenchReading {
  const { entry, takenAt } = body;
  const worth = entry.kind === 'waveform' ? measured : entryValue(entry, characteristic);
  return {
    id,
    characteristicKey: body.characteristicKey,
    value: typeof worth === 'number' ? worth : null,
    pass: typeof worth === 'boolean' ? worth : null,
    entry,
    instrumentId: body.instrumentId,
    rangeId: typeof worth === 'number' ? rangeOnItsWay(body, characteristic, bench, worth) : null,
    expandedUncertainty: null,
    waveformId: entry.kind === 'waveform' ? entry.waveformId : null,
    question:
      worth === null
        ? null
        : questionOnItsWay(
            characteristic,
            bench.expected,
            { value: worth, entry, answer: body.question },
            { by: takenBy, at: takenAt },
          ),
    note: body.note,
    repeat: body.repeat,
    withdrawn: false,
    takenBy,
    rack: null,
    takenAt,
    state: refusal === null ? 'waiting' : 'refused',
    refusal,
  };
}

/** The range the server will take; null where it knows none, or will refuse the one named. */
function rangeOnItsWay(body: ReadingBody, characteristic: Characteristic, bench: Bench, value: number): number | null {
  const instrument = bench.instruments.find(({ id }) => id === body.instrumentId);
  const quantity = rangedQuantity(characteristic, body.entry.kind);
  if (instrument === undefined || quantity === null) return null;
  try {
    return chosenRange(instrument.ranges, body.rangeId, value, quantity)?.id ?? null;
  } catch (thrown) {
    if (thrown instanceof RangeError) return body.rangeId;
    throw thrown;
  }
}
