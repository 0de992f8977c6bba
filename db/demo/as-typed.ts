import { type ReadingEntry } from '#shared/contract/bench';
import { type Characteristic } from '#shared/contract/plans';
import { inDisplayUnit } from '#shared/quantities/display-unit';

type Measured = Extract<Characteristic, { kind: 'measured' }>;

/** Scales of an oscilloscope, in volts for one division. */
const SCALES = [0.002, 0.005, 0.01, 0.02, 0.05, 0.1, 0.2, 0.5, 1, 2, 5, 10];

/** A wave is read where it fills the screen without leaving it. */
const TALLEST_DIVISIONS = 7.6;

function scopeEntry(volts: number): ReadingEntry {
  const voltsPerDivision = SCALES.find((scale) => volts / scale <= TALLEST_DIVISIONS);
  if (voltsPerDivision === undefined) throw new RangeError(`${volts} V is more than the screen holds.`);
  const divisions = Math.max(0.1, Number((volts / voltsPerDivision).toFixed(1)));
  return { kind: 'scope', scope: { form: 'whole', divisions, voltsPerDivision, probeFactor: 1, coupling: 'ac' } };
}

/** A measured value as an inspector types it: off the screen in divisions, otherwise in the unit of the plan. */
export function asTyped(value: number, { entryMode, unit, decimals }: Measured): ReadingEntry {
  if (entryMode === 'scope') return scopeEntry(value);
  return { kind: 'direct', text: inDisplayUnit(value, unit).toFixed(decimals), decimalComma: false };
}

/** A value as a rack writes it into its file. */
export function asRackText(value: number, { unit, decimals }: Measured): string {
  return inDisplayUnit(value, unit).toFixed(decimals + 1);
}
