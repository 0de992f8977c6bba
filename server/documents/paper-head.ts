import { LEFT, type Paper, WIDTH } from './paper';
import { utcDay } from './paper-time';
import { type Piece } from './text-lines';
import { STYLES } from './text-style';

type Element = PDFKit.PDFStructureElement;

/** What stands above the content of a paper. */
export interface PaperHead {
  issuer: { name: string; department: string; address: string };
  title: string;
  /** What the number at the right is the number of. */
  kind: string;
  number: string;
  at: string;
}

const SENDER_WIDTH = 440;

function sender(paper: Paper, parent: Element, { name, department, address }: PaperHead['issuer']): void {
  const first: Piece[] = [
    { text: name, style: STYLES.strong },
    { text: `, ${department}`, style: STYLES.quiet },
  ];
  const below = address.split(/\r?\n/).map((text) => [{ text, style: STYLES.quiet }]);
  for (const pieces of [first, ...below]) {
    const lines = paper.wrap(pieces, SENDER_WIDTH);
    parent.add(paper.doc.struct('P', {}, () => paper.lines(lines, LEFT, paper.y, STYLES.quiet.leading)));
    paper.advance(lines.length * STYLES.quiet.leading);
  }
}

function numberAtTheRight(paper: Paper, parent: Element, { kind, number, at }: PaperHead, bottom: number): void {
  const rows = [
    { text: kind, style: STYLES.quiet },
    { text: number, style: STYLES.number },
    { text: utcDay(at), style: STYLES.quiet },
  ];
  let y = bottom - rows.reduce((height, row) => height + row.style.leading, 0);
  for (const { text, style } of rows) {
    const top = y;
    parent.add(paper.doc.struct('P', {}, () => paper.lineEndingAt(text, style, LEFT + WIDTH, top)));
    y += style.leading;
  }
}

/** Who issues a paper, its title, and at the right its number and day. */
export function paperHead(paper: Paper, parent: Element, head: PaperHead): void {
  sender(paper, parent, head.issuer);
  paper.advance(10);
  const { leading } = STYLES.title;
  const title: Piece = { text: head.title, style: STYLES.title };
  parent.add(paper.doc.struct('H1', {}, () => paper.line([title], LEFT, paper.y, leading)));
  numberAtTheRight(paper, parent, head, paper.y + leading);
  paper.advance(leading + 22);
}
