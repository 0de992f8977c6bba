import { type PlausibilityQuestion, type ReadingEntry } from '#shared/contract/bench';
import { type ExpectedBands } from '#shared/contract/parts';
import { type Characteristic } from '#shared/contract/plans';
import { type ExpectedBand, plausibility, plausibilitySentence, type Slip } from '#shared/measurement/plausibility';
import { expectedBand } from '#shared/plan/expected-band';
import { type ReadingValue } from './bench-reading';

/** What the part's model says of a value. It asks, and never changes a verdict. */
export interface PlausibilityFound {
  readonly state: 'inside' | 'outside' | 'question';
  readonly band: ExpectedBand;
  readonly slip: Slip | null;
  /** In words what is odd; empty inside the band. */
  readonly sentence: string;
}

/** Compares a value with what the part can give; null where the model says nothing of it. SI base units. */
export function plausibilityOf(
  characteristic: Characteristic,
  expected: ExpectedBands | null,
  { value, entry }: { value: ReadingValue | null; entry: ReadingEntry | null },
): PlausibilityFound | null {
  const band = expectedBand(characteristic, expected);
  if (band === null || characteristic.kind !== 'measured' || typeof value !== 'number') return null;
  const scope = entry?.kind === 'scope' ? entry.scope : null;
  const found = plausibility(value, band, { scope });
  if (found.state === 'inside') return { state: 'inside', band, slip: null, sentence: '' };
  const isOnDisplay = entry?.kind === 'direct' || characteristic.entryMode === 'direct';
  const sentence = plausibilitySentence(
    value,
    band,
    found,
    characteristic.unit,
    isOnDisplay ? null : (scope ?? undefined),
  );
  return { state: found.state, band, slip: found.slip, sentence };
}

/** The question of a reading whose answer is on its way to the server, as the server will keep it. */
export function questionOnItsWay(
  characteristic: Characteristic,
  expected: ExpectedBands | null,
  reading: { value: ReadingValue; entry: ReadingEntry; answer: PlausibilityQuestion['given'] | null },
  answered: { by: string | null; at: string },
): PlausibilityQuestion | null {
  const { answer } = reading;
  if (answer === null) return null;
  const asked = answer.answer === 'corrected' ? { value: answer.fromValue, entry: answer.from } : reading;
  const found = plausibilityOf(characteristic, expected, asked);
  if (found === null) return null;
  return {
    band: found.band,
    sentence: found.sentence,
    given: answer,
    answeredBy: answered.by,
    answeredAt: answered.at,
  };
}
