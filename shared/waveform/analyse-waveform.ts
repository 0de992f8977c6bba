import { type WaveformAnalysis, type WaveformRecord } from '../contract/waveforms';
import { amplitudeSpectrum } from './amplitude-spectrum';
import { type EvenSamples } from './even-samples';
import { findPeaks, type RipplePeak } from './find-peaks';
import { lineCycles } from './line-cycles';
import { peakFamilies } from './peak-families';
import { waveLevels } from './wave-levels';

/** What of a waveform is kept beside its samples, and its whole spectrum for whoever looks closer. */
export interface AnalysedWaveform {
  analysis: WaveformAnalysis;
  spectrum: WaveformRecord['spectrum'];
}

const MOST_PEAKS = 1000;
const HARMONICS = 10;
/** Harmonics of the line among which the ripple's own frequency is looked for. */
const RIPPLE_HARMONICS = 40;
/** The spectrum is drawn up to here; what lies above is beyond the hundredth harmonic of either mains. */
const MOST_BINS = 2048;
/** With more peaks in a line cycle they are not those of a rectifier, and form no families. */
const MOST_PER_CYCLE = 2.2;

function strongest(amplitudes: readonly { hertz: number; amplitude: number }[]): number | null {
  if (amplitudes.length === 0) return null;
  const most = amplitudes.reduce((best, one) => (one.amplitude > best.amplitude ? one : best));
  return most.amplitude > 0 ? most.hertz : null;
}

/**
 * Computes a waveform's values over its whole line cycles.
 *
 * @param lineHertz of the mains that the supply was connected to
 * @param given peaks that a person has put; found where undefined
 */
export function analyseWaveform(
  { volts, start, interval }: EvenSamples,
  lineHertz: number,
  given?: readonly number[],
): AnalysedWaveform {
  const cycles = lineCycles(volts.length, interval, lineHertz);
  const length = cycles.count > 0 ? cycles.samples : volts.length;
  const { mean, max, min, rmsAc } = waveLevels(volts, length);
  const peakToPeak = max - min;
  const amplitudes =
    cycles.count > 0 && length >= 4 ? amplitudeSpectrum(volts, length, mean) : Float64Array.from<number>([]);
  const harmonic = (order: number) => ({
    hertz: order * lineHertz,
    amplitude: amplitudes[order * cycles.count] ?? 0,
  });
  const harmonics = (count: number) =>
    Array.from({ length: count }, (_, at) => at + 1)
      .filter((order) => cycles.count > 0 && order * cycles.count < amplitudes.length)
      .map(harmonic);
  const found: RipplePeak[] = given
    ? given.map((index) => ({ index, volts: volts[index] ?? 0 })).sort((one, other) => one.index - other.index)
    : findPeaks(volts, cycles, peakToPeak);
  const peaksPerCycle = cycles.count > 0 ? found.length / cycles.count : 0;
  const families = peakFamilies(found, cycles.samplesPerCycle, (index) => start + index * interval);
  const areHalves = peaksPerCycle <= MOST_PER_CYCLE;
  return {
    analysis: {
      lineHertz,
      lineCycles: cycles.count,
      mean,
      max,
      min,
      peakToPeak,
      rmsAc,
      rippleHertz: strongest(harmonics(RIPPLE_HARMONICS)),
      atLine: harmonic(1).amplitude,
      atTwiceLine: harmonic(2).amplitude,
      peaksPerCycle,
      peaks: families.peaks.slice(0, MOST_PEAKS),
      oddMean: areHalves ? families.oddMean : null,
      evenMean: areHalves ? families.evenMean : null,
      alternateDifference: areHalves ? families.difference : null,
      harmonics: harmonics(HARMONICS),
    },
    spectrum: {
      hertzPerBin: cycles.count > 0 ? lineHertz / cycles.count : 0,
      amplitudes: Array.from(amplitudes.subarray(0, MOST_BINS), (amplitude) => Number(amplitude.toPrecision(4))),
    },
  };
}
