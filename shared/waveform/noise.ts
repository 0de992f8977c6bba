/** So many places of a waveform tell its noise. */
const PLACES = 20_001;
/** Median of the size of a normally distributed error, in standard deviations. */
const MEDIAN_OF_SIZE = 0.6745;
/** A second difference of independent errors has six times their variance. */
const SECOND_DIFFERENCE = Math.sqrt(6);

/**
 * Standard deviation of a waveform's noise, in volts, out of the second differences of neighbours: there a slow wave is
 * nearly straight. Their median does not see the few places where it bends.
 */
export function noiseOf(volts: Float32Array, length: number): number {
  const stride = Math.max(1, Math.floor(length / PLACES));
  const sizes: number[] = [];
  for (let at = 1; at < length - 1; at += stride)
    sizes.push(Math.abs((volts[at - 1] ?? 0) - 2 * (volts[at] ?? 0) + (volts[at + 1] ?? 0)));
  sizes.sort((one, other) => one - other);
  return (sizes[Math.floor(sizes.length / 2)] ?? 0) / MEDIAN_OF_SIZE / SECOND_DIFFERENCE;
}
