/** A value that is no number a measurement can have. */
export class ReadingNotFinite extends RangeError {
  override readonly name = 'ReadingNotFinite';

  constructor(
    /** The argument that is not finite. */
    readonly argument: string,
    value: number,
  ) {
    super(`${argument} must be a finite number, not ${value}.`);
  }
}

/**
 * Refuses values that are not finite, naming the first of them.
 *
 * @throws {ReadingNotFinite} for NaN or an infinite value
 */
export function demandFinite(values: Readonly<Record<string, number>>): void {
  for (const argument of Object.keys(values)) {
    const value = values[argument] ?? NaN;
    if (!Number.isFinite(value)) throw new ReadingNotFinite(argument, value);
  }
}
