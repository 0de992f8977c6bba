import { SPREADS, type Spread, type SpreadAnalysis, type SpreadShare } from './gauge-study';

/** Variances as a method finds them, in the square of the readings' unit; some may come out negative. */
export interface FoundVariances {
  repeatability: number;
  persons: number;
  /** Null where the method does not see it. */
  interaction: number | null;
  parts: number;
}

/** How many standard deviations a spread is taken to be wide. Convention: AIAG MSA, 4th edition. */
const SPREAD_WIDTH = 6;

/** Width of the 97 % confidence interval of the gauge against the spread of the parts. Convention: AIAG MSA, 4th edition. */
const CATEGORY_FACTOR = 1.41;

function variancesOf({ repeatability, persons, interaction, parts }: FoundVariances): Record<Spread, number> {
  const atLeastZero = (variance: number) => Math.max(0, variance);
  const own = {
    repeatability: atLeastZero(repeatability),
    persons: atLeastZero(persons),
    interaction: atLeastZero(interaction ?? 0),
    parts: atLeastZero(parts),
  };
  const gauge = own.repeatability + own.persons + own.interaction;
  return { ...own, gauge, total: gauge + own.parts };
}

/**
 * Splits the spread into its shares. A negative variance is set to 0 and said, since a variance cannot be: the estimate of
 * a small one scatters below zero.
 *
 *     GRR² = EV² + AV² + INT²,  TV² = GRR² + PV²,  ndc = ⌊1.41 PV ÷ GRR⌋,  share of tolerance = 6σ ÷ tolerance
 *
 * Source: AIAG Measurement Systems Analysis, 4th edition.
 *
 * @param tolerance upper minus lower limit, in the readings' unit; null where there are not both
 */
export function spreadAnalysis(found: FoundVariances, tolerance: number | null): SpreadAnalysis {
  const variances = variancesOf(found);
  const { total } = variances;
  const shares = SPREADS.filter((spread) => spread !== 'interaction' || found.interaction !== null).map(
    (spread): SpreadShare => {
      const sigma = Math.sqrt(variances[spread]);
      const own = spread === 'gauge' || spread === 'total' ? 0 : (found[spread] ?? 0);
      return {
        spread,
        sigma,
        ofVariation: total === 0 ? null : sigma / Math.sqrt(total),
        ofVariance: total === 0 ? null : variances[spread] / total,
        ofTolerance: tolerance === null ? null : finite((SPREAD_WIDTH * sigma) / tolerance),
        setToZero: own < 0,
      };
    },
  );
  return { shares, categories: categoriesOf(variances) };
}

/** Readings that hardly differ can make a quotient that is no number; then nothing is said. */
function finite(quotient: number): number | null {
  return Number.isFinite(quotient) ? quotient : null;
}

function categoriesOf({ gauge, parts }: Record<Spread, number>): number | null {
  const categories = Math.trunc((CATEGORY_FACTOR * Math.sqrt(parts)) / Math.sqrt(gauge));
  return Number.isSafeInteger(categories) ? categories : null;
}
