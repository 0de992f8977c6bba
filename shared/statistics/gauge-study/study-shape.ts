import { type StudyReadings } from './gauge-study';

/** A study whose parts, persons or trials are fewer than two, or whose cells do not all hold as many readings. */
export class StudyUneven extends RangeError {
  override readonly name = 'StudyUneven';

  constructor() {
    super('A gauge study needs two or more parts, persons and trials, and as many readings in every cell.');
  }
}

/** How many parts, persons and trials a study has. */
export interface StudyShape {
  parts: number;
  persons: number;
  trials: number;
}

/**
 * The shape of a crossed, balanced study.
 *
 * @throws {StudyUneven}
 */
export function studyShape(readings: StudyReadings): StudyShape {
  const shape = {
    parts: readings.length,
    persons: readings[0]?.length ?? 0,
    trials: readings[0]?.[0]?.length ?? 0,
  };
  const even = readings.every(
    (rows) => rows.length === shape.persons && rows.every((cell) => cell.length === shape.trials),
  );
  if (!even || Math.min(shape.parts, shape.persons, shape.trials) < 2) throw new StudyUneven();
  return shape;
}
