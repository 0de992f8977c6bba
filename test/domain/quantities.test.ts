import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { UnitNotKnown } from '#shared/quantities/display-unit';
import { displayUnit, formatQuantity, fromDisplayUnit, inDisplayUnit } from '#shared/quantities/format-quantity';
import { AmbiguousQuantity, parseQuantity, QuantityNotUnderstood } from '#shared/quantities/parse-quantity';
import { parseReading } from '#shared/quantities/parse-reading';

describe('a quantity as people write it', () => {
  it.each<[string, number]>([
    ['0.035', 0.035],
    ['35m', 0.035],
    ['35 m', 0.035],
    ['35 mV', 0.035],
    ['35\u00a0mV', 0.035],
    ['35\u202fmV', 0.035],
    ['  35mV ', 0.035],
    ['.5', 0.5],
    ['12.', 12],
    ['+3.3', 3.3],
    ['-12 V', -12],
    ['\u221212 V', -12],
    ['4K7', 4700],
    ['4k7', 4700],
    ['4u7', 4.7e-6],
    ['4µ7', 4.7e-6],
    ['4n7 F', 4.7e-9],
    ['4R7', 4.7],
    ['1M5', 1.5e6],
    ['4m7', 0.0047],
    ['47R', 47],
    ['100k', 1e5],
    ['100K', 1e5],
    ['2.2 M', 2.2e6],
    ['1 GΩ', 1e9],
    ['100 M\u2126', 1e8],
    ['10 kohm', 1e4],
    ['2200 uF', 0.0022],
    ['2200 µF', 0.0022],
    ['2200 \u03bcF', 0.0022],
    ['2 200 µF', 0.0022],
    ['2\u202f200 µF', 0.0022],
    ['47 pF', 4.7e-11],
    ['120 Hz', 120],
    ['20 MHz', 2e7],
    ['185 mV p-p', 0.185],
    ['185 mVpp', 0.185],
    ['3 %', 0.03],
    ['2.5 mm', 0.0025],
    ['1.2e-3', 0.0012],
    ['1.2E3 V', 1200],
    ['20 VA', 20],
  ])('%s is understood', (text, value) => {
    expect(parseQuantity(text)).toBe(value);
  });

  it('keeps milli and mega apart', () => {
    expect(parseQuantity('5 m')).toBe(0.005);
    expect(parseQuantity('5 M')).toBe(5e6);
    expect(parseQuantity('5 mΩ', { unit: 'Ω' })).toBe(0.005);
    expect(parseQuantity('5 MΩ', { unit: 'Ω' })).toBe(5e6);
  });

  it('takes a decimal comma where the locale has one', () => {
    expect(parseQuantity('1,25', { decimalComma: true })).toBe(1.25);
    expect(parseQuantity('1,250 V', { decimalComma: true })).toBe(1.25);
    expect(parseQuantity('1.25', { decimalComma: true })).toBe(1.25);
    expect(parseQuantity('0.035', { decimalComma: true })).toBe(0.035);
    expect(parseQuantity('1 234,5', { decimalComma: true })).toBe(1234.5);
  });

  it.each([
    '',
    '  ',
    'abc',
    '3 xV',
    '4V7',
    '--3',
    '12 V DC?',
    '1 2',
    '12 34',
    '3 min',
    'NaN',
    'Infinity',
    '4k7.5',
    '0x10',
    '5 cm',
  ])('does not understand "%s" and says what to type', (text) => {
    expect(() => parseQuantity(text)).toThrow(QuantityNotUnderstood);
    expect(() => parseQuantity(text)).not.toThrow(AmbiguousQuantity);
  });

  it.each(['1e400', '9'.repeat(65)])('refuses a number that is no measured value', (text) => {
    expect(() => parseQuantity(text)).toThrow(QuantityNotUnderstood);
  });

  it('quotes what was typed and gives an example', () => {
    expect(() => parseQuantity('abc')).toThrow(
      '“abc”: Type a number, with a prefix or unit where needed: 0.035, 35m or 35 mV.',
    );
  });
});

describe('a quantity that can be read in two ways', () => {
  it.each<[string, boolean, RegExp]>([
    ['1,25', false, /1\.25/],
    ['1,250', false, /1250 or 1\.250/],
    ['1.250', true, /1250 or 1,250/],
    ['12.221', true, /12221 or 12,221/],
    ['1,250.5', false, /more than one decimal sign/],
    ['1.250,5', true, /more than one decimal sign/],
    ['1.2.3', false, /more than one decimal sign/],
  ])('%s (decimal comma: %s) is asked back with a hint', (text, decimalComma, hint) => {
    expect(() => parseQuantity(text, { decimalComma })).toThrow(AmbiguousQuantity);
    expect(() => parseQuantity(text, { decimalComma })).toThrow(hint);
  });

  it('of metres or milli is asked back', () => {
    expect(() => parseQuantity('35 m', { unit: 'm' })).toThrow(AmbiguousQuantity);
    expect(parseQuantity('35 mm', { unit: 'm' })).toBe(0.035);
  });

  it('of kelvins is kelvins, as SI writes kilo small', () => {
    expect(parseQuantity('35 K', { unit: 'K' })).toBe(35);
    expect(parseQuantity('35 mK', { unit: 'K' })).toBe(0.035);
    expect(() => parseQuantity('4K7', { unit: 'K' })).toThrow(AmbiguousQuantity);
  });
});

