import { demandFinite } from './reading-not-finite';

/**
 * Time constant of a resistance and a capacitance, in seconds: R C.
 *
 * @throws {RangeError} for a value that is not finite or is negative
 */
export function timeConstant(given: { ohms: number; farads: number }): number {
  demandFinite(given);
  if (given.ohms < 0) throw new RangeError('ohms must not be negative.');
  if (given.farads < 0) throw new RangeError('farads must not be negative.');
  return given.ohms * given.farads;
}
