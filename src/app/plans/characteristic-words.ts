import { INSTRUMENT_KIND_TITLES } from '#shared/contract/instruments';
import { type Characteristic } from '#shared/contract/plans';
import { FORMULAS } from '#shared/measurement/formula';
import { formatLimits, formatNumber, inDisplayUnit } from '#shared/quantities/format-quantity';

/** What a characteristic's fields say, by their names, in the order a plan states them; an empty text is "none". */
export function characteristicWords(characteristic: Characteristic): ReadonlyMap<string, string> {
  return new Map([
    ['name', characteristic.name],
    ['kind', characteristic.kind],
    ...kindWords(characteristic),
    ['class', characteristic.class],
    ['own level', characteristic.ownLevel ?? ''],
    ['own AQL', characteristic.ownAql ?? ''],
    ['condition', characteristic.condition],
    ['method', characteristic.method],
    ['caution', characteristic.caution],
  ]);
}

function kindWords(characteristic: Characteristic): [string, string][] {
  switch (characteristic.kind) {
    case 'measured':
      return [
        ...limitWords(characteristic),
        ['entry', characteristic.entryMode === 'scope' ? 'scope divisions' : 'direct'],
        ['instrument', instrumentWord(characteristic.instrumentKind)],
      ];
    case 'computed':
      return [
        ...limitWords(characteristic),
        ['formula', FORMULAS[characteristic.formula.key].title],
        ['inputs', Object.values(characteristic.formula.inputs).join(', ')],
      ];
    case 'attribute':
      return [
        ['requirement', characteristic.requirement],
        ['fail reasons', characteristic.failReasons.join(', ')],
        ['instrument', instrumentWord(characteristic.instrumentKind)],
      ];
  }
}

function limitWords(characteristic: Exclude<Characteristic, { kind: 'attribute' }>): [string, string][] {
  const { unit, decimals, target, lowerLimit, upperLimit } = characteristic;
  return [
    ['limits', formatLimits(lowerLimit, upperLimit, unit, decimals)],
    ['target', target === null ? '' : `${formatNumber(inDisplayUnit(target, unit), decimals)}\u00a0${unit}`],
    ['unit', unit],
    ['decimals', String(decimals)],
  ];
}

function instrumentWord(kind: Extract<Characteristic, { kind: 'measured' }>['instrumentKind']): string {
  return kind === null ? '' : INSTRUMENT_KIND_TITLES[kind].toLowerCase();
}
