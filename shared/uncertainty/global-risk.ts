import normalCdf from '@stdlib/stats-base-dists-normal-cdf';

/** A process and its measurement, both normal, in one unit. */
export interface MeasuredProcess {
  mean: number;
  /** Standard deviation of the true values. */
  processDeviation: number;
  /** Standard uncertainty of the measurement. */
  standardUncertainty: number;
  lower: number | null;
  upper: number | null;
  /** Guard band inside each limit; negative outside. */
  guardWidth: number;
}

/** Shares of all units. */
export interface GlobalRisk {
  /** Not conforming and accepted. */
  consumer: number;
  /** Conforming and rejected. */
  producer: number;
  accepted: number;
  conforming: number;
}

/** Steps of Simpson's rule over each part of ± 8 standard deviations: an error far below 1e-9 for smooth integrands. */
const STEPS = 2000;
const REACH = 8;

function density(x: number): number {
  return Math.exp((-x * x) / 2) / Math.sqrt(2 * Math.PI);
}

function simpson(f: (x: number) => number, from: number, to: number): number {
  if (to <= from) return 0;
  const step = (to - from) / STEPS;
  let sum = f(from) + f(to);
  for (let index = 1; index < STEPS; index += 1) sum += f(from + index * step) * (index % 2 === 0 ? 2 : 4);
  return (sum * step) / 3;
}

/**
 * How many units of a process are wrongly accepted and wrongly rejected by a measurement with a guard band.
 *
 * Source: JCGM 106:2012, 9.5, by numerical integration over the true value.
 *
 * @throws {RangeError} for a deviation or uncertainty that is not above 0
 */
export function globalRisk(process: MeasuredProcess): GlobalRisk {
  const { mean, processDeviation, standardUncertainty, guardWidth } = process;
  if (!(processDeviation > 0 && standardUncertainty > 0))
    throw new RangeError('processDeviation and standardUncertainty must be above 0.');
  const lower = process.lower ?? -Infinity;
  const upper = process.upper ?? Infinity;
  const acceptFrom = lower + guardWidth;
  const acceptTo = upper - guardWidth;
  const phi = (x: number) => (x === Infinity ? 1 : x === -Infinity ? 0 : normalCdf(x, 0, 1));
  const acceptance = (truth: number) =>
    Math.max(0, phi((acceptTo - truth) / standardUncertainty) - phi((acceptFrom - truth) / standardUncertainty));
  const over = (from: number, to: number) => {
    const [a, b] = [from, to].map((end) => Math.min(Math.max((end - mean) / processDeviation, -REACH), REACH));
    return simpson((z) => density(z) * acceptance(mean + z * processDeviation), a ?? 0, b ?? 0);
  };
  const conforming = phi((upper - mean) / processDeviation) - phi((lower - mean) / processDeviation);
  const goodAccepted = over(lower, upper);
  const consumer = over(-Infinity, lower) + over(upper, Infinity);
  return { consumer, producer: conforming - goodAccepted, accepted: goodAccepted + consumer, conforming };
}
