import { averageAndRange } from './average-and-range';
import { type StudyReadings } from './gauge-study';
import { POOLING_CHANCE, type GaugeStudyResults } from './leading-table';
import { variancePooled, varianceWithInteraction } from './variance-table';

/**
 * Both methods on one study; standard deviations in the readings' unit. The interaction is kept unless its F is one that
 * chance alone would exceed more often than one time in four. Where the readings of no cell differ there is no F, and it is
 * kept.
 *
 * @param tolerance upper minus lower limit, in the readings' unit; null where there are not both
 * @throws {StudyUneven}
 * @throws {RangeFactorNotKnown} for more than 30 parts, 30 persons or 10 trials
 * @throws {ReadingNotFinite} for NaN or an infinite reading
 */
export function gaugeStudyResults(readings: StudyReadings, tolerance: number | null): GaugeStudyResults {
  const kept = varianceWithInteraction(readings, tolerance);
  const p = kept.lines.find(({ source }) => source === 'interaction')?.p ?? 0;
  return {
    varianceWithInteraction: kept,
    variancePooled: variancePooled(readings, tolerance),
    pooled: p > POOLING_CHANCE,
    averageRange: averageAndRange(readings, tolerance),
  };
}
