import { readingReader } from '../quantities/parse-reading';
import { delimitedText, DelimitedTextFault, type DelimitedRow } from './delimited-rows';
import { cellName, type PlacedText, type StudyCell, type StudyPlan } from './study-cell';

/** What is wrong with a line of a file. */
export interface LineFault {
  line: number;
  message: string;
}

/** A file as far as it could be placed, and what is wrong with the rest. */
export interface StudyFile {
  texts: PlacedText[];
  faults: LineFault[];
}

const COLUMNS = ['part', 'person', 'trial', 'value'] as const;
type Column = (typeof COLUMNS)[number];
type Line = Record<Column, string>;

/** The most lines that are looked at: the largest study, several times over. */
const MOST_LINES = 20_000;

const same = (name: string) => name.normalize('NFC').toLowerCase();

function indexOf(names: readonly string[], name: string): number {
  return names.findIndex((one) => same(one) === same(name));
}

function cellOf({ part, person, trial }: Line, plan: StudyPlan): StudyCell | string {
  const cell = { part: indexOf(plan.parts, part), person: indexOf(plan.persons, person), trial: Number(trial) - 1 };
  if (cell.part < 0) return `“${part}” is no part of this study.`;
  if (cell.person < 0) return `“${person}” is no person of this study.`;
  if (!/^\d+$/.test(trial) || cell.trial < 0 || cell.trial >= plan.trials)
    return `“${trial}” is no trial of this study: they are numbered 1 to ${String(plan.trials)}.`;
  return cell;
}

/** How the study's table reads and shows numbers. */
export interface StudyNumbers {
  /** Display unit of the study, in which bare numbers are. */
  unit: string;
  /** A value in SI base units as the table shows it. */
  show: (value: number) => string;
}

/** The value as the table shows it; what cannot be read is placed as it stands, and its fault is named. */
function placedText(
  value: string,
  { unit, show }: StudyNumbers,
  decimalComma: boolean,
): { text: string; fault: string | null } {
  try {
    return { text: show(readingReader(unit)(value, { decimalComma })), fault: null };
  } catch (thrown) {
    if (!(thrown instanceof RangeError)) throw thrown;
    return { text: value, fault: thrown.message };
  }
}

function headerOf(row: DelimitedRow | undefined): Map<Column, number> | string {
  const heads = row?.cells.map((head) => same(head)) ?? [];
  const missing = COLUMNS.filter((column) => !heads.includes(column));
  if (missing.length > 0)
    return `The first line must name the columns ${COLUMNS.join(', ')}; missing: ${missing.join(', ')}.`;
  return new Map(COLUMNS.map((column) => [column, heads.indexOf(column)]));
}

function placeRows(
  rows: readonly DelimitedRow[],
  plan: StudyPlan,
  read: (row: DelimitedRow) => Line,
  text: (value: string) => ReturnType<typeof placedText>,
): StudyFile {
  const found: StudyFile = { texts: [], faults: [] };
  const lines = new Map<string, number>();
  for (const row of rows) {
    const line = read(row);
    const cell = cellOf(line, plan);
    const fault = (message: string) => found.faults.push({ line: row.line, message });
    if (typeof cell === 'string') {
      fault(cell);
      continue;
    }
    const name = cellName(plan, cell);
    const earlier = lines.get(name);
    if (earlier !== undefined) {
      fault(`${name} is given in line ${String(earlier)} already.`);
      continue;
    }
    lines.set(name, row.line);
    if (line.value === '') continue;
    const placed = text(line.value);
    if (placed.fault !== null) fault(`${name}: ${placed.fault}`);
    found.texts.push({ cell, text: placed.text });
  }
  return found;
}

/**
 * Reads a delimited file with the columns part, person, trial and value in any order. What is right is placed; every line
 * that is not is named. Semicolons mean that numbers have a decimal comma, as spreadsheets write it.
 *
 * @throws {UnitNotKnown}
 */
export function studyFile(text: string, plan: StudyPlan, numbers: StudyNumbers): StudyFile {
  try {
    const { delimiter, rows } = delimitedText(text);
    const [head, ...body] = rows;
    const header = headerOf(head);
    if (typeof header === 'string') return { texts: [], faults: [{ line: head?.line ?? 1, message: header }] };
    if (body.length > MOST_LINES)
      return { texts: [], faults: [{ line: 1, message: 'The file has far more lines than a study has readings.' }] };
    const at = ({ cells }: DelimitedRow, column: Column) => cells[header.get(column) ?? -1] ?? '';
    const read = (row: DelimitedRow): Line => ({
      part: at(row, 'part'),
      person: at(row, 'person'),
      trial: at(row, 'trial'),
      value: at(row, 'value'),
    });
    return placeRows(body, plan, read, (value) => placedText(value, numbers, delimiter === ';'));
  } catch (thrown) {
    if (!(thrown instanceof DelimitedTextFault)) throw thrown;
    return { texts: [], faults: [{ line: thrown.line, message: thrown.message }] };
  }
}
