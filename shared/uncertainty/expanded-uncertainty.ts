import { combinedStandardUncertainty, type Combined } from './combine';
import { unweighted, type Component } from './component';

/** The coverage factor of about 95 % for a normal distribution. */
export const USUAL_COVERAGE_FACTOR = 2;

/**
 * Expanded uncertainty U = k u_c of a quantity with these components.
 * Source: JCGM 100:2008, 6.2.1.
 */
export function expandedUncertainty(components: readonly Component[], coverageFactor: number): number {
  return coverageFactor * combinedStandardUncertainty(unweighted(components));
}

/**
 * A rectangular component dominates where all others together are at most this share of it; the result is then nearly
 * rectangular too. Source: EA-4/02, example S9 and its remark (from memory).
 */
const DOMINANT_REST = 0.3;

/** The coverage factor of 95 % for a rectangular distribution: 0.95 √3. Source: EA-4/02, S9 (k = 1.65). */
export const RECTANGULAR_COVERAGE_FACTOR = 0.95 * Math.sqrt(3);

/** Whether one rectangular contribution dominates, so that k = 2 covers other than 95 %. */
export function isDominatedByRectangular({ contributions, standardUncertainty }: Combined): boolean {
  return contributions.some(({ members, standardUncertainty: own }) => {
    if (own === 0 || members.some(({ component }) => component.distribution !== 'rectangular')) return false;
    const rest = Math.sqrt(Math.max(0, standardUncertainty ** 2 - own ** 2));
    return rest <= DOMINANT_REST * own;
  });
}

/** Coverage factors closer than this are taken for the same. */
const SAME_FACTOR = 0.01;

function rectangularSentence(coverageFactor: number, k: number): string {
  const usual = RECTANGULAR_COVERAGE_FACTOR.toFixed(2);
  if (Math.abs(coverageFactor - RECTANGULAR_COVERAGE_FACTOR) < SAME_FACTOR)
    return `One rectangular component dominates: k = ${k} covers about 95 %.`;
  const compared = coverageFactor > RECTANGULAR_COVERAGE_FACTOR ? 'more' : 'less';
  return `One rectangular component dominates, so that k = ${k} covers ${compared} than 95 %; k = ${usual} would cover 95 %.`;
}

/** What the coverage factor covers, in a sentence. */
export function coverageSentence(combined: Combined, coverageFactor: number): string {
  if (combined.standardUncertainty === 0) return 'No component of uncertainty is known.';
  const k = Number(coverageFactor.toPrecision(3));
  if (isDominatedByRectangular(combined)) return rectangularSentence(coverageFactor, k);
  if (combined.effectiveDegreesOfFreedom < 30)
    return `With ${Math.floor(combined.effectiveDegreesOfFreedom)} effective degrees of freedom k = ${k} covers less than a normal distribution would.`;
  return k === 2 ? 'k = 2 covers about 95 % of a normal distribution.' : `k = ${k}, as the plan says.`;
}
