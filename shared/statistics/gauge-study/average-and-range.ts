import { mean } from '../mean';
import { type SpreadAnalysis, type StudyReadings } from './gauge-study';
import { manyRangesFactor, oneRangeFactor } from './range-factors';
import { spreadAnalysis } from './spread-analysis';
import { studyMeans } from './study-means';
import { studyShape } from './study-shape';

/** What the average-and-range method makes of a study; ranges in the readings' unit. */
export interface AverageAndRange {
  analysis: SpreadAnalysis;
  /** Mean of the ranges of all cells. */
  meanRange: number;
  /** Range of the persons' means. */
  rangeOfPersons: number;
  /** Range of the parts' means. */
  rangeOfParts: number;
}

function rangeOf(values: readonly number[]): number {
  return Math.max(...values) - Math.min(...values);
}

/**
 * The average-and-range method. It does not see an interaction of part and person.
 *
 *     EV = R̄ K₁,  AV² = (X̄diff K₂)² − EV² ÷ (p r),  PV = Rp K₃
 *
 * for p parts and r trials. Source: AIAG Measurement Systems Analysis, 4th edition.
 *
 * @param tolerance upper minus lower limit, in the readings' unit; null where there are not both
 * @throws {StudyUneven}
 * @throws {RangeFactorNotKnown} for more than 30 parts, 30 persons or 10 trials
 * @throws {ReadingNotFinite} for NaN or an infinite reading
 */
export function averageAndRange(readings: StudyReadings, tolerance: number | null): AverageAndRange {
  const { parts, persons, trials } = studyShape(readings);
  const means = studyMeans(readings);
  const meanRange = mean(means.readings.flatMap((rows) => rows.map(rangeOf)));
  const rangeOfPersons = rangeOf(means.persons);
  const rangeOfParts = rangeOf(means.parts);
  const repeatability = (meanRange * manyRangesFactor(trials)) ** 2;
  const found = {
    repeatability,
    interaction: null,
    persons: (rangeOfPersons * oneRangeFactor(persons)) ** 2 - repeatability / (parts * trials),
    parts: (rangeOfParts * oneRangeFactor(parts)) ** 2,
  };
  return { analysis: spreadAnalysis(found, tolerance), meanRange, rangeOfPersons, rangeOfParts };
}
