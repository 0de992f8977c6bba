import { ReadingNotFinite } from '../measurement/reading-not-finite';

/**
 * The sum of a series, with what each addition loses carried along and added at the end. Unit: that of the readings.
 *
 * Source: A. Neumaier, Zeitschrift für Angewandte Mathematik und Mechanik 54, 1974 (from memory).
 *
 * @throws {ReadingNotFinite} for NaN or an infinite reading
 */
export function compensatedSum(readings: readonly number[]): number {
  let sum = 0;
  let lost = 0;
  for (const reading of readings) {
    if (!Number.isFinite(reading)) throw new ReadingNotFinite('readings', reading);
    const next = sum + reading;
    lost += Math.abs(sum) >= Math.abs(reading) ? sum - next + reading : reading - next + sum;
    sum = next;
  }
  return sum + lost;
}
