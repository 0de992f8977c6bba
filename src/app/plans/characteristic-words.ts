import { INSTRUMENT_KIND_TITLES } from '#shared/contract/instruments';
import { type Characteristic, MEASURAND_TITLES } from '#shared/contract/plans';
import { FORMULAS } from '#shared/measurement/formula';
import { formatLimits, formatNumber, formatQuantity, inDisplayUnit } from '#shared/quantities/format-quantity';

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
        ['what is measured', MEASURAND_TITLES[characteristic.measurand]],
        ['alternate peaks', peakWords(characteristic)],
        ['entry', characteristic.entryMode === 'scope' ? 'scope divisions' : 'direct'],
        ['instrument', instrumentWord(characteristic.instrumentKind)],
      ];
    case 'computed':
      return [
        ...limitWords(characteristic),
        ['formula', FORMULAS[characteristic.formula.key].title],
        ['inputs', Object.values(characteristic.formula.inputs).join(', ')],
        ['ratings', ratingsWords(characteristic.formula)],
      ];
    case 'attribute':
      return [
        ['requirement', characteristic.requirement],
        ['fail reasons', characteristic.failReasons.join(', ')],
        ['instrument', instrumentWord(characteristic.instrumentKind)],
      ];
  }
}

/** Only a ripple that is read off a screen has alternate peaks to choose between. */
function peakWords({ measurand, entryMode, alternatePeaks }: Extract<Characteristic, { kind: 'measured' }>): string {
  if (measurand !== 'ripple' || entryMode !== 'scope') return '';
  return alternatePeaks === 'worst' ? 'the higher one counts' : 'their mean counts';
}

/** A rating that a formula takes, in the unit it is given in. */
export function ratingWords(value: number | undefined, unit: string): string {
  return value === undefined ? 'none' : formatQuantity(value, unit);
}

function ratingsWords({ key, constants }: Extract<Characteristic, { kind: 'computed' }>['formula']): string {
  return FORMULAS[key].constants
    .map(({ name, title, unit }) => `${title} ${ratingWords(constants[name], unit)}`)
    .join(', ');
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
