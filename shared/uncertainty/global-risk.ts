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

/** Steps of Simpson's rule over each smooth part: an error far below 1e-9. */
const STEPS = 400;
/** How far a normal distribution reaches, in standard deviations; what lies beyond is less than 1e-14. */
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

/** Integral from one end to the other, part by part, so that no step spans one of the bends in between. */
function integral(f: (x: number) => number, from: number, to: number, bends: readonly number[]): number {
  const ends = [from, ...bends.filter((x) => x > from && x < to).sort((a, b) => a - b), to];
  return ends.slice(1).reduce((sum, end, index) => sum + simpson(f, ends[index] ?? end, end), 0);
}

function demandProcess({ mean, processDeviation, standardUncertainty, guardWidth }: MeasuredProcess): void {
  if (![processDeviation, standardUncertainty].every((each) => Number.isFinite(each) && each > 0))
    throw new RangeError('processDeviation and standardUncertainty must be above 0.');
  if (!(Number.isFinite(mean) && Number.isFinite(guardWidth)))
    throw new RangeError('mean and guardWidth must be numbers.');
}

/**
 * How many units of a process are wrongly accepted and wrongly rejected by a measurement with a guard band.
 *
 * Source: JCGM 106:2012, 9.5, by numerical integration over the true value.
 *
 * @throws {RangeError} for a deviation or uncertainty that is not above 0, a mean or guard band that is not finite
 */
export function globalRisk(process: MeasuredProcess): GlobalRisk {
  const { mean, processDeviation, standardUncertainty, guardWidth } = process;
  demandProcess(process);
  const lower = process.lower ?? -Infinity;
  const upper = process.upper ?? Infinity;
  const acceptFrom = lower + guardWidth;
  const acceptTo = upper - guardWidth;
  const phi = (x: number) => (x === Infinity ? 1 : x === -Infinity ? 0 : normalCdf(x, 0, 1));
  const acceptance = (truth: number) =>
    Math.max(0, phi((acceptTo - truth) / standardUncertainty) - phi((acceptFrom - truth) / standardUncertainty));
  // Around each acceptance limit the acceptance falls from 1 to 0 within the reach of the measurement.
  const bends = [acceptFrom, acceptTo].flatMap((limit) =>
    [-REACH, 0, REACH].map((reach) => (limit + reach * standardUncertainty - mean) / processDeviation),
  );
  const over = (from: number, to: number) => {
    const [a, b] = [from, to].map((end) => Math.min(Math.max((end - mean) / processDeviation, -REACH), REACH));
    return integral((z) => density(z) * acceptance(mean + z * processDeviation), a ?? 0, b ?? 0, bends);
  };
  const conforming = phi((upper - mean) / processDeviation) - phi((lower - mean) / processDeviation);
  const goodAccepted = over(lower, upper);
  const consumer = over(-Infinity, lower) + over(upper, Infinity);
  return { consumer, producer: conforming - goodAccepted, accepted: goodAccepted + consumer, conforming };
}
