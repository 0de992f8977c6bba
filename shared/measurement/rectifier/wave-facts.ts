/** What one cycle of a periodic output shows; volts and hertz. */
export interface WaveFacts {
  meanVolts: number;
  peakVolts: number;
  valleyVolts: number;
  rippleVolts: number;
  rippleRmsVolts: number;
  rippleHertz: number;
  peaksPerCycle: number;
  alternatePeakVolts: number | null;
}

/** A peak must stand out from the valley beside it by this share of the ripple; less is the arithmetic of the steps. */
const LEAST_PEAK = 1e-3;
const HARMONICS = 8;

/** The top of the parabola through three evenly spaced values. */
function vertex(before: number, at: number, after: number): number {
  const bend = before - 2 * at + after;
  return bend === 0 ? at : at - (after - before) ** 2 / (8 * bend);
}

/** Local maxima of a periodic series, each at the top of the parabola through its neighbours. */
function maxima(volts: Float64Array, least: number): number[] {
  const n = volts.length;
  const at = (index: number) => volts[((index % n) + n) % n] ?? 0;
  const start = volts.indexOf(Math.min(...volts));
  const found: number[] = [];
  let top = -1;
  let low = at(start);
  for (let step = 1; step <= n; step += 1) {
    const index = start + step;
    const value = at(index);
    if (top < 0 || value > at(top)) {
      if (value - low > least && (top < 0 || value > at(top))) top = index;
    }
    if (top < 0) low = Math.min(low, value);
    else if (at(top) - value > least) {
      found.push(vertex(at(top - 1), at(top), at(top + 1)));
      top = -1;
      low = value;
    }
  }
  return found;
}

/** The multiple of the cycle's own frequency with the largest amplitude. */
function strongestHarmonic(volts: Float64Array, mean: number): number {
  let strongest = { harmonic: 1, power: -1 };
  for (let harmonic = 1; harmonic <= HARMONICS; harmonic += 1) {
    let real = 0;
    let imaginary = 0;
    volts.forEach((value, index) => {
      const angle = (2 * Math.PI * harmonic * index) / volts.length;
      real += (value - mean) * Math.cos(angle);
      imaginary += (value - mean) * Math.sin(angle);
    });
    const power = real * real + imaginary * imaginary;
    if (power > strongest.power * (1 + 1e-9)) strongest = { harmonic, power };
  }
  return strongest.harmonic;
}

/**
 * Mean, extremes and ripple of one cycle of a periodic output.
 *
 * @param samples evenly spaced, the last one being the first of the next cycle
 */
export function waveFacts(samples: Float64Array, lineHertz: number): WaveFacts {
  const volts = samples.slice(0, -1);
  const meanVolts = volts.reduce((sum, value) => sum + value, 0) / volts.length;
  const square = volts.reduce((sum, value) => sum + (value - meanVolts) ** 2, 0) / volts.length;
  const peakVolts = Math.max(...volts);
  const valleyVolts = Math.min(...volts);
  const peaks = maxima(volts, LEAST_PEAK * (peakVolts - valleyVolts));
  const [first, second] = peaks;
  return {
    meanVolts,
    peakVolts,
    valleyVolts,
    rippleVolts: peakVolts - valleyVolts,
    rippleRmsVolts: Math.sqrt(square),
    rippleHertz: strongestHarmonic(volts, meanVolts) * lineHertz,
    peaksPerCycle: peaks.length,
    alternatePeakVolts: first !== undefined && second !== undefined ? Math.abs(first - second) : null,
  };
}
