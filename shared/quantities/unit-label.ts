/** No-break space, before every unit. */
const SPACE = '\u00a0';

/** Digits with their unit behind them, held together by no-break spaces; an empty unit adds nothing. */
export function withUnit(digits: string, unit: string): string {
  const label = unit.trim();
  return label === '' ? digits : digits + SPACE + label.replaceAll(' ', SPACE);
}
