import { type UnitParts } from './display-unit';
import { LARGEST_VALUE } from './largest-value';
import { readNumeral, type NumeralOptions } from './numeral';
import { PREFIX_PLACES } from './prefixes';
import { AmbiguousQuantity, QuantityNotUnderstood } from './quantity-not-understood';
import { plainText, readUnitText, type UnitReading } from './unit-text';

/** A quantity as written: its decimal digits, the places to SI base units, and whether the number stood alone. */
export interface WrittenQuantity {
  digits: string;
  places: number;
  bare: boolean;
}

const EXAMPLES = 'Type a number, with a prefix or unit where needed: 0.035, 35m or 35 mV.';
const WRITTEN = /^([+-]?) ?(\d[\d., ]*|[.,]\d+)(?:e([+-]?\d{1,3}))?(.*)$/i;
/** A letter in the place of the decimal point, as on parts: 4k7. Source: IEC 60062. */
const LETTER_AS_POINT = /^([a-zA-Z\u03bc])(\d+)(.*)$/;
const LONGEST = 64;

const unitName = ({ unit, qualifier }: UnitParts) =>
  [unit?.symbol ?? 'a plain number', qualifier].filter((word) => word !== null).join(' ');

function fitting(readings: readonly UnitReading[], wanted: UnitParts): UnitReading[] {
  const takesPrefix = wanted.unit !== null && wanted.unit.prefixes.length > 1;
  return readings.filter(({ unit, places }) => (unit === null ? takesPrefix || places === 0 : unit === wanted.unit));
}

function refuseLetters(
  letters: string,
  text: string,
  readings: readonly UnitReading[],
  wanted: UnitParts | null,
): never {
  const [typed] = readings;
  if (wanted === null || typed === undefined) {
    throw new QuantityNotUnderstood(text, `“${letters}” is no unit or prefix known here. ${EXAMPLES}`);
  }
  const { unit } = typed;
  if (unit) throw new QuantityNotUnderstood(text, `this is in ${unit.symbol}, and ${unitName(wanted)} is wanted here.`);
  throw new QuantityNotUnderstood(text, `a prefix does not go with ${unitName(wanted)}. Write the number without it.`);
}

/** Among the readings of the letters, the one that fits the wanted unit. */
function chooseReading(letters: string, text: string, wanted: UnitParts | null): UnitReading {
  const { readings, qualifier } = readUnitText(letters);
  if (wanted !== null && qualifier !== null && qualifier !== wanted.qualifier) {
    throw new QuantityNotUnderstood(text, `this is ${qualifier}, and ${unitName(wanted)} is wanted here.`);
  }
  const [first, second] = wanted === null ? readings.slice(0, 1) : fitting(readings, wanted);
  if (first === undefined) return refuseLetters(letters, text, readings, wanted);
  // SI writes kilo with a small k, so K where kelvins are wanted is the kelvin; m for metre or milli stays open.
  if (second !== undefined && letters === 'K') return second;
  if (second !== undefined) {
    throw new AmbiguousQuantity(text, 'm can be metre or milli here. Write mm for millimetres, or the number alone.');
  }
  return first;
}

function letterAsPoint(whole: string, tail: string, text: string, wanted: UnitParts | null): WrittenQuantity | null {
  const [, letter = '', fraction = '', rest = ''] = LETTER_AS_POINT.exec(tail) ?? [];
  const places = letter === 'R' && (wanted === null || wanted.unit?.symbol === 'Ω') ? 0 : PREFIX_PLACES.get(letter);
  if (letter === '' || places === undefined || !/^\d+$/.test(whole)) return null;
  if (letter.toUpperCase() === wanted?.unit?.symbol.toUpperCase()) {
    throw new AmbiguousQuantity(
      text,
      `${letter} can be the prefix or the unit here. Write the number with a decimal point.`,
    );
  }
  const behind = rest.trim();
  const reading =
    behind === '' ? { unit: null, places } : chooseReading(`${letter === 'R' ? '' : letter}${behind}`, text, wanted);
  if (behind === '' && wanted !== null && fitting([reading], wanted).length === 0) {
    refuseLetters(letter, text, [reading], wanted);
  }
  return { digits: `${whole}.${fraction}`, places: reading.places, bare: false };
}

/**
 * Reads a quantity as people write it, without turning it into a number yet, so that the decimal digits survive.
 *
 * @param wanted the unit of the field, or null where any known unit may be typed; without one, letters that can be a prefix
 *   are the prefix
 * @throws {AmbiguousQuantity} for what can be read in two ways
 * @throws {QuantityNotUnderstood} for what cannot be read, and for a unit that is not the wanted one
 */
export function readQuantity(text: string, wanted: UnitParts | null, options: NumeralOptions): WrittenQuantity {
  const plain = plainText(text);
  if (plain === '') throw new QuantityNotUnderstood(text, EXAMPLES);
  const [matched, sign = '', numeral = '', exponent, tail = ''] = WRITTEN.exec(plain) ?? [];
  if (matched === undefined || plain.length > LONGEST) throw new QuantityNotUnderstood(text, EXAMPLES);
  const marked = exponent === undefined ? letterAsPoint(numeral, tail, text, wanted) : null;
  if (marked !== null) return { ...marked, digits: sign + marked.digits };
  const letters = tail.trim();
  const reading = chooseReading(letters, text, wanted);
  const digits = sign + readNumeral(numeral.trim(), text, options);
  return { digits, places: reading.places + Number(exponent ?? 0), bare: letters === '' };
}

/**
 * The number nearest to a written quantity, in SI base units.
 *
 * @param places to move the decimal point further by
 * @throws {QuantityNotUnderstood} for a number too large to be kept
 */
export function toNumber(written: WrittenQuantity, text: string, places = 0): number {
  const value = Number(`${written.digits}e${written.places + places}`);
  if (!(Math.abs(value) <= LARGEST_VALUE))
    throw new QuantityNotUnderstood(text, 'this is too large to be a measured value.');
  return value;
}
