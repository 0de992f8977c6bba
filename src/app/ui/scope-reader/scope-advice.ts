import {
  type ExpectedBand,
  plausibility,
  type ScopeSetting,
  type Slip,
  slipAdvice,
} from '#shared/measurement/plausibility';
import { formatBand } from '#shared/quantities/format-band';
import { formatQuantity } from '#shared/quantities/format-quantity';
import { type VerdictLook } from '../verdict-look';
import { type ScopeCure, scopeCure } from './scope-cure';
import { type ScopeOutcome, type ScopeText } from './scope-text';

/** What the part's rectifier says about a reading. It never changes a verdict. */
export interface ScopeAdvice {
  readonly look: VerdictLook;
  readonly title: string;
  readonly text: string;
  /** The likeliest slip mended; null where nothing in the settings would mend it. */
  readonly cure: ScopeCure | null;
  /** Whether the reading is to be corrected or confirmed before it is kept. */
  readonly questioned: boolean;
}

type Read = Extract<ScopeOutcome, { kind: 'read' }>;

const MORE = new Map([
  [10, 'Ten times'],
  [100, 'A hundred times'],
  [1000, 'A thousand times'],
]);
const LESS = new Map([
  [10, 'A tenth of'],
  [100, 'A hundredth of'],
  [1000, 'A thousandth of'],
]);

/** Compares a reading with the expected band, in volts, and names the likeliest slip with its cure. */
export function scopeAdvice(read: Read, text: ScopeText, band: ExpectedBand): ScopeAdvice {
  const found = plausibility(read.volts, band, { scope: read.entry });
  if (found.state === 'inside') {
    const agrees = { title: 'Agrees with the rectifier model.', text: `Expected ${bandWords(band)}.` };
    return { look: 'ok', ...agrees, cure: null, questioned: false };
  }
  const cure = scopeCure(read, text, band, found.slip);
  const questioned = found.state === 'question';
  const advice = adviceWords(band, found.slip, cure, read.entry);
  return { look: questioned ? 'hold' : 'open', title: titleOf(found), text: advice, cure, questioned };
}

function titleOf({ slip, ratio }: { slip: Slip | null; ratio: number }): string {
  const size = (factor: number) => (factor > 1 ? factor : 1 / factor);
  if (slip?.kind === 'factor') {
    const words = (slip.factor > 1 ? MORE : LESS).get(Math.round(size(slip.factor))) ?? '';
    return `${words} what the model gives.`;
  }
  if (!(ratio > 0)) return 'Not what the model gives.';
  const times = size(ratio) < 1.05 ? 'A little' : `${formatQuantity(size(ratio), '', { significant: 2 })} times`;
  return `${times} ${ratio > 1 ? 'more' : 'less'} than the model.`;
}

function adviceWords(band: ExpectedBand, slip: Slip | null, cure: ScopeCure | null, scope: ScopeSetting): string {
  const expected = bandWords(band);
  if (slip === null) return `Expected ${expected}. Look at the load, the connection and the scale.`;
  if (cure === null) return `Expected ${expected}. ${slipAdvice(slip, scope)}`;
  const mended = formatQuantity(cure.volts, 'V', { significant: 3 });
  return `With ${cure.setting} it reads ${mended}, inside ${expected}. ${slipAdvice(slip, scope)}`;
}

function bandWords({ low, high }: ExpectedBand): string {
  return formatBand(low, high, 'V', { significant: 2 });
}
