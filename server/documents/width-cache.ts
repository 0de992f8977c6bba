import { type Piece } from './text-lines';

/** So many widths are remembered; papers of one site say much the same. */
const MOST = 50_000;

const widths = new Map<string, number>();

/** The width of a piece, laid out once for all papers: the same words stand in every one of them. */
export function rememberedWidth({ text, style }: Piece, measure: () => number): number {
  const { family, weight, size, tracking = 0 } = style;
  const key = `${family} ${weight} ${size} ${tracking} ${text}`;
  const known = widths.get(key);
  if (known !== undefined) return known;
  const width = measure();
  if (widths.size >= MOST) widths.clear();
  widths.set(key, width);
  return width;
}
