import { demandFinite } from './reading-not-finite';

/** Power given to the load and power drawn from the line, in watts. */
export interface EfficiencyInput {
  outputWatts: number;
  inputWatts: number;
}

/**
 * Efficiency at one load, as a fraction (0.86 is 86 %).
 *
 *     P out ÷ P in
 *
 * Source: 10 CFR part 430, subpart B, Appendix Z; Commission Regulation (EU) 2019/1782.
 *
 * @throws {RangeError} for a value that is not finite, a negative output power, or an input power not above 0 W
 */
export function efficiency({ outputWatts, inputWatts }: EfficiencyInput): number {
  demandFinite({ outputWatts, inputWatts });
  if (outputWatts < 0) throw new RangeError('outputWatts must not be negative.');
  if (inputWatts <= 0) throw new RangeError('inputWatts must be above 0 W.');
  return outputWatts / inputWatts;
}
