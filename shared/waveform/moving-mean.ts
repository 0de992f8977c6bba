/** Mean over `width` samples around each sample of a stretch that repeats itself; the samples themselves for width 1. */
export function movingMean(volts: Float32Array, length: number, width: number): Float64Array {
  const smooth = new Float64Array(length);
  if (width <= 1) {
    smooth.set(volts.subarray(0, length));
    return smooth;
  }
  const half = Math.floor(width / 2);
  const span = 2 * half + 1;
  const at = (place: number) => volts[(place + length) % length] ?? 0;
  let sum = 0;
  for (let place = -half; place <= half; place += 1) sum += at(place);
  for (let place = 0; place < length; place += 1) {
    smooth[place] = sum / span;
    sum += at(place + half + 1) - at(place - half);
  }
  return smooth;
}
