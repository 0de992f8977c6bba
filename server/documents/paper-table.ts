import { LINE, LINE_2 } from './paper-colours';
import { type Paper } from './paper';
import { COLUMN_HEAD } from './table-head';
import { type Piece, type TextLine } from './text-lines';
import { STYLES } from './text-style';

export interface Column {
  head: string;
  /** From the table's left edge. */
  x: number;
  width: number;
  align: 'left' | 'right';
}

export interface Cell {
  pieces: Piece[];
  /** Drawn before the text, which then begins this much further right; y is the baseline of the text. */
  mark?: { width: number; draw: (x: number, y: number) => void };
}

export interface Table {
  x: number;
  width: number;
  columns: readonly Column[];
  rows: readonly (readonly Cell[])[];
  /** Least height of a row. */
  rowHeight: number;
}

type Element = PDFKit.PDFStructureElement;

const HEAD_HEIGHT = 24;
const LEADING = 17;
/** Space above and below the lines of a row that wraps. */
const PADDING = 4;

interface MeasuredCell {
  column: Column;
  cell: Cell;
  lines: TextLine[];
}
interface MeasuredRow {
  cells: MeasuredCell[];
  height: number;
}

function measuredRow(paper: Paper, { columns, rowHeight }: Table, row: readonly Cell[]): MeasuredRow {
  const cells = row.flatMap((cell, nth) => {
    const column = columns[nth];
    if (!column) return [];
    return [{ column, cell, lines: paper.wrap(cell.pieces, column.width - (cell.mark?.width ?? 0)) }];
  });
  const most = Math.max(1, ...cells.map(({ lines }) => lines.length));
  return { cells, height: most === 1 ? rowHeight : most * LEADING + 2 * PADDING };
}

/** Height of the table on one page. */
export function tableHeight(paper: Paper, table: Table): number {
  const rows = table.rows.map((row) => measuredRow(paper, table, row).height);
  return rows.reduce((sum, height) => sum + height, HEAD_HEIGHT);
}

function drawCell(paper: Paper, { column, cell, lines }: MeasuredCell, left: number, top: number): void {
  lines.forEach((line, nth) => {
    const start = left + column.x + (cell.mark?.width ?? 0);
    const x = column.align === 'right' ? left + column.x + column.width - line.width : start;
    paper.line(line.pieces, x, top + nth * LEADING, LEADING);
  });
}

function drawRow(paper: Paper, table: Table, row: MeasuredRow): Element {
  const { doc } = paper;
  const tall = row.cells.some(({ lines }) => lines.length > 1);
  const top = paper.y + (tall ? PADDING : (row.height - LEADING) / 2);
  for (const { cell, column } of row.cells) {
    const { mark } = cell;
    if (mark) paper.artifact(() => mark.draw(table.x + column.x, top + LEADING - 4));
  }
  const cells = row.cells.map((cell) => doc.struct('TD', {}, () => drawCell(paper, cell, table.x, top)));
  return doc.struct('TR', {}, cells);
}

function drawHead(paper: Paper, { columns, x }: Table): (() => void)[] {
  const style = STYLES.columnHead;
  return columns.map((column) => () => {
    const width = paper.measure({ text: column.head, style });
    const at = column.align === 'right' ? x + column.x + column.width - width : x + column.x;
    paper.line([{ text: column.head, style }], at, paper.y + (HEAD_HEIGHT - style.leading) / 2, style.leading);
  });
}

function finishHead(paper: Paper, table: Table): void {
  paper.rule(table.x, paper.y + HEAD_HEIGHT - 1, table.width, LINE_2);
  paper.advance(HEAD_HEIGHT);
}

/** Draws a table from paper.y down; a row stays on one page, and the head is repeated on each page. */
export function drawTable(paper: Paper, parent: Element, table: Table): void {
  const { doc } = paper;
  const element = doc.struct('Table');
  parent.add(element);
  const heads = drawHead(paper, table).map((draw) => doc.struct('TH', COLUMN_HEAD, draw));
  element.add(doc.struct('TR', {}, heads));
  finishHead(paper, table);
  for (const cells of table.rows) {
    const row = measuredRow(paper, table, cells);
    const { page } = doc;
    paper.keepTogether(row.height);
    if (doc.page !== page) {
      paper.artifact(() => drawHead(paper, table).forEach((draw) => draw()), 'Pagination');
      finishHead(paper, table);
    }
    element.add(drawRow(paper, table, row));
    paper.rule(table.x, paper.y + row.height - 1, table.width, LINE);
    paper.advance(row.height);
  }
  element.end();
}
