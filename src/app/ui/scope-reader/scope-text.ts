import {
  type Coupling,
  type ScopeEntry,
  ScopeEntryRefused,
  type ScopeField,
  type ScopeQuantity,
  scopeVolts,
} from '#shared/measurement/scope-reading';
import { parseQuantity } from '#shared/quantities/parse-quantity';

/** A scope reading as it stands in the fields: text, not yet understood. */
export interface ScopeText {
  readonly form: 'whole' | 'halves';
  readonly coupling: Coupling;
  readonly divisions: string;
  readonly upperDivisions: string;
  readonly lowerDivisions: string;
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

export const EMPTY_SCOPE: ScopeText = {
  form: 'whole',
  coupling: 'ac',
  divisions: '',
  upperDivisions: '',
  lowerDivisions: '',
  voltsPerDivision: '',
  probeFactor: '1',
};

/** The height fields of a form, in the order they are read. */
export function heightFields(form: ScopeText['form']): readonly ScopeTextField[] {
  return form === 'whole' ? ['divisions'] : ['upperDivisions', 'lowerDivisions'];
}

/** Works out what was typed; a missing height leaves the reading empty, a missing scale or probe is told. */
export function readScopeText(text: ScopeText, quantity?: ScopeQuantity): ScopeOutcome {
  if (heightFields(text.form).some((field) => text[field].trim() === '')) return { kind: 'empty' };
  try {
    const entry = entryOf(text);
    return { kind: 'read', entry, volts: scopeVolts(entry, { quantity }) };
  } catch (thrown) {
    if (!(thrown instanceof ScopeEntryRefused)) throw thrown;
    return { kind: 'refused', field: thrown.field, message: thrown.message };
  }
}

function entryOf(text: ScopeText): ScopeEntry {
  const settings = {
    voltsPerDivision: numberIn(text, 'voltsPerDivision', 'V'),
    probeFactor: numberIn(text, 'probeFactor'),
    coupling: text.coupling,
  };
  if (text.form === 'whole') return { form: 'whole', divisions: numberIn(text, 'divisions'), ...settings };
  return {
    form: 'halves',
    upperDivisions: numberIn(text, 'upperDivisions'),
    lowerDivisions: numberIn(text, 'lowerDivisions'),
    ...settings,
  };
}

function numberIn(text: ScopeText, field: ScopeTextField, unit?: string): number {
  if (text[field].trim() === '') return Number.NaN;
  try {
    return parseQuantity(text[field], { unit });
  } catch (thrown) {
    if (!(thrown instanceof RangeError)) throw thrown;
    throw new ScopeEntryRefused(field, thrown.message);
  }
}
