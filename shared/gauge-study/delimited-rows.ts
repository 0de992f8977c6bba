/** A row of a delimited text, with the line it begins on, from 1. */
export interface DelimitedRow {
  line: number;
  cells: string[];
}

/** A delimited text that cannot be read. */
export class DelimitedTextFault extends RangeError {
  override readonly name = 'DelimitedTextFault';

  constructor(
    /** Line of the fault, from 1. */
    readonly line: number,
  ) {
    super('A quoted field is not closed, or quotes stand inside a field.');
  }
}

/** A delimited text as rows, and what parts its cells. */
export interface DelimitedText {
  delimiter: ',' | ';' | '\t';
  rows: DelimitedRow[];
}

const DELIMITERS = [',', ';', '\t'] as const;

/** The delimiter is the one of the three usual ones that the first line has most of. */
function delimiterOf(text: string): DelimitedText['delimiter'] {
  const [first = ''] = /^.*\S.*$/m.exec(text) ?? [];
  const count = (delimiter: string) => first.split(delimiter).length;
  return DELIMITERS.reduce((best, one) => (count(one) > count(best) ? one : best));
}

function lineBreaks(text: string): number {
  return text.match(/\r\n|\r|\n/g)?.length ?? 0;
}

function unquoted(cell: string): string {
  return cell.startsWith('"') ? cell.slice(1, -1).replaceAll('""', '"') : cell.trim();
}

/**
 * Reads a comma-, semicolon- or tab-separated text: RFC 4180 quoting, a byte order mark tolerated, empty lines skipped.
 *
 * @throws {DelimitedTextFault}
 */
export function delimitedText(text: string): DelimitedText {
  const source = text.replace(/^\ufeff/, '');
  const delimiter = delimiterOf(source);
  const cell = new RegExp(`("(?:[^"]|"")*"|[^"${delimiter}\\r\\n]*)(${delimiter}|\\r\\n|\\r|\\n|$)`, 'y');
  const rows: DelimitedRow[] = [];
  let row: DelimitedRow = { line: 1, cells: [] };
  let line = 1;
  for (let at = 0; at < source.length; at = cell.lastIndex) {
    const [matched = '', content = '', end = ''] = cell.exec(source) ?? [];
    if (matched === '') throw new DelimitedTextFault(line);
    row.cells.push(unquoted(content));
    line += lineBreaks(matched);
    if (end === delimiter) continue;
    rows.push(row);
    row = { line, cells: [] };
  }
  if (row.cells.length > 0) rows.push({ ...row, cells: [...row.cells, ''] });
  return { delimiter, rows: rows.filter(({ cells }) => cells.some((one) => one !== '')) };
}
