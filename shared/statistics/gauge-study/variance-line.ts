import fCdf from '@stdlib/stats-base-dists-f-cdf';
import { type VarianceLine, type VarianceSource } from './gauge-study';
import { type Squares } from './sums-of-squares';

/** The mean square a line is tested against. */
export interface Divisor {
  against: 'interaction' | 'repeatability';
  squares: Squares;
}

/** Mean square: a sum of squares over its degrees of freedom. */
export function meanSquare({ sum, degrees }: Squares): number {
  return sum / degrees;
}

/** A line of the table; without a divisor nothing is tested. */
export function varianceLine(source: VarianceSource, squares: Squares, divisor: Divisor | null): VarianceLine {
  const own = meanSquare(squares);
  const quotient = divisor === null ? Number.NaN : own / meanSquare(divisor.squares);
  const f = Number.isFinite(quotient) ? quotient : null;
  return {
    source,
    degreesOfFreedom: squares.degrees,
    sumOfSquares: squares.sum,
    meanSquare: source === 'total' ? null : own,
    f,
    p: f === null || divisor === null ? null : Math.max(0, 1 - fCdf(f, squares.degrees, divisor.squares.degrees)),
    against: divisor?.against ?? null,
  };
}
