import { type Characteristic, type RevisionBody } from '#shared/contract/plans';
import { attribute, computed, measured, SIMPLE_RULES } from '../support/plan-bodies';

const LIMITS = { lowerLimit: 11.4, upperLimit: 12.6, target: 12 } as const;

/** Two attributes and otherwise measured characteristics; the first few are critical and minor. */
export function typedCharacteristics(count: number): Characteristic[] {
  return Array.from({ length: count }, (_, index) => {
    const key = `c${index + 1}`;
    if (index >= count - 2) return attribute(key, { class: 'minor' });
    return measured(key, { ...LIMITS, class: index === 0 ? 'critical' : index % 3 === 0 ? 'minor' : 'major' });
  });
}

/** Twelve characteristics: ten that are typed, two computed from them. */
export const TWELVE: readonly Characteristic[] = [
  ...typedCharacteristics(10),
  computed('regulation', { key: 'load-regulation', inputs: { no_load: 'c2', loaded: 'c3' } }, { upperLimit: 0.2 }),
  computed('ratio', { key: 'ripple-ratio', inputs: { ripple: 'c4', loaded: 'c5' } }, { upperLimit: 2 }),
];

export function planOf(characteristics: readonly Characteristic[], level: RevisionBody['level'] = 'II'): RevisionBody {
  return {
    level,
    classAqls: [
      { class: 'critical', aql: '0.065' },
      { class: 'major', aql: '0.65' },
      { class: 'minor', aql: '1.5' },
    ],
    characteristics: [...characteristics],
    ...SIMPLE_RULES,
    changeNote: '',
  };
}
