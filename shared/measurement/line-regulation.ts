import { demandFinite } from './reading-not-finite';

/**
 * Line regulation: how far the output follows the mains from low to high line, as a fraction of the rated voltage.
 *
 *     (V high line − V low line) ÷ V rated
 *
 * Source: Boylestad & Nashelsky, Electronic Devices and Circuit Theory (from memory).
 *
 * @throws {RangeError} for a value that is not finite, or a rated voltage of 0 V
 */
export function lineRegulation(given: { highLineVolts: number; lowLineVolts: number; ratedVolts: number }): number {
  demandFinite(given);
  if (given.ratedVolts === 0) throw new RangeError('ratedVolts must not be 0 V.');
  return (given.highLineVolts - given.lowLineVolts) / given.ratedVolts;
}
