import { type ReadingEntry } from '#shared/contract/bench';
import { scopeTextOf } from '../scope-reader/scope-text';

/** What was typed for a reading, as it was typed; empty where that says no more than the value does. */
export function entryWords(entry: ReadingEntry | null): string {
  if (entry?.kind === 'direct') return `typed ${entry.text}`;
  if (entry?.kind === 'waveform') return 'from a waveform';
  if (entry?.kind !== 'scope') return '';
  const text = scopeTextOf(entry.scope, entry.typed);
  const settings = `× ${text.voltsPerDivision} V/div × ${text.probeFactor}, ${text.coupling.toUpperCase()}`;
  switch (text.form) {
    case 'whole':
      return `${text.divisions} div ${settings}`;
    case 'halves':
      return `(${text.upperDivisions} + ${text.lowerDivisions}) div ${settings}`;
    case 'alternate':
      return `peaks ${text.higherDivisions} and ${text.lowerDivisions} div ${settings}`;
  }
}
