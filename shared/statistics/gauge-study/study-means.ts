import { mean } from '../mean';
import { type StudyReadings } from './gauge-study';

/** The means of a study, all less its first reading, so that readings all alike are exactly 0. */
export interface StudyMeans {
  /** The readings themselves, less the first. */
  readings: number[][][];
  grand: number;
  parts: number[];
  persons: number[];
  /** `[part][person]`. */
  cells: number[][];
}

/**
 * Means of a study by part, by person and by cell.
 *
 * @throws {ReadingNotFinite} for NaN or an infinite reading
 */
export function studyMeans(given: StudyReadings): StudyMeans {
  const first = given[0]?.[0]?.[0] ?? 0;
  const readings = given.map((rows) => rows.map((cell) => cell.map((reading) => reading - first)));
  const persons = (readings[0] ?? []).map((_, person) => mean(readings.flatMap((rows) => rows[person] ?? [])));
  return {
    readings,
    grand: mean(readings.flat(2)),
    parts: readings.map((rows) => mean(rows.flat())),
    persons,
    cells: readings.map((rows) => rows.map((cell) => mean(cell))),
  };
}
