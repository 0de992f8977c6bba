/** The whole line cycles of a waveform: where they end, in samples; the end may lie between two samples. */
export interface LineCycles {
  count: number;
  /** Samples in one cycle. */
  samplesPerCycle: number;
  /** Samples in all of them. */
  samples: number;
}

/** A record may be short of a whole cycle by the rounding of its instants. */
const ROUNDING = 0.005;

/** @param interval seconds between two samples, each of which stands for the time until the next */
export function lineCycles(samples: number, interval: number, lineHertz: number): LineCycles {
  const samplesPerCycle = 1 / (lineHertz * interval);
  const count = Math.floor(samples / samplesPerCycle + ROUNDING);
  return { count, samplesPerCycle, samples: Math.min(samples, count * samplesPerCycle) };
}
