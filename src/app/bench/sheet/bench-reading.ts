import { type Reading, type ReadingBody, type ReadingEntry } from '#shared/contract/bench';
import { type Characteristic } from '#shared/contract/plans';
import { scopeVolts } from '#shared/measurement/scope-reading';
import { parseReading } from '#shared/quantities/parse-reading';

/** A reading as the bench holds it: acknowledged by the server, on its way, or refused with the server's sentence. */
export interface BenchReading extends Omit<Reading, 'unit' | 'attempt' | 'takenBy' | 'receivedAt'> {
  /** Null when a rack took it. */
  readonly takenBy: string | null;
  readonly state: 'kept' | 'waiting' | 'refused';
  readonly refusal: string | null;
}

/** What a reading is worth: SI base units, or whether an attribute passes. */
export type ReadingValue = number | boolean;

/**
 * Computes what was typed, as the server will.
 *
 * @throws {RangeError} with a sentence for the person who typed it
 */
export function entryValue(entry: ReadingEntry, characteristic: Characteristic): ReadingValue {
  if (entry.kind === 'attribute') return entry.pass;
  if (entry.kind === 'scope') return scopeVolts(entry.scope, { quantity: scopeQuantity(characteristic) });
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

/** A reading that is on its way to the server or was refused by it. */
export function waitingReading(
  id: string,
  body: ReadingBody,
  characteristic: Characteristic,
  at: { takenBy: string | null; refusal: string | null },
): BenchReading {
  const worth = entryValue(body.entry, characteristic);
  return {
    id,
    characteristicKey: body.characteristicKey,
    value: typeof worth === 'number' ? worth : null,
    pass: typeof worth === 'boolean' ? worth : null,
    entry: body.entry,
    instrumentId: body.instrumentId,
    note: body.note,
    repeat: body.repeat,
    withdrawn: false,
    takenBy: at.takenBy,
    takenAt: body.takenAt,
    state: at.refusal === null ? 'waiting' : 'refused',
    refusal: at.refusal,
  };
}
