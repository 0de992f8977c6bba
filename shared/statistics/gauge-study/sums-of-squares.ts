import { compensatedSum } from '../compensated-sum';
import { type StudyReadings, type VarianceSource } from './gauge-study';
import { studyMeans } from './study-means';
import { studyShape } from './study-shape';

/** A sum of squares with its degrees of freedom. */
export interface Squares {
  sum: number;
  degrees: number;
}

/** The total of squared deviations over all sources; each term by itself, so that none can come out below 0. */
function sumSquares(deviations: readonly number[]): number {
  return compensatedSum(deviations.map((deviation) => deviation ** 2));
}

/**
 * Sums of squares of a crossed, balanced study of two factors.
 *
 * Source: D. C. Montgomery, Design and Analysis of Experiments, chapter on experiments with random factors (from memory).
 *
 * @throws {StudyUneven}
 * @throws {ReadingNotFinite} for NaN or an infinite reading
 */
export function sumsOfSquares(given: StudyReadings): Record<VarianceSource, Squares> {
  const { parts, persons, trials } = studyShape(given);
  const means = studyMeans(given);
  const meanOf = (of: readonly number[], index: number) => of[index] ?? 0;
  const crossed = means.cells.flatMap((row, part) =>
    row.map((cell, person) => cell - meanOf(means.parts, part) - meanOf(means.persons, person) + means.grand),
  );
  const within = means.readings.flatMap((rows, part) =>
    rows.flatMap((cell, person) => cell.map((reading) => reading - (means.cells[part]?.[person] ?? 0))),
  );
  return {
    parts: { sum: persons * trials * sumSquares(means.parts.map((one) => one - means.grand)), degrees: parts - 1 },
    persons: { sum: parts * trials * sumSquares(means.persons.map((one) => one - means.grand)), degrees: persons - 1 },
    interaction: { sum: trials * sumSquares(crossed), degrees: (parts - 1) * (persons - 1) },
    repeatability: { sum: sumSquares(within), degrees: parts * persons * (trials - 1) },
    total: {
      sum: sumSquares(means.readings.flat(2).map((reading) => reading - means.grand)),
      degrees: parts * persons * trials - 1,
    },
  };
}
