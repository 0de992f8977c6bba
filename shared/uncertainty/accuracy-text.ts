import { formatNumber } from '../quantities/format-number';
import { formatQuantity } from '../quantities/format-quantity';
import { type DigitalRange, type GraticuleRange, type InstrumentRange } from './instrument-range';

function percent(fraction: number): string {
  return formatQuantity(fraction, '%', { decimals: Math.max(0, decimalsOf(fraction * 100)) });
}

/** Decimals that show up to three significant digits, without zeros at the end. */
function decimalsOf(value: number): number {
  const [, fraction = ''] = String(Number(value.toPrecision(3))).split('.');
  return fraction.length;
}

function digitalTerms({ ofReading, ofRange, counts, resolution, unit }: DigitalRange): string[] {
  const digits = `${formatNumber(counts, 0)} ${counts === 1 ? 'count' : 'counts'} of ${formatQuantity(resolution, unit)}`;
  return [
    ofReading === 0 ? '' : `${percent(ofReading)} of reading`,
    ofRange === 0 ? '' : `${percent(ofRange)} of range`,
    counts === 0 ? '' : digits,
  ];
}

function graticuleTerms({ ofReading, ofFullScale }: GraticuleRange): string[] {
  return [
    ofReading === 0 ? '' : `${percent(ofReading)} of reading`,
    ofFullScale === 0 ? '' : `${percent(ofFullScale)} of the screen’s height`,
  ];
}

/** The accuracy specification of a range as its maker writes it: "±(0.05 % of reading + 2 counts of 10 mV)". */
export function accuracyText(range: InstrumentRange): string {
  const terms = range.form === 'digital' ? digitalTerms(range) : graticuleTerms(range);
  const stated = terms.filter((term) => term !== '');
  return stated.length === 0 ? 'none stated' : `±(${stated.join(' + ')})`;
}

/** How finely a range is read: "resolution 10 mV", "read to 0.1 division". */
export function resolutionText(range: InstrumentRange): string {
  return range.form === 'digital'
    ? `resolution ${formatQuantity(range.resolution, range.unit)}`
    : `read to ${range.readingStep} division`;
}
