/** Readings of a crossed gauge study, `[part][person][trial]`; every person measured every part equally often. */
export type StudyReadings = readonly (readonly (readonly number[])[])[];

/** What a study splits the spread of its readings into, in the order of a report. */
export const SPREADS = ['repeatability', 'persons', 'interaction', 'gauge', 'parts', 'total'] as const;
/**
 * A share of the spread. The trade's letters for them: repeatability EV, persons AV (reproducibility without interaction),
 * interaction INT, gauge GRR (the three before together), parts PV, total TV.
 */
export type Spread = (typeof SPREADS)[number];

/** One share of the spread. */
export interface SpreadShare {
  spread: Spread;
  /** Standard deviation, in the readings' unit. */
  sigma: number;
  /** Its standard deviation over that of the total, as a fraction; null where the readings do not differ at all. */
  ofVariation: number | null;
  /** Its variance over that of the total, as a fraction; these add up to 1. Null where the readings do not differ. */
  ofVariance: number | null;
  /** Six standard deviations over the tolerance, as a fraction; null without two limits. */
  ofTolerance: number | null;
  /** Whether its variance came out negative and was set to 0. */
  setToZero: boolean;
}

/** What one method makes of a study. */
export interface SpreadAnalysis {
  shares: SpreadShare[];
  /** Number of distinct categories (ndc); null where the gauge has no spread of its own, so that there is no bound. */
  categories: number | null;
}

/** Where the readings of an analysis of variance come from. */
export const VARIANCE_SOURCES = ['parts', 'persons', 'interaction', 'repeatability', 'total'] as const;
export type VarianceSource = (typeof VARIANCE_SOURCES)[number];

/** A line of the table of an analysis of variance. */
export interface VarianceLine {
  source: VarianceSource;
  degreesOfFreedom: number;
  /** In the square of the readings' unit. */
  sumOfSquares: number;
  /** Null for the total. */
  meanSquare: number | null;
  /** Mean square over that of `against`; null where there is nothing to compare or the divisor is 0. */
  f: number | null;
  /** The chance of an F at least as large if this source added nothing. */
  p: number | null;
  /** Which mean square F divides by. */
  against: 'interaction' | 'repeatability' | null;
}

/** The analysis of variance of a study, with the interaction kept or pooled into the repeatability. */
export interface VarianceTable {
  lines: VarianceLine[];
  analysis: SpreadAnalysis;
}
