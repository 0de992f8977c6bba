import { parse } from 'csv-parse/sync';

/** A row of a rack file with the line it began on. */
export interface RackRow {
  line: number;
  cells: string[];
}

/** A rack file as rows of text, or the sentence that says why it is none. */
export type RackTable =
  | { state: 'table'; headers: string[]; headerLine: number; rows: RackRow[]; decimalComma: boolean }
  | { state: 'no table'; line: number; message: string };

/** The delimiter is the one of the three usual ones that the header line has most of. */
function delimiterOf(text: string): string {
  const header = text.split(/\r\n|\r|\n/).find((line) => line.trim() !== '') ?? '';
  const counted = [',', ';', '\t'].map((delimiter) => ({ delimiter, count: header.split(delimiter).length }));
  return counted.reduce((best, one) => (one.count > best.count ? one : best)).delimiter;
}

function lineOf(error: unknown): number {
  return typeof error === 'object' && error !== null && 'lines' in error && typeof error.lines === 'number'
    ? error.lines
    : 1;
}

/**
 * Reads a comma-, semicolon- or tab-separated file (RFC 4180 quoting, byte order mark tolerated, empty lines skipped).
 * Semicolons mean that numbers have a decimal comma, as spreadsheets write it.
 */
export function rackTable(text: string): RackTable {
  const delimiter = delimiterOf(text);
  try {
    const parsed = parse(text, {
      delimiter,
      bom: true,
      info: true,
      relax_column_count: true,
      skip_empty_lines: true,
      trim: true,
    }) as unknown as { record: string[]; info: { lines: number } }[];
    const rows = parsed.map(({ record, info }) => ({ line: info.lines, cells: record }));
    const [header, ...body] = rows;
    if (!header || body.length === 0)
      return { state: 'no table', line: 1, message: 'The file holds no rows of readings.' };
    return {
      state: 'table',
      headers: header.cells,
      headerLine: header.line,
      rows: body,
      decimalComma: delimiter === ';',
    };
  } catch (error) {
    // csv-parse throws for quotes that do not close; its own words name its options, so ours are used.
    return {
      state: 'no table',
      line: lineOf(error),
      message: 'A quoted field is not closed, or quotes stand inside a field.',
    };
  }
}
