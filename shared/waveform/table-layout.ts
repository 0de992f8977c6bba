import { SECOND_SCALES, unitInName, unitOf, VOLT_SCALES } from './column-unit';
import { DIALECTS, isNumeral, rowFields, type Dialect } from './row-fields';
import { WaveformNotUnderstood } from './waveform-not-understood';

/** How the table of a waveform file lies in it. */
export interface TableLayout extends Dialect {
  /** Rows above the first of numbers. */
  headRows: number;
  /** Place of the column of instants, and its unit in seconds. */
  time: { column: number; scale: number };
  /** The other columns, each with the name it is chosen by, and its unit in volts. */
  channels: { name: string; column: number; scale: number }[];
}

interface Reading extends Dialect {
  rows: string[][];
  /** Whether a row begins with a number and holds another. */
  isData: boolean[];
  score: number;
}

function readAs(lines: readonly string[], dialect: Dialect): Reading {
  const rows = lines.map((line) => rowFields(line, dialect.delimiter));
  const numerals = rows.map((fields) => fields.map((field) => isNumeral(field, dialect.decimal)));
  const isData = numerals.map((are) => are[0] === true && are.filter(Boolean).length > 1);
  // A column of words beside the numbers does no harm, yet a reading in which all fields are numbers is the better one.
  const worth = (are: readonly boolean[]): number => (are.every(Boolean) ? 1 : 0.01);
  const score = numerals.reduce((sum, are, at) => (isData[at] ? sum + worth(are) : sum), 0);
  return { ...dialect, rows, isData, score };
}

/** Why a text without rows of numbers is no waveform. */
function refusal(lines: readonly string[]): WaveformNotUnderstood {
  const numerals = lines.filter((line) => isNumeral(line.trim(), '.') || isNumeral(line.trim(), ','));
  if (numerals.length > 1)
    return new WaveformNotUnderstood(
      'The file has one column of numbers. A waveform needs two: the time and the voltage of each sample.',
    );
  return new WaveformNotUnderstood(
    'The file has no rows of numbers. A waveform is a table (CSV) with the time and the voltage of each sample.',
  );
}

/**
 * The first row of numbers. A row above it that begins with a number belongs to the table as well, so that its fault is
 * named instead of its being taken for a heading.
 */
function firstRow({ rows, isData, decimal }: Reading): number {
  const counts = new Map<number, number>();
  rows.forEach(({ length }, at) => isData[at] && counts.set(length, (counts.get(length) ?? 0) + 1));
  const usual = [...counts].reduce((most, one) => (one[1] > most[1] ? one : most))[0];
  let first = rows.findIndex(({ length }, at) => isData[at] && length === usual);
  const above = () => rows[first - 1];
  while ((above()?.length ?? 0) > 1 && isNumeral(above()?.[0] ?? '', decimal)) first -= 1;
  return first;
}

/** Names and units of the columns, out of the last rows above the numbers. */
function headings(head: readonly string[][], columns: number): { names: string[]; units: string[] } {
  const fitting = head.filter((fields) => fields.length === columns && fields.some((field) => field !== ''));
  const last = fitting.at(-1) ?? [];
  if (last.length === 0 || !last.every((field) => unitOf(field) !== '')) return { names: last, units: [] };
  return { names: fitting.at(-2) ?? [], units: last };
}

function timeColumn(names: readonly string[]): number {
  return Math.max(
    0,
    names.findIndex((name) => /^(time|t|seconds?)\b|^time_/i.test(name)),
  );
}

/** Every channel can be told from the others: what has no name of its own is called by its place. */
function distinctNames(names: readonly string[], columns: number): string[] {
  return Array.from({ length: columns }, (_, at) => {
    const name = names[at]?.slice(0, 80) ?? '';
    return name === '' || names.indexOf(names[at] ?? '') !== at ? `Column ${at + 1}` : name;
  });
}

/**
 * Finds the table in the first rows of a file: any delimiter, a decimal point or comma, rows of headings above it.
 *
 * @throws {WaveformNotUnderstood} where there is none
 */
export function tableLayout(lines: readonly string[]): TableLayout {
  const reading = DIALECTS.map((dialect) => readAs(lines, dialect)).reduce((best, one) =>
    one.score > best.score ? one : best,
  );
  if (reading.score === 0) throw refusal(lines);
  const headRows = firstRow(reading);
  const columns = reading.rows[headRows]?.length ?? 0;
  const { names, units } = headings(reading.rows.slice(0, headRows), columns);
  const time = timeColumn(names);
  const scaleOf = (column: number, scales: ReadonlyMap<string, number>) =>
    scales.get(unitOf(units[column] ?? '') || unitInName(names[column] ?? '')) ?? 1;
  const channels = distinctNames(names, columns)
    .map((name, column) => ({ name, column, scale: scaleOf(column, VOLT_SCALES) }))
    .filter(({ column }) => column !== time);
  const { delimiter, decimal } = reading;
  return { delimiter, decimal, headRows, time: { column: time, scale: scaleOf(time, SECOND_SCALES) }, channels };
}
