import { UNITS } from '#shared/contract/plans';
import { formatQuantity } from '#shared/quantities/format-quantity';
import { parseQuantity } from '#shared/quantities/parse-quantity';
import { parseReading } from '#shared/quantities/parse-reading';
import { QuantityNotUnderstood } from '#shared/quantities/quantity-not-understood';
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { numRuns } from '../support/fuzz-runs';

const digits = fc.stringMatching(/^\d{1,9}$/);
const piece = fc.oneof(
  { weight: 4, arbitrary: digits },
  {
    weight: 3,
    arbitrary: fc.constantFrom(...['.', ',', ' ', '\u202f', '\u00a0', '-', '−', '+', 'e', 'E', '±', '%', "'", '/']),
  },
  {
    weight: 3,
    arbitrary: fc.constantFrom(
      ...['V', 'mV', 'kV', 'Ω', 'ohm', 'R', 'K', 'k', 'M', 'µ', 'u', 'n', 'p', 'm', 'A', 'W', 'Hz', 'F'],
    ),
  },
  { weight: 1, arbitrary: fc.constantFrom('p-p', 'rms', '°C', 'NaN', 'Infinity', '0x1f', 'div') },
  { weight: 1, arbitrary: fc.string({ maxLength: 4, unit: 'binary' }) },
);
/** Texts as hands and instruments make them: mostly nearly right. */
const typed = fc.oneof(
  { weight: 5, arbitrary: fc.array(piece, { maxLength: 6 }).map((pieces) => pieces.join('')) },
  {
    weight: 2,
    arbitrary: fc.tuple(digits, fc.constantFrom('R', 'k', 'K', 'M', 'µ', 'p'), digits).map((parts) => parts.join('')),
  },
  { weight: 1, arbitrary: fc.string({ maxLength: 60, unit: 'binary' }) },
);
const unit = fc.constantFrom(...UNITS);

/** What comes of a text: a finite value, or a sentence; anything else fails the test. */
function outcome(read: () => number): number | string {
  let value: number;
  try {
    value = read();
  } catch (error) {
    expect(error).toBeInstanceOf(QuantityNotUnderstood);
    const { message } = error as QuantityNotUnderstood;
    expect(message).toMatch(/\w{2}.*[.?]$/su);
    return message;
  }
  expect(Number.isFinite(value)).toBe(true);
  return value;
}

describe('any text', () => {
  it('is a finite value of its unit, or a sentence why not', () => {
    let values = 0;
    fc.assert(
      fc.property(typed, unit, fc.boolean(), (text, of, decimalComma) => {
        if (typeof outcome(() => parseReading(text, of, { decimalComma })) === 'number') values += 1;
        outcome(() => parseQuantity(text, { unit: of, decimalComma }));
        outcome(() => parseQuantity(text, { decimalComma }));
      }),
      { numRuns },
    );
    // A parser that refused everything would pass the rest.
    expect(values).toBeGreaterThan(numRuns / 50);
  });
});

describe('any value', () => {
  it('is read back as it was printed', () => {
    const value = fc.double({ min: 1e-9, max: 1e9, noNaN: true });
    fc.assert(
      fc.property(value, fc.constantFrom('V', 'mV', 'A', 'Ω', 'W', 'Hz'), fc.boolean(), (size, of, isNegative) => {
        const given = isNegative ? -size : size;
        const printed = formatQuantity(given, of, { significant: 6 });
        expect(Math.abs(parseQuantity(printed, { unit: of }) - given)).toBeLessThanOrEqual(1e-5 * size);
      }),
      { numRuns },
    );
  });
});
