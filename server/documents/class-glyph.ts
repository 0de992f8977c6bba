import { type NonconformityClass } from '#shared/sampling/scheme';
import { INK_2, LINE } from './paper-colours';

const BARS = [
  { x: 0, height: 4 },
  { x: 4, height: 7 },
  { x: 8, height: 10 },
];
const FILLED: Record<NonconformityClass, number> = { minor: 1, major: 2, critical: 3 };

/** Width of the glyph and the gap to its word. */
export const CLASS_GLYPH_WIDTH = 17;

/** One, two or three bars of three, standing on y. */
export function classGlyph(doc: PDFKit.PDFDocument, kind: NonconformityClass, x: number, y: number): void {
  for (const [nth, bar] of BARS.entries()) {
    doc.rect(x + bar.x, y - bar.height, 3, bar.height).fill(nth < FILLED[kind] ? INK_2 : LINE);
  }
}
