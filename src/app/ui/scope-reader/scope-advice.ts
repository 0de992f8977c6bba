import { formatQuantity } from '#shared/quantities/format-quantity';
import { type VerdictLook } from '../verdict-look';
import { type ScopeText } from './scope-text';

/** What the part's rectifier says about a reading. It never changes a verdict. */
export interface ScopeAdvice {
  readonly look: VerdictLook;
  readonly title: string;
  readonly text: string;
  /** The entry with the likeliest slip mended, and what mends it. */
  readonly cure?: { readonly entry: ScopeText; readonly words: string };
}

type Band = readonly [number, number];

/** Compares a reading with the expected band, in volts; a slip by ten is named with its cure. */
export function scopeAdvice(volts: number, entry: ScopeText, expected: Band, model: string): ScopeAdvice {
  if (within(volts, expected)) return { look: 'ok', title: 'Agrees with the rectifier model.', text: model };
  if (within(volts / 10, expected)) return slip(entry, 0.1, 'Ten times the expected ripple.');
  if (within(volts * 10, expected)) return slip(entry, 10, 'A tenth of the expected ripple.');
  const [low, high] = expected;
  const factor = volts < low ? low / volts : volts / high;
  const times = Number.isFinite(factor) ? `${factor.toPrecision(2)} times ` : '';
  return {
    look: 'hold',
    title: `${times}${volts < low ? 'less' : 'more'} than the model.`,
    text: `Not a factor of ten. Expected ${bandWords(expected)}. Check the load.`,
  };
}

function slip(entry: ScopeText, change: number, title: string): ScopeAdvice {
  const mended = Number((Number(entry.probeFactor) * change).toPrecision(6));
  const text = 'Look at the switch on the probe.';
  if (!(mended >= 1)) return { look: 'hold', title, text };
  return {
    look: 'hold',
    title,
    text,
    cure: { entry: { ...entry, probeFactor: String(mended) }, words: `Use × ${mended}` },
  };
}

function within(volts: number, [low, high]: Band): boolean {
  return volts >= low && volts <= high;
}

function bandWords([low, high]: Band): string {
  const digits = { significant: 2 };
  return `${formatQuantity(low, 'V', digits)} to ${formatQuantity(high, 'V', digits)}`;
}
