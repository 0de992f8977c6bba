const MINUTE = 60_000;
const LONGEST = 240 * MINUTE;
/** Up to this share is added by chance, so that what failed together does not come back together. */
const JITTER = 0.25;

/** A message is given up after this many attempts, about half a day after the first. */
export const MOST_ATTEMPTS = 12;

/**
 * Milliseconds until the next attempt: a minute after the first failure, twice as long after each further one, four
 * hours at most. Common practice, no source.
 *
 * @param failures attempts that have failed, from 1
 * @param chance a number from 0 to 1
 */
export function retryDelay(failures: number, chance: number): number {
  const base = Math.min(MINUTE * 2 ** (failures - 1), LONGEST / (1 + JITTER));
  return Math.round(base * (1 + JITTER * chance));
}
