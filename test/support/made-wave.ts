import { type SeededNumbers, seededNumbers } from '#shared/sampling/seeded-numbers';

/** How a wave is made that looks like a rectifier's ripple. */
export interface MadeWave {
  lineHertz?: number;
  cycles?: number;
  samplesPerCycle?: number;
  /** Mean level of the highest peak in volts. */
  peak?: number;
  /** Droop between two peaks, volts. */
  droop?: number;
  /** How much lower every other peak is, volts. */
  lower?: number;
  /** Peaks in a line cycle. */
  halves?: 1 | 2;
  /** Standard deviation of the noise, volts. */
  noise?: number;
  /** Height of a level of the converter, volts. */
  step?: number;
  /** What lies above it is cut off. */
  ceiling?: number;
}

/** A number of a bell-shaped distribution (Box and Muller 1958). */
function bell(numbers: SeededNumbers): number {
  const next = () => numbers(1, 1_000_000) / 1_000_001;
  return Math.sqrt(-2 * Math.log(next())) * Math.cos(2 * Math.PI * next());
}

/** Seconds and volts: each half charges for a fifth of its time along a sine, and then falls on a straight line. */
export function madeWave(made: MadeWave): { seconds: number[]; volts: number[] } {
  const { lineHertz = 50, cycles = 5, samplesPerCycle = 400, peak = 16, droop = 0.5, lower = 0, halves = 2 } = made;
  const { noise = 0, step = 0, ceiling = Infinity } = made;
  const numbers = seededNumbers(7);
  const count = Math.round(cycles * samplesPerCycle) + 1;
  const interval = 1 / (lineHertz * samplesPerCycle);
  const seconds = Array.from({ length: count }, (_, at) => at * interval);
  const top = (half: number) => (half % 2 === 0 ? peak : peak - lower);
  const volts = seconds.map((instant) => {
    const phase = instant * lineHertz * halves + 0.3;
    const half = Math.floor(phase);
    const within = phase - half;
    const from = top(half - 1) - droop;
    const rising = from + (top(half) - from) * Math.sin((Math.PI / 2) * (within / 0.2));
    const falling = top(half) - droop * ((within - 0.2) / 0.8);
    const clean = (within < 0.2 ? rising : falling) + noise * bell(numbers);
    const cut = Math.min(ceiling, clean);
    return step > 0 ? Math.round(cut / step) * step : cut;
  });
  return { seconds, volts };
}

/** The made wave as a file. */
export function madeFile(made: MadeWave, digits = 6): string {
  const { seconds, volts } = madeWave(made);
  const rows = seconds.map((instant, at) => `${instant.toFixed(9)},${(volts[at] ?? 0).toFixed(digits)}`);
  return ['time_s,volts', ...rows].join('\n');
}
