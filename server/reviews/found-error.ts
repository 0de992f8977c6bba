import { type CalibrationPoint } from '#shared/contract/calibrations';
import { displayUnit } from '#shared/quantities/display-unit';

/** The unit without prefix and qualifier: V for "mV p-p". A unit that the program does not know stands for itself. */
function plainUnit(unit: string): string {
  try {
    return displayUnit(unit).base.split(' ')[0] ?? unit;
  } catch (error) {
    if (error instanceof RangeError) return unit;
    throw error;
  }
}

/**
 * How far an instrument was off, as a share of the reading: the largest of the calibration's points of a unit.
 *
 * @returns null where the calibration has no point of that unit
 */
export function foundError(points: readonly CalibrationPoint[], unit: string): number | null {
  const shares = points
    .filter((point) => point.reference !== 0 && plainUnit(point.unit) === plainUnit(unit))
    .map(({ found, reference }) => Math.abs((found - reference) / reference));
  return shares.length === 0 ? null : Math.max(...shares);
}

/** Whether an error of so large a share could have carried a reading over one of its limits, either way. */
export function couldTurn(value: number, limits: readonly (number | null)[], share: number): boolean {
  return limits.some((limit) => limit !== null && Math.abs(value - limit) <= share * Math.abs(value));
}
