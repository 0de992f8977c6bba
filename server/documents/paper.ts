import { FontRuns } from './font-runs';
import { PRIMARY } from './paper-colours';
import { rippleLine } from './ripple-line';
import { fitted, type Piece, type TextLine, wrap } from './text-lines';
import { type TextStyle } from './text-style';
import { rememberedWidth } from './width-cache';

/** Points in one of the design's pixels, in which every length of a paper is given. */
const POINTS = 0.75;
export const LEFT = 72;
export const WIDTH = 650;
const TOP = 44;
const TOP_LINE_HEIGHT = 26;
/** Where content begins below the line along the top. */
export const FIRST_LINE = TOP + TOP_LINE_HEIGHT + 18;
/** Where content ends and the foot begins. */
export const BOTTOM = 1038;

/** From the middle of a line box down to the baseline, as a share of the font size: Roboto's cap height, centred. */
const BASELINE = 0.342;

/** A pdfkit document in the design's pixels, with text that may mix scripts and styles, and a place to go on writing. */
export class Paper {
  /** Where the next thing goes. */
  y = 0;
  /** Whether nothing stands on the page but its top line. */
  fresh = true;
  private readonly fonts: FontRuns;

  constructor(readonly doc: PDFKit.PDFDocument) {
    this.fonts = new FontRuns(doc);
    this.addPage();
  }

  /** Begins a page: the line with its ripple runs along the top of each. */
  addPage(): void {
    this.doc.addPage();
    this.doc.scale(POINTS);
    this.artifact(() => this.topLine(), 'Pagination');
    this.y = FIRST_LINE;
    this.fresh = true;
  }

  private topLine(): void {
    const y = TOP + TOP_LINE_HEIGHT / 2;
    rippleLine(this.doc, { x: LEFT + 1, y, width: WIDTH - 2, ripple: 106, amplitude: 11.5, turns: 4 });
    this.doc.lineWidth(2).stroke(PRIMARY);
  }

  /** Goes to a new page when what follows must stay together and does not fit. */
  keepTogether(height: number): void {
    if (this.y + height > BOTTOM && !this.fresh) this.addPage();
  }

  advance(height: number): void {
    this.y += height;
    this.fresh = false;
  }

  /** Draws what says nothing by itself; a screen reader passes over it. */
  artifact(draw: () => void, kind: 'Layout' | 'Pagination' = 'Layout'): void {
    this.doc.markContent('Artifact', { type: kind });
    draw();
    this.doc.endMarkedContent();
  }

  readonly measure = (piece: Piece): number =>
    rememberedWidth(piece, () =>
      this.fonts.split(piece.text, piece.style).reduce((width, run) => {
        this.doc.font(run.font).fontSize(piece.style.size);
        return width + this.doc.widthOfString(run.text, { characterSpacing: piece.style.tracking ?? 0 });
      }, 0),
    );

  wrap(pieces: readonly Piece[], width: number): TextLine[] {
    return wrap(pieces, width, this.measure);
  }

  fitted(text: string, style: TextStyle, width: number): string {
    return fitted({ text, style }, width, this.measure).text;
  }

  /** Draws lines one below the other. */
  lines(lines: readonly TextLine[], x: number, y: number, leading: number): void {
    lines.forEach((line, nth) => this.line(line.pieces, x, y + nth * leading, leading));
  }

  /** Draws one line whose box begins at y. */
  line(pieces: readonly Piece[], x: number, y: number, leading: number): void {
    const size = Math.max(...pieces.map((piece) => piece.style.size));
    const baseline = y + leading / 2 + size * BASELINE;
    let at = x;
    for (const { text, style } of pieces) {
      for (const run of this.fonts.split(text, style)) {
        const options = { characterSpacing: style.tracking ?? 0 };
        this.doc.font(run.font).fontSize(style.size).fillColor(style.colour);
        this.doc.text(run.text, at, baseline, { ...options, lineBreak: false, baseline: 'alphabetic' });
        at += this.measure({ text: run.text, style });
      }
    }
  }

  /** Draws one line that ends at x. */
  lineEndingAt(text: string, style: TextStyle, x: number, y: number): void {
    this.line([{ text, style }], x - this.measure({ text, style }), y, style.leading);
  }

  /** A horizontal hairline. */
  rule(x: number, y: number, width: number, colour: string): void {
    this.artifact(() =>
      this.doc
        .moveTo(x, y + 0.5)
        .lineTo(x + width, y + 0.5)
        .lineWidth(1)
        .stroke(colour),
    );
  }
}
