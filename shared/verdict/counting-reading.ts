/** How often a reading may be repeated: beside the first, so many more are taken of one characteristic of one unit. */
export const MOST_REPEATS = 2;

/** A kept reading, as far as counting needs it. */
export interface KeptReading {
  /** Whether the reading was withdrawn; it stays on record and counts for nothing. */
  withdrawn: boolean;
}

/**
 * The reading that counts among those kept of one characteristic of one unit: the last not withdrawn.
 *
 * @param readings in the order they were taken
 * @returns the reading, or undefined where none is left
 */
export function countingReading<Reading extends KeptReading>(readings: readonly Reading[]): Reading | undefined {
  return readings.findLast((reading) => !reading.withdrawn);
}

/**
 * Whether one more reading may be taken. Withdrawn readings use repeats up too: otherwise a unit could be measured into
 * compliance by withdrawing what does not fit.
 */
export function mayRepeat(readings: readonly KeptReading[]): boolean {
  return readings.length <= MOST_REPEATS;
}
