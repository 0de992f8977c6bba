const NARROW_SPACE = '\u202f';

/** A count with a narrow no-break space between thousands. */
export function countText(count: number): string {
  return String(Math.round(count)).replace(/\B(?=(\d{3})+$)/g, NARROW_SPACE);
}
