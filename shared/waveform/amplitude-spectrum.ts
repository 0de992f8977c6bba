import FFT from 'fft.js';

/** Amplitudes of the sines that a stretch of a waveform is made of; bin k has k whole periods in it. */
export type AmplitudeSpectrum = Float64Array;

/** More points than this show nothing that matters to a ripple, and cost time. */
const MOST_POINTS = 65_536;

/**
 * Means of even slices of the first `length` samples. The slices fill whole line cycles exactly, wherever the samples lie
 * in them, so that each harmonic of the line falls on a bin of its own and leaks into no other.
 */
function slices(volts: Float32Array, length: number, count: number, mean: number): Float64Array {
  const means = new Float64Array(count);
  const width = length / count;
  for (let slice = 0; slice < count; slice += 1) {
    const from = slice * width;
    const to = from + width;
    let sum = 0;
    for (let at = Math.floor(from); at < to; at += 1) {
      const covered = Math.min(to, at + 1) - Math.max(from, at);
      sum += covered * ((volts[at] ?? mean) - mean);
    }
    means[slice] = sum / width;
  }
  return means;
}

/**
 * Amplitudes by the fast Fourier transform, without a window: the stretch is periodic, being whole line cycles.
 *
 * @param length samples of whole line cycles, at least 4
 */
export function amplitudeSpectrum(volts: Float32Array, length: number, mean: number): AmplitudeSpectrum {
  const points = Math.min(MOST_POINTS, 2 ** Math.floor(Math.log2(length)));
  const transform = new FFT(points);
  const complex = new Float64Array(points * 2);
  // The library writes to any array of numbers; one of floats saves it the boxes.
  transform.realTransform(complex, slices(volts, length, points, mean));
  const amplitudes = new Float64Array(points / 2);
  for (let bin = 1; bin < amplitudes.length; bin += 1)
    amplitudes[bin] = (2 / points) * Math.hypot(complex[2 * bin] ?? 0, complex[2 * bin + 1] ?? 0);
  return amplitudes;
}
