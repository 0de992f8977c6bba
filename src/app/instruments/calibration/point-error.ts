import { type CalibrationPoint } from '#shared/contract/calibrations';
import { isWithinTolerance } from '#shared/measurement/within-tolerance';
import { formatQuantity, type FormatQuantityOptions } from '#shared/quantities/format-quantity';

/** A value of a calibration point in its unit; a unit the program does not know stands behind the number as it is. */
export function pointText(value: number, unit: string, options: FormatQuantityOptions = {}): string {
  try {
    return formatQuantity(value, unit, options);
  } catch (thrown) {
    if (!(thrown instanceof RangeError)) throw thrown;
    return `${value}\u00a0${unit}`;
  }
}

/** As many digits as show two of what is allowed: 3.156 V with 0.09 V allowed, 10.0012 V with 1.9 mV. */
export function pointDigits(value: number, limit: number): FormatQuantityOptions {
  const orders = value === 0 ? 0 : Math.ceil(Math.log10(Math.abs(value) / limit));
  return { significant: Math.min(Math.max(orders + 2, 3), 9) };
}

/** How far off an instrument was at a point, with its sign, and whether that was allowed. */
export function pointError({ reference, found, limit, unit }: Omit<CalibrationPoint, 'point'>) {
  // Three digits: the difference of two large values ends in the rounding of the doubles.
  const error = Number((found - reference).toPrecision(3));
  const text = (error > 0 ? '+' : '') + pointText(error, unit);
  return { text, isWithin: isWithinTolerance(found, reference, limit) };
}
