import { demandFinite } from './reading-not-finite';

/** Means of the odd and of the even peaks of the ripple, in volts. */
export interface AlternatePeaksInput {
  oddPeakVolts: number;
  evenPeakVolts: number;
}

/**
 * Alternate-peak difference: how far the means of the odd and of the even ripple peaks lie apart, in volts.
 *
 *     |mean of odd peaks − mean of even peaks|
 *
 * Which peak is called odd is chance, so the sign is dropped. Common practice, no source.
 *
 * @throws {RangeError} for a value that is not finite
 */
export function alternatePeakDifference({ oddPeakVolts, evenPeakVolts }: AlternatePeaksInput): number {
  demandFinite({ oddPeakVolts, evenPeakVolts });
  return Math.abs(oddPeakVolts - evenPeakVolts);
}
