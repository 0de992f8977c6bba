import { formatNumber, inDisplayUnit } from '#shared/quantities/format-quantity';
import { withUnit } from '#shared/quantities/unit-label';

/** A characteristic as far as printing its readings needs it; limits in SI base units. */
export interface PrintedCharacteristic {
  unit: string | null;
  decimals: number;
  lowerLimit: number | null;
  upperLimit: number | null;
}

/** Decimals added at most to tell a reading from the limit it misses. */
const MOST_MORE = 3;

/** A reading in its characteristic's display unit, with its decimals: "2.61 V p-p". */
export function readingText(value: number, { unit, decimals }: PrintedCharacteristic): string {
  const label = unit ?? '';
  return withUnit(formatNumber(inDisplayUnit(value, label), decimals), label);
}

/** Lowest and highest reading, the unit said once: "11.78 to 12.59 V". */
export function rangeText(lowest: number, highest: number, characteristic: PrintedCharacteristic): string {
  const { unit, decimals } = characteristic;
  const high = readingText(highest, characteristic);
  const low = formatNumber(inDisplayUnit(lowest, unit ?? ''), decimals);
  return readingText(lowest, characteristic) === high ? high : `${low} to ${high}`;
}

/** How far a reading lies outside its limits, in SI base units; 0 inside them. */
export function missBy(value: number, { lowerLimit, upperLimit }: PrintedCharacteristic): number {
  const below = lowerLimit === null ? 0 : lowerLimit - value;
  const above = upperLimit === null ? 0 : value - upperLimit;
  return Math.max(below, above, 0);
}

/** A reading outside its limit, with as many decimals as it takes not to look like the limit itself. */
export function failingReadingText(value: number, characteristic: PrintedCharacteristic): string {
  const missed = [characteristic.lowerLimit, characteristic.upperLimit].filter((limit) => limit !== null);
  for (let more = 0; more < MOST_MORE; more++) {
    const finer = { ...characteristic, decimals: characteristic.decimals + more };
    const text = readingText(value, finer);
    if (missed.every((limit) => readingText(limit, finer) !== text)) return text;
  }
  return readingText(value, { ...characteristic, decimals: characteristic.decimals + MOST_MORE });
}
