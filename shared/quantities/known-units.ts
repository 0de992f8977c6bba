/** A unit quantities are written in, by its symbol without prefix. */
export interface KnownUnit {
  symbol: string;
  /** Other ways people write it, after Unicode compatibility normalisation. */
  spellings: readonly string[];
  /** Places from this unit to its base: −2 for %, else 0. */
  places: number;
  /** Prefixes it is shown with, smallest first, "" being none; a unit shown without any takes none when typed either. */
  prefixes: readonly string[];
}

const ELECTRICAL = ['p', 'n', 'µ', 'm', '', 'k', 'M', 'G'];

function unit(symbol: string, prefixes: readonly string[], spellings: readonly string[] = [], places = 0): KnownUnit {
  return { symbol, prefixes, spellings: [symbol, ...spellings], places };
}

/**
 * The units the product knows. All are SI base or derived units but °C, which is kept as it is, and %, kept as a fraction.
 * Farads skip the millifarad: the trade writes 2 200 µF (common practice, no source).
 */
export const KNOWN_UNITS: readonly KnownUnit[] = [
  unit('V', ELECTRICAL),
  unit('A', ELECTRICAL),
  unit('Ω', ELECTRICAL, ['ohm', 'ohms', 'Ohm', 'R']),
  unit('F', ['p', 'n', 'µ', '']),
  unit('H', ELECTRICAL),
  unit('Hz', ELECTRICAL),
  unit('W', ELECTRICAL),
  unit('VA', ELECTRICAL),
  unit('s', ['p', 'n', 'µ', 'm', '']),
  unit('m', ['µ', 'm', '', 'k']),
  unit('N', ['m', '', 'k']),
  unit('K', ['m', '']),
  unit('°C', [''], ['degC']),
  unit('%', [''], [], -2),
];

/** What tells two voltages of one unit apart. */
export const QUALIFIERS = ['p-p', 'rms'] as const;
/** One of {@link QUALIFIERS}. */
export type Qualifier = (typeof QUALIFIERS)[number];
