/** How a verdict looks: ring, square, diamond or dashed ring, with the colour that belongs to it. */
export type VerdictLook = 'ok' | 'nok' | 'hold' | 'open';

const LOOKS: Readonly<Record<string, VerdictLook>> = {
  conforming: 'ok',
  accepted: 'ok',
  pass: 'ok',
  released: 'ok',
  nonconforming: 'nok',
  rejected: 'nok',
  fail: 'nok',
  conditional: 'hold',
  undecided: 'hold',
  'on hold': 'hold',
};

/** The look of a verdict of a reading, a unit, a class or a lot; whatever is not decided looks open. */
export function lookOf(verdict: string | null | undefined): VerdictLook {
  return LOOKS[verdict ?? ''] ?? 'open';
}

/** The word that goes with each look where nothing more precise is known. */
export const LOOK_WORDS: Readonly<Record<VerdictLook, string>> = {
  ok: 'Conforming',
  nok: 'Nonconforming',
  hold: 'Undecided',
  open: 'Not judged',
};
