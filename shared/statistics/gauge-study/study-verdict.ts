import { type SpreadAnalysis, type SpreadShare } from './gauge-study';

/** How fit a gauge is found to be. */
export type GaugeFitness = 'acceptable' | 'conditional' | 'not-acceptable';

/** Shares of the gauge below the first are acceptable, above the second not. Convention: AIAG MSA, 4th edition. */
export const FITNESS_BOUNDS = { acceptable: 0.1, conditional: 0.3 } as const;

/** A gauge tells parts apart well enough from so many categories on. Convention: AIAG MSA, 4th edition. */
export const LEAST_CATEGORIES = 5;

/** What a study says of its gauge, criterion by criterion. */
export interface StudyVerdict {
  /** Null where the readings do not differ at all. */
  ofVariation: GaugeFitness | null;
  /** Null where there are not two limits. */
  ofTolerance: GaugeFitness | null;
  /** Null where the readings do not differ at all. */
  enoughCategories: boolean | null;
  /** The worse of the two shares; null where the readings do not differ. The worse one leads: common practice, no source. */
  overall: GaugeFitness | null;
}

const WORST_FIRST = ['not-acceptable', 'conditional', 'acceptable'] as const;

/** How fit a share of the total variation or of the tolerance (a fraction) shows a gauge to be. */
export function fitnessOf(share: number): GaugeFitness {
  if (share < FITNESS_BOUNDS.acceptable) return 'acceptable';
  return share <= FITNESS_BOUNDS.conditional ? 'conditional' : 'not-acceptable';
}

/** The share that the gauge as a whole has in an analysis. */
export function gaugeShare({ shares }: SpreadAnalysis): SpreadShare | undefined {
  return shares.find(({ spread }) => spread === 'gauge');
}

/** The verdict on an analysis. */
export function studyVerdict(analysis: SpreadAnalysis): StudyVerdict {
  const gauge = gaugeShare(analysis);
  const variation = gauge?.ofVariation ?? null;
  if (gauge === undefined || variation === null)
    return { ofVariation: null, ofTolerance: null, enoughCategories: null, overall: null };
  const ofVariation = fitnessOf(variation);
  const ofTolerance = gauge.ofTolerance === null ? null : fitnessOf(gauge.ofTolerance);
  const overall = WORST_FIRST.find((fitness) => fitness === ofVariation || fitness === ofTolerance) ?? null;
  const { categories } = analysis;
  return { ofVariation, ofTolerance, enoughCategories: categories === null || categories >= LEAST_CATEGORIES, overall };
}
