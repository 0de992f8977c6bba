import { type LineCycles } from './line-cycles';
import { movingMean } from './moving-mean';
import { noiseOf } from './noise';

/** A maximum of the ripple. */
export interface RipplePeak {
  index: number;
  volts: number;
}

/** A peak stands above the valleys beside it by at least this share of the whole ripple; below it lie dents and ringing. */
const LEAST_PROMINENCE = 0.02;
/** And by so many standard deviations of the noise that is left. */
const ABOVE_NOISE = 6;
/** Widths of smoothing in line cycles, each with the noise (as a share of the ripple) up to which it is enough. */
const SMOOTHINGS = [
  { width: 0, noise: 0.002 },
  { width: 1 / 200, noise: 0.02 },
  { width: 1 / 50, noise: 0.1 },
  { width: 1 / 20, noise: Infinity },
] as const;
/** A rectifier charges its capacitor at most twice in a line cycle; more peaks are something else, to be smoothed away. */
const MOST_PER_CYCLE = 2.2;

/** Maxima that stand out by `least` volts, of a stretch that repeats itself, from its lowest sample once around. */
function standingOut(smooth: Float64Array, least: number): RipplePeak[] {
  const { length } = smooth;
  let lowest = 0;
  smooth.forEach((value, at) => {
    if (value < (smooth[lowest] ?? 0)) lowest = at;
  });
  const peaks: RipplePeak[] = [];
  let highest: RipplePeak = { index: lowest, volts: smooth[lowest] ?? 0 };
  let valley = highest.volts;
  let isRising = true;
  for (let step = 1; step <= length; step += 1) {
    const index = (lowest + step) % length;
    const volts = smooth[index] ?? 0;
    if (isRising) {
      if (volts > highest.volts) highest = { index, volts };
      else if (volts < highest.volts - least) {
        peaks.push(highest);
        isRising = false;
        valley = volts;
      }
    } else if (volts < valley) valley = volts;
    else if (volts > valley + least) {
      isRising = true;
      highest = { index, volts };
    }
  }
  return peaks.sort((one, other) => one.index - other.index);
}

/**
 * The peaks of a ripple over whole line cycles. Noise is smoothed as far as it needs to be, never more: smoothing lowers a
 * peak.
 *
 * @param ripple highest minus lowest of the stretch, in volts
 */
export function findPeaks(volts: Float32Array, cycles: LineCycles, ripple: number): RipplePeak[] {
  if (cycles.count === 0 || ripple <= 0) return [];
  const length = Math.floor(cycles.samples);
  const noise = noiseOf(volts, length);
  const enough = SMOOTHINGS.findIndex((smoothing) => noise <= smoothing.noise * ripple);
  let peaks: RipplePeak[] = [];
  for (const { width } of SMOOTHINGS.slice(enough)) {
    const samples = Math.max(1, Math.round(width * cycles.samplesPerCycle));
    const left = noise / Math.sqrt(samples);
    peaks = standingOut(movingMean(volts, length, samples), Math.max(LEAST_PROMINENCE * ripple, ABOVE_NOISE * left));
    if (peaks.length <= MOST_PER_CYCLE * cycles.count) break;
  }
  return peaks;
}
