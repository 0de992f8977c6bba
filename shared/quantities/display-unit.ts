import { type KnownUnit, type Qualifier } from './known-units';
import { shiftDecimal } from './shift-decimal';
import { plainText, readUnitText } from './unit-text';

/** A unit of a plan that the product does not know. */
export class UnitNotKnown extends RangeError {
  override readonly name = 'UnitNotKnown';

  constructor(
    /** The unit as given. */
    readonly unit: string,
  ) {
    super(
      `unit “${unit}” is not known here. Use V, V p-p, A, W, Ω, F, H, Hz, s, m, N, K, °C or %, with or without a prefix.`,
    );
  }
}

/** A display unit taken apart. */
export interface UnitParts {
  /** The unit without prefix; null for a plain number. */
  unit: KnownUnit | null;
  qualifier: Qualifier | null;
  /** Places from the display unit to SI base units: 6 for MΩ, −2 for %. */
  places: number;
}

/** The unit a characteristic is shown and typed in. */
export interface DisplayUnit {
  /** SI base units in one display unit: 1e6 for MΩ, 0.01 for %. */
  factor: number;
  /** As shown behind a number. */
  label: string;
  /** The unit values are kept in: Ω for MΩ, V p-p for mV p-p, "" for % and plain numbers. */
  base: string;
}

/** Units are few and asked for with every value; so many of them are remembered. */
const MOST_REMEMBERED = 500;
const remembered = new Map<string, UnitParts>();

/**
 * Takes a display unit apart. An empty unit is a plain number.
 *
 * @throws {UnitNotKnown}
 */
export function unitParts(unit: string): UnitParts {
  const known = remembered.get(unit);
  if (known) return known;
  const parts = takenApart(unit);
  if (remembered.size < MOST_REMEMBERED) remembered.set(unit, parts);
  return parts;
}

function takenApart(unit: string): UnitParts {
  const text = plainText(unit);
  if (text === '') return { unit: null, qualifier: null, places: 0 };
  const { readings, qualifier } = readUnitText(text);
  const reading = readings.find((each) => each.unit !== null);
  if (reading === undefined) throw new UnitNotKnown(unit);
  return { ...reading, qualifier };
}

/**
 * What a display unit means: "MΩ", "%", "mm", "V p-p".
 *
 * @throws {UnitNotKnown}
 */
export function displayUnit(unit: string): DisplayUnit {
  const parts = unitParts(unit);
  const symbol = parts.unit === null || parts.unit.places !== 0 ? '' : parts.unit.symbol;
  const base = parts.qualifier === null ? symbol : `${symbol} ${parts.qualifier}`;
  return { factor: shiftDecimal(1, parts.places), label: unit.trim(), base };
}

/**
 * A value in SI base units, in its display unit.
 *
 * @throws {UnitNotKnown}
 */
export function inDisplayUnit(value: number, unit: string): number {
  return shiftDecimal(value, -unitParts(unit).places);
}

/**
 * A value in its display unit, in SI base units.
 *
 * @throws {UnitNotKnown}
 */
export function fromDisplayUnit(value: number, unit: string): number {
  return shiftDecimal(value, unitParts(unit).places);
}
