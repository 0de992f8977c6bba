const PLUS = 43;
const MINUS = 45;
const ZERO = 48;
const NINE = 57;
const LOWER_E = 101;
const LOWER_CASE = 32;

/** Powers of ten that a double holds exactly; within them one multiplication or division rounds correctly. */
const EXACT_POWERS = Float64Array.from({ length: 23 }, (_, at) => Number(`1e${at}`));
const MOST_EXACT_DIGITS = 15;

/**
 * Reads decimal numbers out of bytes without making texts of them: a file of a million samples has two million.
 *
 * A number of up to fifteen digits is an integer that a double holds, times a power of ten that it holds as well, so that
 * the result is the one that `Number` gives; all others go through `Number` itself.
 */
export class NumeralBytes {
  constructor(
    /** Code of the decimal mark. */
    private readonly decimal: number,
  ) {}

  /** The number between two places; NaN where there stands none. */
  read(bytes: Uint8Array, from: number, to: number): number {
    let at = from;
    const isNegative = bytes[at] === MINUS;
    if (isNegative || bytes[at] === PLUS) at += 1;
    let digits = 0;
    let value = 0;
    let exponent = 0;
    let isFraction = false;
    for (; at < to; at += 1) {
      const byte = bytes[at] ?? 0;
      if (byte >= ZERO && byte <= NINE) {
        value = value * 10 + (byte - ZERO);
        if (value > 0) digits += 1;
        if (isFraction) exponent -= 1;
      } else if (byte === this.decimal && !isFraction) isFraction = true;
      else break;
    }
    const marks = isFraction ? 1 : 0;
    const signs = isNegative || bytes[from] === PLUS ? 1 : 0;
    if (at - from === marks + signs) return NaN;
    if (at < to) {
      const stated = this.exponent(bytes, at, to);
      if (Number.isNaN(stated)) return NaN;
      exponent += stated;
    }
    if (digits > MOST_EXACT_DIGITS || exponent > 22 || exponent < -22) return this.slow(bytes, from, to);
    const scaled = exponent < 0 ? value / (EXACT_POWERS[-exponent] ?? 1) : value * (EXACT_POWERS[exponent] ?? 1);
    return isNegative ? -scaled : scaled;
  }

  /** What stands behind an "e"; NaN where that is no whole number. */
  private exponent(bytes: Uint8Array, from: number, to: number): number {
    if (((bytes[from] ?? 0) | LOWER_CASE) !== LOWER_E) return NaN;
    let at = from + 1;
    const isNegative = bytes[at] === MINUS;
    if (isNegative || bytes[at] === PLUS) at += 1;
    if (at >= to) return NaN;
    let value = 0;
    for (; at < to; at += 1) {
      const byte = bytes[at] ?? 0;
      if (byte < ZERO || byte > NINE) return NaN;
      value = Math.min(value * 10 + (byte - ZERO), 100_000);
    }
    return isNegative ? -value : value;
  }

  private slow(bytes: Uint8Array, from: number, to: number): number {
    const text = String.fromCharCode(...bytes.subarray(from, to));
    return Number(text.replace(String.fromCharCode(this.decimal), '.'));
  }
}
