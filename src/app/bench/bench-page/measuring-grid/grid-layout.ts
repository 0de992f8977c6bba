import { type BenchColumn } from '../../sheet/bench-column';

/** Widths in px. A column with a strip grows; the others keep theirs. */
const WIDTHS = { attribute: 92, attributes: 104, number: 106, strip: 138 } as const;
/** The two columns that stay in place. */
export const UNIT = 52;
export const VERDICT = 54;
/** What a strip's column spends on padding, digits and the gap before the strip. */
const BESIDE_STRIP = 74;
const LEAST_STRIP = 64;
const LARGEST_STRIP = 120;

/** The columns of the grid in a view of `width` px: their CSS template, the least width of a row, the width of a strip. */
export function gridLayout(
  columns: readonly BenchColumn[],
  width: number,
): { template: string; least: number; strip: number } {
  const strips = columns.filter(({ shape }) => shape === 'strip').length;
  const least = columns.reduce((sum, { shape }) => sum + WIDTHS[shape], UNIT + VERDICT);
  const tracks = columns.map(({ shape }) =>
    shape === 'strip' ? `minmax(${WIDTHS.strip}px, 1fr)` : fixed(shape, strips),
  );
  const column = strips === 0 ? 0 : WIDTHS.strip + Math.max(width - least, 0) / strips;
  return {
    template: [`${UNIT}px`, ...tracks, `${VERDICT}px`].join(' '),
    least,
    strip: Math.floor(Math.min(Math.max(column - BESIDE_STRIP, LEAST_STRIP), LARGEST_STRIP)),
  };
}

/** Without any strip the other columns share the width. */
function fixed(shape: Exclude<BenchColumn['shape'], 'strip'>, strips: number): string {
  return strips === 0 ? `minmax(${WIDTHS[shape]}px, 1fr)` : `${WIDTHS[shape]}px`;
}
