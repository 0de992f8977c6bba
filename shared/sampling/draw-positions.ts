import { cartonShares } from './carton-shares';
import { cartonSizes } from './carton-sizes';
import { seededNumbers, shuffled, type SeededNumbers } from './seeded-numbers';

export { cartonOf } from './carton-sizes';

/** What a sample is drawn from. */
export interface Draw {
  /** Units in the lot. */
  lotSize: number;
  /** Units to draw. */
  sampleSize: number;
  /** Cartons the lot came in, packed evenly. */
  cartons: number;
  /** Whole number from 0 to 4294967295, kept with the lot. */
  seed: number;
}

/** One drawn unit. */
export interface DrawnPosition {
  /** Number of the unit in draw order, from 1; sampling groups cover the first of them. */
  unit: number;
  /** Where it lies in the lot, from 1, counted through the cartons in order. */
  position: number;
  /** Its carton, from 1. */
  carton: number;
}

/** Distinct whole numbers from 1 to `size`, every set equally likely. Source: R. Floyd, in Bentley's column, CACM 30(9), 1987. */
function distinctNumbers(size: number, wanted: number, numbers: SeededNumbers): number[] {
  const chosen = new Set<number>();
  for (let highest = size - wanted + 1; highest <= size; highest += 1) {
    const candidate = numbers(1, highest);
    chosen.add(chosen.has(candidate) ? highest : candidate);
  }
  return [...chosen];
}

/**
 * Draws the units of a sample without replacement, in proportion to the cartons, by a recorded seed.
 *
 * An auditor repeats a draw with the same four numbers. The seeded numbers are used in this order: first the shares of
 * the cartons, then for each carton in order the places drawn in it, last the order of the whole sample, so that the first
 * units in draw order are themselves a random sample of the lot.
 *
 * @returns the drawn units in draw order
 * @throws {RangeError} for a sampleSize outside 1 to lotSize, cartons that cannot be packed, or a seed out of range
 */
export function drawPositions({ lotSize, sampleSize, cartons, seed }: Draw): DrawnPosition[] {
  const sizes = cartonSizes(lotSize, cartons);
  if (!Number.isSafeInteger(sampleSize) || sampleSize < 1 || sampleSize > lotSize) {
    throw new RangeError(`sampleSize must be a whole number from 1 to ${lotSize}, not ${sampleSize}.`);
  }
  const numbers = seededNumbers(seed);
  const shares = cartonShares(sizes, sampleSize, numbers);
  const drawn: Omit<DrawnPosition, 'unit'>[] = [];
  let before = 0;
  sizes.forEach((size, index) => {
    for (const place of distinctNumbers(size, shares[index] ?? 0, numbers)) {
      drawn.push({ position: before + place, carton: index + 1 });
    }
    before += size;
  });
  return shuffled(drawn, numbers).map((each, index) => ({ unit: index + 1, ...each }));
}
