import { type WaveformPeak } from '../contract/waveforms';
import { type RipplePeak } from './find-peaks';
import { mean } from '../statistics/mean';

/** Peaks of a rectifier by the half of the line cycle that made them, and the mean of each family in volts. */
export interface PeakFamilies {
  peaks: WaveformPeak[];
  oddMean: number | null;
  evenMean: number | null;
  /** Difference of the two means; null where there is only one family. */
  difference: number | null;
}

/**
 * Tells the peaks of one half of the line cycle from those of the other, by their distance from the first in half cycles:
 * a peak that is missing does not turn the families around.
 */
export function peakFamilies(
  peaks: readonly RipplePeak[],
  samplesPerCycle: number,
  secondsOf: (index: number) => number,
): PeakFamilies {
  const first = peaks[0]?.index ?? 0;
  const told = peaks.map(({ index, volts }): WaveformPeak => {
    const halves = Math.round((index - first) / (samplesPerCycle / 2));
    return { index, volts, seconds: secondsOf(index), family: halves % 2 === 0 ? 'odd' : 'even' };
  });
  const meanOf = (family: WaveformPeak['family']) => {
    const heights = told.filter((peak) => peak.family === family).map(({ volts }) => volts);
    return heights.length === 0 ? null : mean(heights);
  };
  const oddMean = meanOf('odd');
  const evenMean = meanOf('even');
  const difference = oddMean === null || evenMean === null ? null : Math.abs(oddMean - evenMean);
  return { peaks: told, oddMean, evenMean, difference };
}
