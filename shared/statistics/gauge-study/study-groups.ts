import { mean } from '../mean';
import { type StudyReadings } from './gauge-study';

/** Readings that a chart shows one beside the other, with their mean; in the readings' unit. */
export interface ReadingGroup {
  readings: number[];
  mean: number;
}

/**
 * The readings of each part.
 *
 * @throws {TooFewReadings} for a part without readings
 * @throws {ReadingNotFinite} for NaN or an infinite reading
 */
export function groupsByPart(study: StudyReadings): ReadingGroup[] {
  return study.map((rows) => ({ readings: rows.flat(), mean: mean(rows.flat()) }));
}

/**
 * The readings of each person, less the mean of the part they are of: who reads high and who scatters shows by itself.
 *
 * @throws {TooFewReadings} for a part without readings
 * @throws {ReadingNotFinite} for NaN or an infinite reading
 */
export function groupsByPerson(study: StudyReadings): ReadingGroup[] {
  const parts = groupsByPart(study);
  return (study[0] ?? []).map((_, person) => {
    const readings = study.flatMap((rows, part) =>
      (rows[person] ?? []).map((reading) => reading - (parts[part]?.mean ?? 0)),
    );
    return { readings, mean: mean(readings) };
  });
}
