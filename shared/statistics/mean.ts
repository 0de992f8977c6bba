import { compensatedSum } from './compensated-sum';
import { demandReadings } from './too-few-readings';

/**
 * Arithmetic mean. Unit: that of the readings.
 *
 *     x̄ = Σ xᵢ ÷ n
 *
 * Source: NIST/SEMATECH e-Handbook of Statistical Methods, section 1.3.5.1.
 *
 * @throws {TooFewReadings} for no readings
 * @throws {ReadingNotFinite} for NaN or an infinite reading
 */
export function mean(readings: readonly number[]): number {
  demandReadings(readings, 1);
  return compensatedSum(readings) / readings.length;
}
