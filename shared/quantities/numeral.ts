import { AmbiguousQuantity, QuantityNotUnderstood } from './quantity-not-understood';

/** How numbers are written where the text comes from. */
export interface NumeralOptions {
  /** Whether the comma is the decimal sign. */
  decimalComma?: boolean;
}

const GROUPED = /^\d{1,3}( \d{3})+([.,]\d+)?$/;

function withoutSpaces(numeral: string, text: string): string {
  if (!numeral.includes(' ')) return numeral;
  if (GROUPED.test(numeral)) return numeral.replaceAll(' ', '');
  throw new QuantityNotUnderstood(text, 'the spaces are not between thousands. Write the number without spaces.');
}

/** Whether what stands after the sign could just as well be a group of thousands: 1.250, 12.221, but not 0.035. */
const couldBeThousands = (numeral: string, sign: string) =>
  numeral.split(sign)[1]?.length === 3 && /^[1-9]\d{0,2}\D/.test(numeral);

function refuseComma(numeral: string, text: string): never {
  const point = numeral.replace(',', '.');
  throw new AmbiguousQuantity(
    text,
    couldBeThousands(numeral, ',')
      ? `this could be ${numeral.replace(',', '')} or ${point}. Write one of them, with a decimal point.`
      : `write the decimal sign as a point: ${point}.`,
  );
}

/**
 * Reads the digits of a number, as typed, to a decimal numeral with a point and nothing else.
 *
 * Spaces may part thousands. The comma is a decimal sign only where the options say so; there a point that could part
 * thousands is ambiguous in turn.
 *
 * @param numeral digits, spaces, points and commas
 * @param text all that was typed, for the message
 * @throws {AmbiguousQuantity} for a number that can be read in two ways
 * @throws {QuantityNotUnderstood} for one that cannot be read at all
 */
export function readNumeral(numeral: string, text: string, { decimalComma = false }: NumeralOptions): string {
  const digits = withoutSpaces(numeral, text);
  const signs = digits.replace(/\d/g, '');
  if (signs.length > 1) {
    throw new AmbiguousQuantity(text, 'there is more than one decimal sign. Write one, and nothing between thousands.');
  }
  if (signs === ',' && !decimalComma) refuseComma(digits, text);
  if (signs === '.' && decimalComma && couldBeThousands(digits, '.')) {
    const [whole = '', fraction = ''] = digits.split('.');
    throw new AmbiguousQuantity(text, `this could be ${whole}${fraction} or ${whole},${fraction}. Write one of them.`);
  }
  return digits.replace(',', '.');
}
