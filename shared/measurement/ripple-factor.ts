import { demandFinite } from './reading-not-finite';

/**
 * Ripple factor: the rms of the ripple as a fraction of the direct voltage under it.
 *
 *     V rms (ac) ÷ |V dc|
 *
 * Unfiltered it is 1.21 half-wave and 0.483 full-wave. Source: Millman & Halkias; Boylestad & Nashelsky (both from memory).
 *
 * @throws {RangeError} for a value that is not finite, a negative ripple, or a direct voltage of 0 V
 */
export function rippleFactor(given: { rippleRmsVolts: number; loadedVolts: number }): number {
  demandFinite(given);
  if (given.rippleRmsVolts < 0) throw new RangeError('rippleRmsVolts must not be negative.');
  if (given.loadedVolts === 0) throw new RangeError('loadedVolts must not be 0 V.');
  return given.rippleRmsVolts / Math.abs(given.loadedVolts);
}
