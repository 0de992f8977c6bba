import { WaveformNotUnderstood } from './waveform-not-understood';

/** Voltages at even intervals. */
export interface EvenSamples {
  volts: Float32Array;
  /** Instant of the first one, in seconds. */
  start: number;
  /** Seconds between two. */
  interval: number;
  /** Whether they lie between the file's own samples, which were unevenly spaced. */
  interpolated: boolean;
}

/**
 * How far an instant may lie from an even step, in steps, before the samples count as unevenly spaced: instants are
 * printed with few digits, and a tenth of a step moves no sample to its neighbour's place.
 */
const MOST_OFF = 0.1;
/** A step so many times the usual one is a gap that no straight line may bridge. */
const GAP = 20;

/** The largest distance of an instant from its even place, and the smallest and the widest step; seconds. */
function spread(seconds: Float64Array, start: number, interval: number) {
  let off = 0;
  let smallest = Infinity;
  let widest = { seconds: 0, at: 0 };
  for (let at = 1; at < seconds.length; at += 1) {
    const instant = seconds[at] ?? 0;
    const step = instant - (seconds[at - 1] ?? 0);
    off = Math.max(off, Math.abs(instant - (start + at * interval)));
    if (step > 0 && step < smallest) smallest = step;
    if (step > widest.seconds) widest = { seconds: step, at };
  }
  return { off, smallest, widest };
}

function between(seconds: Float64Array, volts: Float32Array, start: number, interval: number): Float32Array {
  const even = new Float32Array(volts.length);
  let before = 0;
  for (let at = 0; at < even.length; at += 1) {
    const instant = start + at * interval;
    while (before < seconds.length - 2 && (seconds[before + 1] ?? 0) <= instant) before += 1;
    const from = seconds[before] ?? 0;
    const step = (seconds[before + 1] ?? from) - from;
    const share = step > 0 ? Math.min(1, Math.max(0, (instant - from) / step)) : 0;
    const low = volts[before] ?? 0;
    even[at] = low + share * ((volts[before + 1] ?? low) - low);
  }
  return even;
}

/**
 * Samples at even intervals. Instants that stand several times because they were printed with too few digits are taken as
 * evenly spaced; where samples truly lie unevenly, straight lines between them are read at even intervals.
 *
 * @param seconds instants, none before the one above it
 * @param rowOf the row of the file in which a sample stands, for the message
 * @throws {WaveformNotUnderstood} where time stands still, or samples are missing in between
 */
export function evenSamples(
  seconds: Float64Array,
  volts: Float32Array,
  rowOf: (sample: number) => number,
): EvenSamples {
  const start = seconds[0] ?? 0;
  const interval = ((seconds.at(-1) ?? 0) - start) / (seconds.length - 1);
  if (!(interval > 0)) throw new WaveformNotUnderstood('Time stands still: all samples have the same instant.');
  if (!Number.isFinite(interval)) throw new WaveformNotUnderstood('The instants lie too far apart to be seconds.');
  const { off, smallest, widest } = spread(seconds, start, interval);
  const printed = smallest > interval * 1.5 ? smallest : 0;
  if (off <= Math.max(MOST_OFF * interval, printed)) return { volts, start, interval, interpolated: false };
  if (widest.seconds > GAP * interval)
    throw new WaveformNotUnderstood(
      `samples are missing before it: time jumps by ${Number((widest.seconds * 1e3).toPrecision(3))} ms.`,
      rowOf(widest.at),
    );
  return { volts: between(seconds, volts, start, interval), start, interval, interpolated: true };
}
