import { type InstrumentKind } from '#shared/contract/instruments';
import { type Characteristic, type Measurand } from '#shared/contract/plans';

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

type Entry = Pick<Extract<Characteristic, { kind: 'measured' }>, 'unit' | 'entryMode' | 'instrumentKind'>;

/** A quantity that is read off a display. */
function displayed(unit: Entry['unit'], instrumentKind: InstrumentKind): Entry {
  return { unit, entryMode: 'direct', instrumentKind };
}

const USUAL: Partial<Record<Measurand, Entry>> = {
  ripple: { unit: 'mV p-p', entryMode: 'scope', instrumentKind: 'oscilloscope' },
  'ripple-rms': displayed('mV', 'multimeter'),
  'loaded-voltage': displayed('V', 'multimeter'),
  'no-load-voltage': displayed('V', 'multimeter'),
  'half-winding-peak': { unit: 'V', entryMode: 'scope', instrumentKind: 'oscilloscope' },
  current: displayed('A', 'electronic-load'),
  'input-power': displayed('W', 'power-meter'),
  'output-power': displayed('W', 'electronic-load'),
  'insulation-resistance': displayed('MΩ', 'insulation-tester'),
  'junction-potential': displayed('V', 'multimeter'),
  frequency: displayed('Hz', 'oscilloscope'),
  temperature: displayed('°C', 'thermometer'),
  dimension: displayed('mm', 'rule'),
};

/** In which unit and with which instrument a kind of quantity is usually read; nothing for one that is not known. */
export function usualEntry(measurand: Measurand): Partial<Entry> {
  return USUAL[measurand] ?? {};
}

/** A key from a name: "Ripple, 500 mA" gives ripple_500_ma. */
export function keyFromName(name: string): string {
  const plain = name.normalize('NFKD').toLowerCase();
  const words = plain.replace(/[^a-z0-9]+/g, '_').replace(/^[_0-9]+|_+$/g, '');
  return words.slice(0, 32).replace(/_+$/, '');
}
