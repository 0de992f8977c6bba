import { formatNumber } from '#shared/quantities/format-number';
import { CsvError, parse } from 'csv-parse/sync';

/**
 * What a rack file holds at most, rows and columns: several times the largest sample of the tables and the characteristics
 * of a plan, and few enough to name every fault.
 */
const MOST_ROWS = 10_000;
const MOST_COLUMNS = 200;
/** The longest row, in characters. */
const LONGEST_ROW = 20_000;

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
  const [header = ''] = /^.*\S.*$/m.exec(text) ?? [];
  const counted = [',', ';', '\t'].map((delimiter) => ({ delimiter, count: header.split(delimiter).length }));
  return counted.reduce((best, one) => (one.count > best.count ? one : best)).delimiter;
}

function lineOf(error: unknown): number {
  return typeof error === 'object' && error !== null && 'lines' in error && typeof error.lines === 'number'
    ? error.lines
    : 1;
}

function noTable(line: number, message: string): RackTable {
  return { state: 'no table', line, message };
}

/** csv-parse names its options where it refuses; our words name what is wrong with the file. */
function whyNot(error: unknown): RackTable {
  const tooLong = error instanceof CsvError && error.code === 'CSV_MAX_RECORD_SIZE';
  return noTable(
    lineOf(error),
    tooLong ? 'This row is too long for readings.' : 'A quoted field is not closed, or quotes stand inside a field.',
  );
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
      to: MOST_ROWS + 2,
      max_record_size: LONGEST_ROW,
    }) as unknown as { record: string[]; info: { lines: number } }[];
    const rows = parsed.map(({ record, info }) => ({ line: info.lines, cells: record }));
    const [header, ...body] = rows;
    if (!header || body.length === 0) return noTable(1, 'The file holds no rows of readings.');
    if (header.cells.length > MOST_COLUMNS)
      return noTable(header.line, `${formatNumber(header.cells.length, 0)} columns are more than a plan can have.`);
    if (body.length > MOST_ROWS) return noTable(1, `The file has more than ${formatNumber(MOST_ROWS, 0)} rows.`);
    return {
      state: 'table',
      headers: header.cells,
      headerLine: header.line,
      rows: body,
      decimalComma: delimiter === ';',
    };
  } catch (error) {
    return whyNot(error);
  }
}
