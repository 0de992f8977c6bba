/**
 * 1 ÷ d₂ for ranges of 2 to 10 readings, the mean of very many ranges: K₁ of trials.
 *
 * Source: 2 and 3 as printed on the gauge study form of the AIAG Measurement Systems Analysis manual, 4th edition; the others
 * computed from d₂ = ∫ (1 − Φᵐ − (1 − Φ)ᵐ) dx, Φ the normal distribution function.
 */
const OF_MANY_RANGES: Readonly<Record<number, number>> = {
  2: 0.8862,
  3: 0.5908,
  4: 0.4857314573,
  5: 0.4299357473,
  6: 0.3945687266,
  7: 0.3697736993,
  8: 0.3512221779,
  9: 0.3366973524,
  10: 0.3249384973,
};

/**
 * 1 ÷ d₂* for the range of 2 to 30 values, one range alone: K₂ of persons, K₃ of parts.
 *
 * Source: 2 to 10 as printed on the same form; above, computed as 1 ÷ √E(W²), W the range of so many standard normal values
 * (H. A. David, Order Statistics, for the moments of the range; from memory).
 */
const OF_ONE_RANGE: Readonly<Record<number, number>> = {
  2: 0.7071,
  3: 0.5231,
  4: 0.4467,
  5: 0.403,
  6: 0.3742,
  7: 0.3534,
  8: 0.3375,
  9: 0.3249,
  10: 0.3146,
  11: 0.3058950081,
  12: 0.298493375,
  13: 0.2920743858,
  14: 0.2864372641,
  15: 0.2814341396,
  16: 0.2769534382,
  17: 0.2729092134,
  18: 0.269234065,
  19: 0.2658743055,
  20: 0.2627865781,
  21: 0.2599354387,
  22: 0.257291595,
  23: 0.2548305999,
  24: 0.252531869,
  25: 0.2503779304,
  26: 0.2483538454,
  27: 0.2464467546,
  28: 0.2446455206,
  29: 0.2429404424,
  30: 0.2413230252,
};

/** A number of trials, persons or parts for which no factor is known. */
export class RangeFactorNotKnown extends RangeError {
  override readonly name = 'RangeFactorNotKnown';

  constructor(
    /** How many values the range is of. */
    readonly values: number,
  ) {
    super(`There is no factor for the range of ${String(values)} values.`);
  }
}

function factor(table: Readonly<Record<number, number>>, values: number): number {
  const found = table[values];
  if (found === undefined) throw new RangeFactorNotKnown(values);
  return found;
}

/**
 * What turns the mean of many ranges, each of so many readings, into a standard deviation.
 *
 * @throws {RangeFactorNotKnown} below 2 and above 10
 */
export function manyRangesFactor(values: number): number {
  return factor(OF_MANY_RANGES, values);
}

/**
 * What turns one range of so many values into a standard deviation.
 *
 * @throws {RangeFactorNotKnown} below 2 and above 30
 */
export function oneRangeFactor(values: number): number {
  return factor(OF_ONE_RANGE, values);
}
