import normalCdf from '@stdlib/stats-base-dists-normal-cdf';

/** Limits in the unit of the value; null is no limit. */
interface Limits {
  lower: number | null;
  upper: number | null;
}

/**
 * Probability that the true value conforms, given what was measured.
 *
 *     p = Φ((T_U − y) / u) − Φ((T_L − y) / u)
 *
 * The measured value is taken as normally distributed about the true one. Source: JCGM 106:2012, 7.3 and 7.4.
 *
 * @param value measured value y
 * @param standardUncertainty u; 0 means that the value is known exactly
 * @throws {RangeError} for a value that is not finite, or an uncertainty that is negative or not finite
 */
export function conformityProbability(value: number, standardUncertainty: number, { lower, upper }: Limits): number {
  if (!Number.isFinite(value)) throw new RangeError('value must be a number.');
  if (!(Number.isFinite(standardUncertainty) && standardUncertainty >= 0))
    throw new RangeError('standardUncertainty must be a number of at least 0.');
  if (standardUncertainty === 0)
    return Number((lower === null || value >= lower) && (upper === null || value <= upper));
  const below = (limit: number) => normalCdf((limit - value) / standardUncertainty, 0, 1);
  return Math.max(0, (upper === null ? 1 : below(upper)) - (lower === null ? 0 : below(lower)));
}
