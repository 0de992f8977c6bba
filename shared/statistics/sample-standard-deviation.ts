import { compensatedSum } from './compensated-sum';
import { mean } from './mean';
import { demandReadings } from './too-few-readings';

/**
 * Sample standard deviation: how far single readings scatter around their mean. Unit: that of the readings.
 *
 *     s = √( ( Σ dᵢ² − (Σ dᵢ)² ÷ n ) ÷ (n − 1) ),  dᵢ = xᵢ − x̄
 *
 * Dividing by n − 1 removes the bias of estimating the mean from the same readings. The deviations are summed a second time
 * because the mean itself is rounded: (Σ dᵢ)² ÷ n takes that rounding out.
 * Source: NIST/SEMATECH e-Handbook of Statistical Methods, section 1.3.5.6; the correction from Chan, Golub and LeVeque,
 * The American Statistician 37(3), 1983.
 *
 * @throws {TooFewReadings} for fewer than two readings
 * @throws {ReadingNotFinite} for NaN or an infinite reading
 */
export function sampleStandardDeviation(readings: readonly number[]): number {
  demandReadings(readings, 2);
  const centre = mean(readings);
  const deviations = readings.map((reading) => reading - centre);
  const squares = compensatedSum(deviations.map((deviation) => deviation ** 2));
  const rounding = compensatedSum(deviations) ** 2 / readings.length;
  return Math.sqrt(Math.max(0, squares - rounding) / (readings.length - 1));
}
