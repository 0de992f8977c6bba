import { demandFinite } from './reading-not-finite';

/** Peak voltages of the two half-windings, in volts. */
export interface TransformerBalanceInput {
  firstHalfVolts: number;
  secondHalfVolts: number;
}

/**
 * Transformer balance: how unequal the two half-windings are, as a fraction of their mean (0.03 is 3 %).
 *
 *     |V₁ − V₂| ÷ ((V₁ + V₂) ÷ 2)
 *
 * Common practice, no source.
 *
 * @throws {RangeError} for a value that is not finite or negative, or where both halves are 0 V
 */
export function transformerBalance({ firstHalfVolts, secondHalfVolts }: TransformerBalanceInput): number {
  demandFinite({ firstHalfVolts, secondHalfVolts });
  if (firstHalfVolts < 0) throw new RangeError('firstHalfVolts must not be negative.');
  if (secondHalfVolts < 0) throw new RangeError('secondHalfVolts must not be negative.');
  const mean = (firstHalfVolts + secondHalfVolts) / 2;
  if (mean === 0) throw new RangeError('firstHalfVolts and secondHalfVolts must not both be 0 V.');
  return Math.abs(firstHalfVolts - secondHalfVolts) / mean;
}
