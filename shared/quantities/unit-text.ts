import { KNOWN_UNITS, QUALIFIERS, type KnownUnit, type Qualifier } from './known-units';
import { PREFIX_PLACES } from './prefixes';

/** One way to read the letters behind a number. */
export interface UnitReading {
  /** The unit, or null for a prefix alone. */
  unit: KnownUnit | null;
  /** Places from the number as written to the unit's base. */
  places: number;
}

/** The letters behind a number: every way to read them, and the qualifier written after them. */
export interface UnitText {
  readings: UnitReading[];
  qualifier: Qualifier | null;
}

const QUALIFIED = /^(.*?)\s*(p-p|pp|rms)$/i;

function splitQualifier(text: string): { letters: string; qualifier: Qualifier | null } {
  const [, letters = '', written] = QUALIFIED.exec(text) ?? [];
  if (written === undefined) return { letters: text, qualifier: null };
  const plain = written.toLowerCase() === 'pp' ? 'p-p' : written.toLowerCase();
  return { letters, qualifier: QUALIFIERS.find((known) => known === plain) ?? null };
}

function readingsIn(unit: KnownUnit, letters: string): UnitReading[] {
  return unit.spellings
    .filter((spelling) => letters.endsWith(spelling))
    .map((spelling) => letters.slice(0, letters.length - spelling.length))
    .filter((prefix) => prefix === '' || unit.prefixes.length > 1)
    .flatMap((prefix) => {
      const places = PREFIX_PLACES.get(prefix);
      return places === undefined ? [] : [{ unit, places: places + unit.places }];
    });
}

/** Brings the forms one sign has in Unicode (ohm sign, micro sign, no-break spaces, true minus) to one, and trims. */
export function plainText(text: string): string {
  return text.normalize('NFKC').replaceAll('\u2212', '-').replace(/\s+/g, ' ').trim();
}

/**
 * Reads the letters behind a number in every way they allow: "mV" is one, "m" is a prefix or the metre, "xy" is none.
 *
 * @param text letters already brought to plain text
 */
export function readUnitText(text: string): UnitText {
  const { letters, qualifier } = splitQualifier(text);
  const prefix = PREFIX_PLACES.get(letters);
  const alone = prefix === undefined ? [] : [{ unit: null, places: prefix }];
  const withUnit = KNOWN_UNITS.flatMap((unit) => readingsIn(unit, letters));
  return { readings: [...alone, ...withUnit], qualifier };
}
