/** A question about readings that so few of them cannot answer. */
export class TooFewReadings extends RangeError {
  override readonly name = 'TooFewReadings';

  constructor(
    /** How many readings the question needs at least. */
    readonly needed: number,
    /** How many were given. */
    readonly given: number,
  ) {
    super(`readings must number at least ${needed}, not ${given}.`);
  }
}

/**
 * Refuses a series that is too short.
 *
 * @throws {TooFewReadings}
 */
export function demandReadings(readings: readonly number[], needed: number): void {
  if (readings.length < needed) throw new TooFewReadings(needed, readings.length);
}
