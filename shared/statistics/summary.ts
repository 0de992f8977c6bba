import { mean } from './mean';
import { sampleStandardDeviation } from './sample-standard-deviation';
import { demandReadings } from './too-few-readings';

/** Readings of one characteristic in few numbers, all but n in the unit of the readings. */
export interface Summary {
  n: number;
  min: number;
  mean: number;
  max: number;
  /** Sample standard deviation; null for a single reading, which has no scatter to state. */
  s: number | null;
}

/**
 * Sums up the readings of one characteristic.
 *
 * @throws {TooFewReadings} for no readings
 * @throws {ReadingNotFinite} for NaN or an infinite reading
 */
export function summary(readings: readonly number[]): Summary {
  demandReadings(readings, 1);
  const centre = mean(readings);
  const least = readings.reduce((low, reading) => Math.min(low, reading));
  const most = readings.reduce((high, reading) => Math.max(high, reading));
  const scatter = readings.length > 1 ? sampleStandardDeviation(readings) : null;
  return { n: readings.length, min: least, mean: centre, max: most, s: scatter };
}
