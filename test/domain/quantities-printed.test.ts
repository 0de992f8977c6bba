import { describe, expect, it } from 'vitest';
import {
  formatLimits,
  formatNumber,
  formatQuantity,
  type FormatQuantityOptions,
} from '#shared/quantities/format-quantity';

/** Writes the spaces of print as seen: _ for the no-break space, ' for the narrow one between thousands. */
const seen = (text: string) => text.replaceAll('\u00a0', '_').replaceAll('\u202f', "'");

describe('a number in print', () => {
  it.each<[number, number, string]>([
    [0, 0, '0'],
    [0, 2, '0.00'],
    [7, 2, '7.00'],
    [999, 0, '999'],
    [1200, 0, "1'200"],
    [1234567.891, 2, "1'234'567.89"],
    [-1234.5, 1, "\u22121'234.5"],
    [0.035, 2, '0.04'],
    [1.005, 2, '1.01'],
    [-1.005, 2, '\u22121.01'],
    [2.5, 0, '3'],
    [-0.001, 2, '0.00'],
    [-0, 1, '0.0'],
    [1e-7, 3, '0.000'],
    [1.5e-7, 7, '0.0000002'],
    [1e20, 0, "100'000'000'000'000'000'000"],
  ])('%d with %d decimals', (value, decimals, text) => {
    expect(seen(formatNumber(value, decimals))).toBe(text);
  });

  it('names what cannot be printed', () => {
    expect(() => formatNumber(NaN, 2)).toThrow(/value/);
    expect(() => formatNumber(1e21, 0)).toThrow(/value/);
    expect(() => formatNumber(1, -1)).toThrow(/decimals/);
    expect(() => formatNumber(1, 1.5)).toThrow(/decimals/);
  });
});

describe('a quantity in print', () => {
  it.each<[number, string, FormatQuantityOptions, string]>([
    [0.185, 'V', {}, '185_mV'],
    [1.85, 'V', {}, '1.85_V'],
    [0.185, 'V p-p', {}, '185_mV_p-p'],
    [0.185, 'mV p-p', {}, '185_mV_p-p'],
    [0.0022, 'F', {}, "2'200_µF"],
    [0.022, 'F', {}, "22'000_µF"],
    [4.7e-9, 'F', {}, '4.7_nF'],
    [1e-10, 'F', {}, '100_pF'],
    [1, 'F', {}, '1_F'],
    [1e8, 'MΩ', {}, '100_MΩ'],
    [4700, 'Ω', {}, '4.7_kΩ'],
    [0.3, '%', {}, '30_%'],
    [0.0025, 'mm', {}, '2.5_mm'],
    [35, 'K', {}, '35_K'],
    [3600, 's', {}, "3'600_s"],
    [0, 'V', {}, '0_V'],
    [-0.012, 'V', {}, '\u221212_mV'],
    [0.98, '', {}, '0.98'],
    [12.2213, 'V', {}, '12.22_V'],
    [1.85, 'V', { decimals: 3 }, '1.850_V'],
    [0.035, 'V', { decimals: 2 }, '35.00_mV'],
    [0.035, 'V', { decimals: 3, prefix: 'none' }, '0.035_V'],
    [1.85, 'V', { prefix: 'm' }, "1'850_mV"],
    [12, 'V', { significant: 4 }, '12.00_V'],
    [0.0123456, 'A', { significant: 3 }, '12.3_mA'],
    [0.99996, 'V', { decimals: 1 }, '1.0_V'],
    [0.96, 'V', { decimals: 0 }, '960_mV'],
    [999.96, 'V', {}, '1_kV'],
    [5e-13, 'F', {}, '0.5_pF'],
  ])('%d %s %j', (value, unit, options, text) => {
    expect(seen(formatQuantity(value, unit, options))).toBe(text);
  });

  it('names what cannot be printed', () => {
    expect(() => formatQuantity(NaN, 'V')).toThrow(/value/);
    expect(() => formatQuantity(1, 'furlong')).toThrow(/furlong/);
  });
});

describe('limits in print', () => {
  it.each<[number | null, number | null, string, number, string]>([
    [null, 2.4, 'V', 2, 'max 2.40_V'],
    [1e8, null, 'MΩ', 0, 'min 100_MΩ'],
    [15.8, 18.2, 'V', 2, '15.80 to 18.20_V'],
    [null, 0.3, '%', 0, 'max 30_%'],
    [null, 1.8, 'V p-p', 2, 'max 1.80_V_p-p'],
    [null, 0.0025, 'mm', 1, 'max 2.5_mm'],
    [-0.5, 0.5, 'V', 1, '\u22120.5 to 0.5_V'],
    [null, null, 'V', 2, 'no limit'],
    [0.9, null, '', 2, 'min 0.90'],
  ])('%s to %s %s', (lower, upper, unit, decimals, text) => {
    expect(seen(formatLimits(lower, upper, unit, decimals))).toBe(text);
  });
});
