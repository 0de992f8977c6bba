import { Refused } from '#server/problems';
import { type PlausibilityQuestion, type RackPreview } from '#shared/contract/bench';
import { type Characteristic } from '#shared/contract/plans';
import { readingReader } from '#shared/quantities/parse-reading';
import { type ReadingFacts } from './reading-facts';
import { columnsOf, type RackColumn } from './rack-columns';
import { type RackTable } from './rack-table';

type Fault = RackPreview['faults'][number];
type Measured = Extract<Characteristic, { kind: 'measured' }>;

/** What goes with a reading beside its value. */
export type RackFacts = ReadingFacts & { question: PlausibilityQuestion | null };

/** One reading of a rack file. Value in SI base units, or pass or fail. */
export interface RackReading extends RackFacts {
  unit: number;
  characteristic: RackColumn['characteristic'];
  value: number | null;
  pass: boolean | null;
}

/** What a rack file holds and what is wrong with it; only a file without faults is imported. */
export interface RackContent {
  columns: RackPreview['columns'];
  rows: number;
  readings: RackReading[];
  faults: Fault[];
}

export interface RackTarget {
  characteristics: readonly { id: number; content: Characteristic }[];
  sampleSize: number;
  /** What the file's headings mean; a heading not named is a key itself. */
  mapping: Readonly<Record<string, string | null>>;
  /** Whether a unit has a counting reading of a characteristic already. */
  hasReading(unit: number, characteristicId: number): boolean;
  /** Whether the reading was taken, and taken back, as often as it may be. */
  isUsedUp(unit: number, characteristicId: number): boolean;
  /** Range, uncertainty and plausibility of a value. @throws {Refused} for one that its instrument cannot have shown */
  factsOf(characteristic: Measured, value: number): RackFacts;
}

/** What is shown of a column so that people know it again. */
const SAMPLED = 3;
const LONGEST_SAMPLE = 40;

const NO_FACTS: RackFacts = { rangeId: null, expandedUncertainty: null, question: null };

function unitOf(text: string, sampleSize: number, seen: ReadonlyMap<number, number>): number | string {
  if (!/^\d{1,7}$/.test(text)) return `"${text}" is not a unit number.`;
  const unit = Number(text);
  if (unit < 1 || unit > sampleSize) return `Unit ${unit} is not in the sample of ${sampleSize}.`;
  const before = seen.get(unit);
  return before === undefined ? unit : `Unit ${unit} stands on line ${before} already.`;
}

const PASS = new Map([
  ['pass', true],
  ['p', true],
  ['fail', false],
  ['f', false],
]);

type CellValue = { value: number | null; pass: boolean | null } & RackFacts;

/** Reads a cell of one column. @throws {RangeError | Refused} saying what is wrong with it */
type CellReader = (text: string) => CellValue;

function passOrFail(text: string): CellValue {
  const pass = PASS.get(text.toLowerCase());
  if (pass === undefined) throw new RangeError(`"${text}" is neither pass nor fail.`);
  return { value: null, pass, ...NO_FACTS };
}

/** A column is looked at once; its cells are many. */
function cellReader({ content }: RackColumn['characteristic'], decimalComma: boolean, target: RackTarget): CellReader {
  if (content.kind !== 'measured') return passOrFail;
  const read = readingReader(content.unit);
  return (text) => {
    const value = read(text, { decimalComma });
    return { value, pass: null, ...target.factsOf(content, value) };
  };
}

/** Why the cell of a unit takes no reading now; undefined where it does. */
function cellFault(unit: number, id: number, target: RackTarget): string | undefined {
  if (target.hasReading(unit, id)) return `Unit ${unit} has this reading already.`;
  if (target.isUsedUp(unit, id)) return `Unit ${unit} has had this reading three times; set the unit aside.`;
  return undefined;
}

function readingOf(
  cell: { unit: number; text: string; column: RackColumn; read: CellReader },
  target: RackTarget,
): RackReading | string {
  const { unit, text, column, read } = cell;
  const { characteristic } = column;
  const fault = cellFault(unit, characteristic.id, target);
  if (fault !== undefined) return fault;
  try {
    return { unit, characteristic, ...read(text) };
  } catch (error) {
    if (error instanceof RangeError) return error.message;
    if (error instanceof Refused) return error.title;
    throw error;
  }
}

/** Reads the cells of a rack file against the plan. An empty cell is a reading not taken; every other fault is named. */
export function rackReadings(table: Extract<RackTable, { state: 'table' }>, target: RackTarget): RackContent {
  const { columns, faults, unitIndex, unitHeader } = columnsOf(table, target);
  const readers = columns.map((column) => ({
    column,
    read: cellReader(column.characteristic, table.decimalComma, target),
  }));
  const seen = new Map<number, number>();
  const readings: RackReading[] = [];
  for (const { line, cells } of table.rows) {
    if (cells.length !== table.headers.length) {
      const message = `${cells.length} columns, where the head has ${table.headers.length}.`;
      faults.push({ line, column: null, message });
      continue;
    }
    const unit = unitIndex < 0 ? '' : unitOf(cells[unitIndex] ?? '', target.sampleSize, seen);
    if (typeof unit === 'string') {
      if (unitIndex >= 0) faults.push({ line, column: unitHeader, message: unit });
      continue;
    }
    seen.set(unit, line);
    for (const { column, read } of readers) {
      const text = cells[column.index] ?? '';
      if (text === '') continue;
      const found = readingOf({ unit, text, column, read }, target);
      if (typeof found === 'string') faults.push({ line, column: column.header, message: found });
      else readings.push(found);
    }
  }
  return {
    columns: table.headers.map((header, index) => ({
      header,
      characteristicKey: columns.find((column) => column.index === index)?.characteristic.content.key ?? null,
      samples: table.rows.slice(0, SAMPLED).map(({ cells }) => (cells[index] ?? '').slice(0, LONGEST_SAMPLE)),
    })),
    rows: table.rows.length,
    readings,
    faults: faults.sort((a, b) => a.line - b.line),
  };
}
