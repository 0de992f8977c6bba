import { type Characteristic } from '../contract/plans';
import { type ExpectedBands } from '../contract/parts';

type BandName = Exclude<keyof ExpectedBands, 'nominal'>;

const BANDS: Partial<Record<string, BandName>> = {
  ripple: 'ripple',
  'loaded-voltage': 'loaded',
  'no-load-voltage': 'noLoad',
};

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
