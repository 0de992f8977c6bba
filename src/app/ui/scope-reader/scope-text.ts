import {
  type AlternatePeaks,
  type Coupling,
  type ScopeEntry,
  ScopeEntryRefused,
  type ScopeField,
  type ScopeQuantity,
  scopeVolts,
} from '#shared/measurement/scope-reading';
import { parseReading } from '#shared/quantities/parse-reading';

/** A scope reading as it stands in the fields: text, not yet understood. */
export interface ScopeText {
  readonly form: ScopeEntry['form'];
  readonly coupling: Coupling;
  readonly divisions: string;
  readonly upperDivisions: string;
  readonly lowerDivisions: string;
  readonly higherDivisions: string;
  readonly voltsPerDivision: string;
  readonly probeFactor: string;
}

/** The fields of a scope reading that are typed. */
export type ScopeTextField = Exclude<keyof ScopeText, 'form' | 'coupling'>;

/** What the fields amount to. */
export type ScopeOutcome =
  | { readonly kind: 'empty' }
  | { readonly kind: 'refused'; readonly field: ScopeField; readonly message: string }
  | { readonly kind: 'read'; readonly entry: ScopeEntry; readonly volts: number };

/** How the fields are to be understood. */
export interface ScopeReading {
  readonly quantity?: ScopeQuantity;
  readonly alternatePeaks?: AlternatePeaks;
  readonly decimalComma?: boolean;
}

export const EMPTY_SCOPE: ScopeText = {
  form: 'whole',
  coupling: 'ac',
  divisions: '',
  upperDivisions: '',
  lowerDivisions: '',
  higherDivisions: '',
  voltsPerDivision: '',
  probeFactor: '1',
};

const HEIGHTS: Record<ScopeText['form'], readonly ScopeTextField[]> = {
  whole: ['divisions'],
  halves: ['upperDivisions', 'lowerDivisions'],
  alternate: ['higherDivisions', 'lowerDivisions'],
};

/** The height fields of a form, in the order they are read. */
export function heightFields(form: ScopeText['form']): readonly ScopeTextField[] {
  return HEIGHTS[form];
}

/** The fields of an entry as they were typed, to be kept with it. */
export function typedFields(text: ScopeText): Record<string, string> {
  const fields = [...heightFields(text.form), 'voltsPerDivision', 'probeFactor'] as const;
  return Object.fromEntries(fields.map((field) => [field, text[field].trim()]));
}

/** A kept entry as it stood in the fields; what was not kept as text is written as a number. */
export function scopeTextOf(entry: ScopeEntry, typed: Readonly<Record<string, string>> = {}): ScopeText {
  const numbers: Readonly<Partial<Record<string, unknown>>> = { ...entry };
  const fields = [...heightFields(entry.form), 'voltsPerDivision', 'probeFactor'] as const;
  const texts = Object.fromEntries(fields.map((field) => [field, typed[field] ?? String(numbers[field])]));
  return { ...EMPTY_SCOPE, ...texts, form: entry.form, coupling: entry.coupling };
}

/** Works out what was typed; a missing height leaves the reading empty, a missing scale or probe is told. */
export function readScopeText(text: ScopeText, how: ScopeReading = {}): ScopeOutcome {
  if (heightFields(text.form).some((field) => text[field].trim() === '')) return { kind: 'empty' };
  try {
    const entry = entryOf(text, how);
    return { kind: 'read', entry, volts: scopeVolts(entry, how) };
  } catch (thrown) {
    if (!(thrown instanceof ScopeEntryRefused)) throw thrown;
    return { kind: 'refused', field: thrown.field, message: thrown.message };
  }
}

function entryOf(text: ScopeText, how: ScopeReading): ScopeEntry {
  const number = (field: ScopeTextField, unit = '') => numberIn(text, field, unit, how);
  const settings = {
    voltsPerDivision: number('voltsPerDivision', 'V'),
    probeFactor: number('probeFactor'),
    coupling: text.coupling,
  };
  switch (text.form) {
    case 'whole':
      return { form: 'whole', divisions: number('divisions'), ...settings };
    case 'halves': {
      const [upperDivisions, lowerDivisions] = [number('upperDivisions'), number('lowerDivisions')];
      return { form: 'halves', upperDivisions, lowerDivisions, ...settings };
    }
    case 'alternate': {
      const [higherDivisions, lowerDivisions] = [number('higherDivisions'), number('lowerDivisions')];
      return { form: 'alternate', higherDivisions, lowerDivisions, ...settings };
    }
  }
}

function numberIn(text: ScopeText, field: ScopeTextField, unit: string, { decimalComma }: ScopeReading): number {
  if (text[field].trim() === '') return Number.NaN;
  try {
    return parseReading(text[field], unit, { decimalComma });
  } catch (thrown) {
    if (!(thrown instanceof RangeError)) throw thrown;
    throw new ScopeEntryRefused(field, thrown.message);
  }
}
