/** A ratio below this means that the measurement is coarse for its limits (common practice, no source). */
export const LEAST_TEST_UNCERTAINTY_RATIO = 4;

/** How fine a measurement is for its limits. */
export type MeasurementFineness =
  | { kind: 'ratio'; ratio: number; coarse: boolean }
  /** With one limit no ratio is defined: U is shown against the distance from a typical value to the limit. */
  | { kind: 'distance'; distance: number; share: number }
  | { kind: 'none' };

/**
 * Test uncertainty ratio (upper − lower) / 2U for two limits; for one limit what U is of the distance between the target
 * (or a typical value) and that limit.
 *
 * @param typical target or typical value; null where none is known
 * @throws {RangeError} for an uncertainty that is not above 0
 */
export function measurementFineness(
  { lower, upper }: { lower: number | null; upper: number | null },
  expandedUncertainty: number,
  typical: number | null,
): MeasurementFineness {
  if (!(Number.isFinite(expandedUncertainty) && expandedUncertainty > 0))
    throw new RangeError('expandedUncertainty must be a number above 0.');
  if (lower !== null && upper !== null) {
    const ratio = (upper - lower) / (2 * expandedUncertainty);
    return { kind: 'ratio', ratio, coarse: ratio < LEAST_TEST_UNCERTAINTY_RATIO };
  }
  const limit = upper ?? lower;
  if (limit === null || typical === null || limit === typical) return { kind: 'none' };
  const distance = Math.abs(limit - typical);
  return { kind: 'distance', distance, share: expandedUncertainty / distance };
}
