/** Levels of a stretch of a waveform, in volts. */
export interface WaveLevels {
  mean: number;
  max: number;
  min: number;
  /** Root of the mean square of what is left without the mean. */
  rmsAc: number;
}

/**
 * Levels of the first `length` samples. A last sample that counts in part has that part in the mean; highest and lowest
 * are taken of all of them.
 *
 * @param length more than 0, at most the number of samples
 */
export function waveLevels(volts: Float32Array, length: number): WaveLevels {
  const whole = Math.floor(length);
  const part = length - whole;
  let sum = 0;
  let max = -Infinity;
  let min = Infinity;
  // Differences from the first sample keep the digits of a small ripple on a high voltage.
  const base = volts[0] ?? 0;
  let squares = 0;
  const end = part > 1e-9 ? whole + 1 : whole;
  for (let at = 0; at < end; at += 1) {
    const value = volts[at] ?? 0;
    const weight = at < whole ? 1 : part;
    const above = value - base;
    sum += weight * above;
    squares += weight * above * above;
    if (value > max) max = value;
    if (value < min) min = value;
  }
  const offset = sum / length;
  return { mean: base + offset, max, min, rmsAc: Math.sqrt(Math.max(0, squares / length - offset * offset)) };
}
