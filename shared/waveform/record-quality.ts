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
const MOST_LEVELS = 64;

function ends(volts: Float32Array, min: number, max: number) {
  const range = max - min;
  const counts = { top: 0, belowTop: 0, bottom: 0, aboveBottom: 0 };
  for (const value of volts) {
    const height = (value - min) / range;
    if (height >= 1 - END) counts.top += 1;
    else if (height >= 1 - 2 * END) counts.belowTop += 1;
    else if (height <= END) counts.bottom += 1;
    else if (height <= 2 * END) counts.aboveBottom += 1;
  }
  return counts;
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
  const { top, belowTop, bottom, aboveBottom } = ends(volts, min, max);
  const { count, samplesPerCycle } = lineCycles(volts.length, interval, lineHertz);
  return {
    flatTop: top > THICKER * belowTop ? top / volts.length : 0,
    flatBottom: bottom > THICKER * aboveBottom ? bottom / volts.length : 0,
    levels: levelsOf(volts),
    samplesPerPeriod: periodOf(volts),
    samplesPerCycle,
    lineCycles: count,
  };
}
