/**
 * The line of the product: a ripple that settles, y = a (1 - t)^1.6 sin(2 pi turns t) with y down, then straight.
 * Lengths are in the units of the drawing.
 */
export function markPath(shape: {
  x: number;
  y: number;
  width: number;
  amplitude: number;
  turns?: number;
  tail?: number;
  steps?: number;
}): string {
  const { x, y, width, amplitude, turns = 2.5, tail = 0, steps = 90 } = shape;
  const points = Array.from({ length: steps + 1 }, (_, step) => {
    const t = step / steps;
    const height = amplitude * (1 - t) ** 1.6 * Math.sin(2 * Math.PI * turns * t);
    return `${(x + width * t).toFixed(2)},${(y + height).toFixed(2)}`;
  });
  return `M${points.join(' ')}${tail > 0 ? `H${(x + width + tail).toFixed(2)}` : ''}`;
}
