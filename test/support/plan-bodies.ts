import { type Characteristic, type RevisionBody, type StoredCharacteristic } from '#shared/contract/plans';

type Kind = Characteristic['kind'];
type Of<K extends Kind> = Extract<Characteristic, { kind: K }>;

const common = { class: 'major', condition: '', method: '', caution: '', ownLevel: null, ownAql: null } as const;
const volts = { unit: 'V', decimals: 2, target: null, lowerLimit: null, upperLimit: null } as const;

export function measured(key: string, given: Partial<Of<'measured'>> = {}): Of<'measured'> {
  const entry = {
    entryMode: 'direct',
    instrumentKind: 'multimeter',
    measurand: 'other',
    alternatePeaks: 'worst',
  } as const;
  return { kind: 'measured', key, name: `Measured ${key}`, ...common, ...volts, ...entry, ...given };
}

/** What is computed by a formula that takes no ratings, unless they are given. */
export function computed(
  key: string,
  { constants = {}, ...formula }: Extract<StoredCharacteristic, { kind: 'computed' }>['formula'],
  given: Partial<Of<'computed'>> = {},
): Of<'computed'> {
  const stated = { name: `Computed ${key}`, formula: { ...formula, constants } };
  return { kind: 'computed', key, ...common, ...volts, unit: '%', ...stated, ...given };
}

export function attribute(key: string, given: Partial<Of<'attribute'>> = {}): Of<'attribute'> {
  const judged = { requirement: 'Legible, complete', failReasons: ['Missing', 'Smeared'], instrumentKind: null };
  return { kind: 'attribute', key, name: `Judged ${key}`, ...common, ...judged, ...given };
}

/** How most plans judge: by their limits alone, with nothing asked of the warm-up. */
export const SIMPLE_RULES = { decisionRule: 'simple', coverageFactor: 2, warmUpMinutes: null } as const;

/** The plan of a 24 V adapter: two voltages, ripple, the regulation computed from them, and a label judged by eye. */
export function revisionBody(given: Partial<RevisionBody> = {}): RevisionBody {
  return {
    level: 'II',
    classAqls: [
      { class: 'critical', aql: '0.065' },
      { class: 'major', aql: '1.0' },
      { class: 'minor', aql: '2.5' },
    ],
    characteristics: [
      measured('v_no_load', { upperLimit: 28.5 }),
      measured('v_loaded', { lowerLimit: 22.8, upperLimit: 25.2, target: 24 }),
      measured('ripple', { unit: 'V p-p', upperLimit: 2.6, entryMode: 'scope', instrumentKind: 'oscilloscope' }),
      computed(
        'regulation',
        { key: 'load-regulation', inputs: { no_load: 'v_no_load', loaded: 'v_loaded' }, constants: {} },
        { upperLimit: 0.2 },
      ),
      attribute('label', { class: 'minor' }),
    ],
    ...SIMPLE_RULES,
    changeNote: 'First issue.',
    ...given,
  };
}
