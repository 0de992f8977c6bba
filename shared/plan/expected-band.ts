import { type Characteristic } from '../contract/plans';
import { type ExpectedBands } from '../contract/parts';

type BandName = Exclude<keyof ExpectedBands, 'nominal'>;

const BANDS: Partial<Record<string, BandName>> = {
  ripple: 'ripple',
  'loaded-voltage': 'loaded',
  'no-load-voltage': 'noLoad',
};

const NOMINALS: Readonly<Record<BandName, keyof ExpectedBands['nominal']>> = {
  ripple: 'rippleVolts',
  loaded: 'loadedVolts',
  noLoad: 'noLoadVolts',
};

/** What the part's rectifier model gives for a characteristic at nominal values, in volts; null where it says nothing of it. */
export function expectedNominal(characteristic: Characteristic, expected: ExpectedBands | null): number | null {
  const name = characteristic.kind === 'measured' ? BANDS[characteristic.measurand] : undefined;
  return name === undefined || expected === null ? null : expected.nominal[NOMINALS[name]];
}

/**
 * The band that the part's rectifier model gives for a characteristic, in volts; null where there is no model or it says
 * nothing of what is measured.
 */
export function expectedBand(
  characteristic: Characteristic,
  expected: ExpectedBands | null,
): ExpectedBands[BandName] | null {
  const name = characteristic.kind === 'measured' ? BANDS[characteristic.measurand] : undefined;
  return name === undefined || expected === null ? null : expected[name];
}
