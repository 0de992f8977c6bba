import { demandFinite } from './reading-not-finite';

/** Peak-to-peak ripple and direct voltage of one output, in volts, both under the same load. */
export interface RippleRatioInput {
  rippleVolts: number;
  loadedVolts: number;
}

/**
 * Peak-to-peak ripple ratio: the ripple as a fraction of the direct voltage under it (0.1 is 10 %).
 *
 *     V p-p ÷ |V dc|
 *
 * The trade's percent ripple, stated against the mean; the sign of a negative rail does not matter.
 * Source: Floyd, Electronic Devices, ripple factor of the capacitor-input filter (from memory).
 *
 * @throws {RangeError} for a value that is not finite, a negative ripple, or a direct voltage of 0 V
 */
export function rippleRatio({ rippleVolts, loadedVolts }: RippleRatioInput): number {
  demandFinite({ rippleVolts, loadedVolts });
  if (rippleVolts < 0) throw new RangeError('rippleVolts must not be negative.');
  if (loadedVolts === 0) throw new RangeError('loadedVolts must not be 0 V.');
  return rippleVolts / Math.abs(loadedVolts);
}
