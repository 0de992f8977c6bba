/**
 * Whether a value lies within a tolerance of its reference, the edges included: 10.005 is within 0.005 of 10, although the
 * difference of the two doubles is a little more.
 *
 * All three in one unit.
 */
export function isWithinTolerance(value: number, reference: number, tolerance: number): boolean {
  const rounding = 4 * Number.EPSILON * Math.max(Math.abs(value), Math.abs(reference));
  return Math.abs(value - reference) <= tolerance + rounding;
}
