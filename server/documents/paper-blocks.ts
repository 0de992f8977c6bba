import { LEFT, type Paper, WIDTH } from './paper';
import { drawTable, type Table } from './paper-table';
import { STYLES, type TextStyle } from './text-style';

type Element = PDFKit.PDFStructureElement;

export const HEADING_HEIGHT = 22;
/** A heading stays with the head and the first row of its table. */
const TABLE_START = HEADING_HEIGHT + 24 + 25;

/** A paragraph over the whole width; it stays on one page. */
export function paragraph(paper: Paper, parent: Element, text: string, style: TextStyle): void {
  const lines = paper.wrap([{ text, style }], WIDTH);
  paper.keepTogether(lines.length * style.leading);
  parent.add(paper.doc.struct('P', {}, () => paper.lines(lines, LEFT, paper.y, style.leading)));
  paper.advance(lines.length * style.leading);
}

/** The heading of a section. */
export function heading(paper: Paper, parent: Element, text: string, x: number): void {
  const style = STYLES.heading;
  parent.add(paper.doc.struct('H2', {}, () => paper.line([{ text, style }], x, paper.y, style.leading)));
  paper.advance(HEADING_HEIGHT);
}

/** A table under its heading. */
export function titledTable(paper: Paper, parent: Element, title: string, table: Table): void {
  paper.keepTogether(TABLE_START);
  heading(paper, parent, title, table.x);
  drawTable(paper, parent, table);
}
