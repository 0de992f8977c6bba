import { Refused } from '#server/problems';
import { type ReadingEntry } from '#shared/contract/bench';
import { type Characteristic } from '#shared/contract/plans';
import { scopeVolts } from '#shared/measurement/scope-reading';
import { parseReading } from '#shared/quantities/parse-reading';

/** What a reading is worth: a value in SI base units, or pass or fail. */
export type EntryValue = { value: number; pass: null } | { value: null; pass: boolean };

function refuse(path: string[], message: string): never {
  throw new Refused('reading-refused', message, [{ path: ['entry', ...path], message }]);
}

/** The pure core says in words what it does not understand; here its words go beside the field. */
function told<T>(path: string[], compute: () => T): T {
  try {
    return compute();
  } catch (error) {
    if (error instanceof RangeError) refuse(path, error.message);
    throw error;
  }
}

function isVolts(unit: string): boolean {
  return /^m?V( p-p)?$/.test(unit);
}

/** What is kept as typed is what was read: texts beside other numbers would show the auditor what nobody measured. */
function holdTyped({ scope, typed }: Extract<ReadingEntry, { kind: 'scope' }>): void {
  const numbers: Partial<Record<string, unknown>> = scope;
  for (const [field, text] of Object.entries(typed ?? {})) {
    const unit = field === 'voltsPerDivision' ? 'V' : '';
    const value = told(['typed', field], () => parseReading(text, unit, { decimalComma: text.includes(',') }));
    if (numbers[field] !== value)
      refuse(['typed', field], `“${text}” is not the ${String(numbers[field])} that was read.`);
  }
}

/**
 * What a waveform gives of a characteristic, in SI base units.
 *
 * @throws {RangeError} in words, where it gives nothing of the kind
 */
export type MeasuredWave = (characteristic: Extract<Characteristic, { kind: 'measured' }>) => number;

/**
 * Computes a reading from what was typed. The server's value is the one that counts.
 *
 * @throws {Refused} when the entry does not fit the characteristic or cannot be understood; the fault names its field
 */
export function entryValue(entry: ReadingEntry, characteristic: Characteristic, wave?: MeasuredWave): EntryValue {
  const { name } = characteristic;
  if (characteristic.kind === 'computed') refuse(['kind'], `${name} is computed from other readings; it is not typed.`);
  if (characteristic.kind === 'attribute') {
    if (entry.kind !== 'attribute') refuse(['kind'], `${name} is judged by eye: pass or fail.`);
    if (!entry.pass && entry.reason === '' && characteristic.failReasons.length > 0)
      refuse(['reason'], 'Say what is wrong with the unit.');
    return { value: null, pass: entry.pass };
  }
  const { unit } = characteristic;
  if (entry.kind === 'attribute') refuse(['kind'], `${name} is measured; type a value in ${unit}.`);
  if (entry.kind === 'direct') {
    const value = told(['text'], () => parseReading(entry.text, unit, { decimalComma: entry.decimalComma }));
    return { value, pass: null };
  }
  if (entry.kind === 'waveform') {
    if (!wave) refuse(['waveformId'], 'This waveform does not exist, or is not of this unit.');
    return { value: told(['waveformId'], () => wave(characteristic)), pass: null };
  }
  if (!isVolts(unit)) refuse(['kind'], `${name} is in ${unit}; a scope reading gives volts.`);
  holdTyped(entry);
  const quantity = unit.endsWith('p-p') ? 'ripple' : 'level';
  const { alternatePeaks } = characteristic;
  return { value: told(['scope'], () => scopeVolts(entry.scope, { quantity, alternatePeaks })), pass: null };
}
