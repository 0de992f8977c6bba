/**
 * Moves the decimal point of a number by whole places, exactly as a person moves it on paper: 2.4 by −3 is the number
 * nearest to 0.0024, without the rounding that multiplying by a power of ten would add.
 *
 * @param places positive moves to the right (times ten), negative to the left
 */
export function shiftDecimal(value: number, places: number): number {
  const [digits, exponent = '0'] = String(value).split('e');
  return Number(`${digits}e${Number(exponent) + places}`);
}
