import { type ExpectedBand, type Slip } from '#shared/measurement/plausibility';
import { type ScopeOutcome, type ScopeText } from './scope-text';

type Read = Extract<ScopeOutcome, { kind: 'read' }>;

/** The fields with the likeliest slip mended. */
export interface ScopeCure {
  readonly entry: ScopeText;
  /** What the button says: "Use × 1". */
  readonly words: string;
  /** What is mended, inside a sentence: "the probe at × 1". */
  readonly setting: string;
  /** What it reads then, in volts. */
  readonly volts: number;
}

const PROBES: readonly number[] = [1, 10, 100];
/** Neighbouring steps of a scale in the 1-2-5 sequence, near ones first. */
const STEPS = [2, 2.5, 5, 4].flatMap((step) => [step, 1 / step]);

/**
 * Mends the likeliest slip of a scope reading: the probe's switch, a prefix of the scale, or the scale's neighbouring step.
 * Null where no setting of a real instrument would bring the reading into the band.
 */
export function scopeCure(read: Read, text: ScopeText, band: ExpectedBand, slip: Slip | null): ScopeCure | null {
  if (slip === null) return null;
  if (slip.kind === 'factor') return probeCure(read, text, slip.factor) ?? scaleCure(read, text, slip.factor);
  const fits = (factor: number) => {
    const volts = read.volts / factor;
    return volts >= band.low && volts <= band.high && isStep(read.entry.voltsPerDivision / factor);
  };
  const factor = [slip.factor, ...STEPS].find(fits);
  return factor === undefined ? null : scaleCure(read, text, factor);
}

function probeCure({ entry: { probeFactor }, volts }: Read, text: ScopeText, factor: number): ScopeCure | null {
  const mended = rounded(probeFactor / factor);
  if (!PROBES.includes(mended)) return null;
  const entry = { ...text, probeFactor: String(mended) };
  return { entry, words: `Use × ${mended}`, setting: `the probe at × ${mended}`, volts: rounded(volts / factor) };
}

function scaleCure({ entry: { voltsPerDivision }, volts }: Read, text: ScopeText, factor: number): ScopeCure {
  const mended = rounded(voltsPerDivision / factor);
  const written = text.voltsPerDivision.includes(',') ? String(mended).replace('.', ',') : String(mended);
  const entry = { ...text, voltsPerDivision: written };
  return { entry, words: `Use ${written} V/div`, setting: `${written} V/div`, volts: rounded(volts / factor) };
}

/** Whether a scale has such a step: 1, 2 or 5 times a power of ten. */
function isStep(voltsPerDivision: number): boolean {
  const mantissa = Number(voltsPerDivision.toExponential(3).split('e')[0]);
  return mantissa === 1 || mantissa === 2 || mantissa === 5;
}

function rounded(value: number): number {
  return Number(value.toPrecision(6));
}
