import { type Characteristic } from '#shared/contract/plans';

/** A characteristic that was just added: as little as possible is decided yet. */
export function newCharacteristic(kind: Characteristic['kind']): Characteristic {
  const common = {
    key: '',
    name: '',
    class: 'major',
    condition: '',
    method: '',
    caution: '',
    ownLevel: null,
    ownAql: null,
  } as const;
  const limits = { decimals: 2, target: null, lowerLimit: null, upperLimit: null } as const;
  const typed = {
    entryMode: 'direct',
    instrumentKind: 'multimeter',
    measurand: 'other',
    alternatePeaks: 'worst',
  } as const;
  switch (kind) {
    case 'measured':
      return { kind, ...common, ...limits, unit: 'V', ...typed };
    case 'computed':
      return { kind, ...common, ...limits, unit: '%', formula: { key: 'load-regulation', inputs: {}, constants: {} } };
    case 'attribute':
      return { kind, ...common, class: 'minor', requirement: '', failReasons: [], instrumentKind: null };
  }
}

/** A key from a name: "Ripple, 500 mA" gives ripple_500_ma. */
export function keyFromName(name: string): string {
  const plain = name.normalize('NFKD').toLowerCase();
  const words = plain.replace(/[^a-z0-9]+/g, '_').replace(/^[_0-9]+|_+$/g, '');
  return words.slice(0, 32).replace(/_+$/, '');
}
