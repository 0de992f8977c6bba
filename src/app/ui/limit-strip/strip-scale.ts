/** The two limits of a characteristic; null where there is none. */
export interface Limits {
  readonly lower: number | null;
  readonly upper: number | null;
}

/** The ends of a strip's scale, in the unit of the reading. */
export interface Scale {
  readonly min: number;
  readonly max: number;
}

/**
 * The scale of a characteristic, the same for a whole column of strips: two limits leave a quarter of the band free on
 * each side; one limit takes 50 % to 117 % of an upper, 83 % to 150 % of a lower limit.
 */
export function stripScale({ lower, upper }: Limits, set?: Partial<Scale>): Scale {
  const usual = usualScale(lower, upper);
  return { min: set?.min ?? usual.min, max: set?.max ?? usual.max };
}

function usualScale(lower: number | null, upper: number | null): Scale {
  if (lower !== null && upper !== null) {
    const free = (upper - lower || Math.abs(upper) || 1) / 4;
    return { min: lower - free, max: upper + free };
  }
  if (upper !== null) return around(upper, -0.5, 1 / 6);
  if (lower !== null) return around(lower, -1 / 6, 0.5);
  return { min: 0, max: 1 };
}

/** A span around one limit as shares of its size, so that it also holds for limits at or below zero. */
function around(limit: number, below: number, above: number): Scale {
  const size = Math.abs(limit) || 1;
  return { min: limit + below * size, max: limit + above * size };
}