describe('a unit that is not the field’s', () => {
  it.each<[string, string, RegExp]>([
    ['35 mA', 'V', /this is in A, and V is wanted here/],
    ['35 mA', 'V p-p', /this is in A, and V p-p is wanted here/],
    ['35 V', 'MΩ', /this is in V, and Ω is wanted here/],
    ['185 mV p-p', 'V', /this is p-p, and V is wanted here/],
    ['185 mV rms', 'V p-p', /this is rms, and V p-p is wanted here/],
    ['30m', '%', /a prefix does not go with %/],
    ['4k7', '%', /a prefix does not go with %/],
    ['3 V', '', /this is in V, and a plain number is wanted here/],
    ['3 %', 'V', /this is in %, and V is wanted here/],
  ])('%s under %s is refused in words', (text, unit, words) => {
    expect(() => parseQuantity(text, { unit })).toThrow(words);
  });

  it('is taken in every form of the field’s own', () => {
    for (const text of ['185 mV', '185m', '0.185 V', '185 mV p-p', '0.185 Vpp', '0.185']) {
      expect(parseQuantity(text, { unit: 'mV p-p' })).toBe(0.185);
    }
  });
});

describe('a reading at the bench', () => {
  it.each<[string, string, number]>([
    ['185', 'mV p-p', 0.185],
    ['185m', 'mV p-p', 0.185],
    ['0.185 V', 'mV p-p', 0.185],
    ['1.85', 'V', 1.85],
    ['100', 'MΩ', 1e8],
    ['100 k', 'MΩ', 1e5],
    ['30', '%', 0.3],
    ['30 %', '%', 0.3],
    ['2.5', 'mm', 0.0025],
    ['1e3', 'mV', 1],
    ['35', 'K', 35],
    ['41.5', '°C', 41.5],
    ['2200', 'µF', 0.0022],
    ['0.98', '', 0.98],
  ])('%s under %s', (text, unit, value) => {
    expect(parseReading(text, unit)).toBe(value);
  });

  it('typed as the limit is written equals the limit', () => {
    expect(parseReading('2.40', 'V')).toBe(2.4);
    expect(parseReading('2400', 'mV')).toBe(2.4);
    expect(parseReading('2400m', 'V')).toBe(2.4);
    expect(parseReading('57', '%')).toBe(0.57);
    expect(57 * 0.01).not.toBe(0.57);
  });

  it('takes the decimal comma of its file', () => {
    expect(parseReading('12,221', 'V', { decimalComma: true })).toBe(12.221);
    expect(() => parseReading('12,221', 'V')).toThrow(AmbiguousQuantity);
  });
});

describe('display units', () => {
  it.each<[string, { factor: number; label: string; base: string }]>([
    ['V', { factor: 1, label: 'V', base: 'V' }],
    ['V p-p', { factor: 1, label: 'V p-p', base: 'V p-p' }],
    ['mV p-p', { factor: 0.001, label: 'mV p-p', base: 'V p-p' }],
    ['MΩ', { factor: 1e6, label: 'MΩ', base: 'Ω' }],
    ['µF', { factor: 1e-6, label: 'µF', base: 'F' }],
    ['%', { factor: 0.01, label: '%', base: '' }],
    ['K', { factor: 1, label: 'K', base: 'K' }],
    ['mm', { factor: 0.001, label: 'mm', base: 'm' }],
    ['°C', { factor: 1, label: '°C', base: '°C' }],
    ['', { factor: 1, label: '', base: '' }],
  ])('%s is known', (unit, meaning) => {
    expect(displayUnit(unit)).toEqual(meaning);
  });

  it.each(['furlong', 'mX', 'k', 'm%'])('%s is not', (unit) => {
    expect(() => displayUnit(unit)).toThrow(UnitNotKnown);
  });

  it('take a value of fifteen digits there and back unchanged', () => {
    const values = fc
      .tuple(fc.integer({ min: -(10 ** 15), max: 10 ** 15 }), fc.integer({ min: -24, max: 0 }))
      .map(([digits, power]) => Number(`${digits}e${power}`));
    fc.assert(
      fc.property(values, fc.constantFrom('V', 'mV', 'MΩ', 'µF', '%', 'mm', 'K'), (value, unit) => {
        expect(fromDisplayUnit(inDisplayUnit(value, unit), unit)).toBe(value);
      }),
    );
  });
});

describe('what is printed is read back as it was', () => {
  const prefixed = fc.constantFrom('V', 'A', 'Ω', 'F', 'Hz', 'W', 'V p-p', 's');

  it('for values of four digits and any size', () => {
    fc.assert(
      fc.property(
        fc.integer({ min: 1, max: 9999 }),
        fc.integer({ min: -12, max: 8 }),
        prefixed,
        (digits, power, unit) => {
          const value = Number(`${digits}e${power}`);
          expect(parseQuantity(formatQuantity(value, unit), { unit })).toBe(value);
          expect(parseReading(formatQuantity(-value, unit), unit)).toBe(-value);
        },
      ),
    );
  });
});
