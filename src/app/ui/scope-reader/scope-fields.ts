import { type AlternatePeaks } from '#shared/measurement/scope-reading';
import { type ScopeText, type ScopeTextField } from './scope-text';

/** A field of the reader as it is shown, in the order of the formula. */
export interface ScopeFieldShown {
  readonly field: ScopeTextField;
  readonly label: string;
  readonly before: '' | '+' | '×' | 'or';
  readonly prefix: string;
  readonly suffix: string;
}

const SETTINGS: readonly ScopeFieldShown[] = [
  { field: 'voltsPerDivision', label: 'Scale', before: '×', prefix: '', suffix: 'V/div' },
  { field: 'probeFactor', label: 'Probe', before: '×', prefix: '×', suffix: '' },
];

const height = (field: ScopeTextField, label: string, before: ScopeFieldShown['before'], suffix = '') => ({
  field,
  label,
  before,
  prefix: '',
  suffix,
});

/** The fields of a form. Of alternate peaks one counts, or half of their sum, as the plan says. */
export function scopeFields(form: ScopeText['form'], alternatePeaks: AlternatePeaks): readonly ScopeFieldShown[] {
  if (form === 'whole') return [height('divisions', 'Wave height', '', 'div'), ...SETTINGS];
  const [first, second] =
    form === 'halves'
      ? [height('upperDivisions', 'Upper, div', ''), height('lowerDivisions', 'Lower, div', '+')]
      : [
          height('higherDivisions', 'Higher, div', ''),
          height('lowerDivisions', 'Lower, div', alternatePeaks === 'mean' ? '+' : 'or'),
        ];
  return [first, second, ...SETTINGS];
}

/** Which of the alternate peaks counts, in words. */
export function countsWords(form: ScopeText['form'], alternatePeaks: AlternatePeaks): string {
  if (form !== 'alternate') return '';
  return alternatePeaks === 'mean' ? 'The mean of both peaks counts.' : 'The higher peak counts.';
}
