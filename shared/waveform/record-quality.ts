import { lineCycles } from './line-cycles';
import { type EvenSamples } from './even-samples';

/** What could keep a record of a waveform from being judged. */
export interface RecordQuality {
  /** Share of the samples at the top and at the bottom of the range, where they stand far thicker than just below. */
  flatTop: number;
  flatBottom: number;
  /** Different levels that occur, counted up to a few dozen. */
  levels: number;
  /** Samples in a period of what changes most in the record. */
  samplesPerPeriod: number;
  samplesPerCycle: number;
  lineCycles: number;
}

/** The end of the range that is looked at, and as much again below it, as shares of the whole. */
const END = 0.01;
/**
 * A wave with a rounded top has up to 2.4 times as many samples in its highest hundredth as in the next (they go with the
 * root of the depth); one that is cut off has all of the cut there.
 */
const THICKER = 6;
/** A wave that is cut off stays there for several samples at a time; one that turns may have a single one at its top. */
const LEAST_STAY = 3;
const MOST_LEVELS = 64;

/** Samples at an end of the range, how often the wave comes there, and samples just short of it. */
interface EndOfRange {
  flat: number;
  visits: number;
  short: number;
}

/** @param heightOf height of a sample above the other end, as a share of the range */
function endOfRange(volts: Float32Array, heightOf: (value: number) => number): EndOfRange {
  const end = { flat: 0, visits: 0, short: 0 };
  let wasFlat = false;
  for (const value of volts) {
    const height = heightOf(value);
    const isFlat = height >= 1 - END;
    if (isFlat) {
      end.flat += 1;
      if (!wasFlat) end.visits += 1;
    } else if (height >= 1 - 2 * END) end.short += 1;
    wasFlat = isFlat;
  }
  return end;
}

/** Share of the samples that lie flat at an end; 0 where the wave only turns there. */
function flatShare({ flat, visits, short }: EndOfRange, samples: number): number {
  return flat > THICKER * short && flat >= LEAST_STAY * visits ? flat / samples : 0;
}

function levelsOf(volts: Float32Array): number {
  const levels = new Set<number>();
  for (const value of volts) {
    levels.add(value);
    if (levels.size >= MOST_LEVELS) break;
  }
  return levels.size;
}

function periodOf(volts: Float32Array): number {
  const { length } = volts;
  const base = volts[0] ?? 0;
  let sum = 0;
  let squares = 0;
  let steps = 0;
  for (let at = 0; at < length; at += 1) {
    const above = (volts[at] ?? 0) - base;
    const step = at === 0 ? 0 : above - ((volts[at - 1] ?? 0) - base);
    sum += above;
    squares += above * above;
    steps += step * step;
  }
  const variance = squares / length - (sum / length) ** 2;
  // A sine of n samples to the period changes from one to the next by 2π/n of its rms.
  return steps > 0 && variance > 0 ? (2 * Math.PI) / Math.sqrt(steps / length / variance) : Infinity;
}

/** Looks at how a waveform was recorded. */
export function recordQuality({ volts, interval }: EvenSamples, lineHertz: number): RecordQuality {
  let min = Infinity;
  let max = -Infinity;
  for (const value of volts) {
    if (value < min) min = value;
    if (value > max) max = value;
  }
  const range = max - min;
  const top = endOfRange(volts, (value) => (value - min) / range);
  const bottom = endOfRange(volts, (value) => (max - value) / range);
  const { count, samplesPerCycle } = lineCycles(volts.length, interval, lineHertz);
  return {
    flatTop: flatShare(top, volts.length),
    flatBottom: flatShare(bottom, volts.length),
    levels: levelsOf(volts),
    samplesPerPeriod: periodOf(volts),
    samplesPerCycle,
    lineCycles: count,
  };
}
