import { type RackPreview } from '#shared/contract/bench';
import { type Characteristic } from '#shared/contract/plans';
import { parseReading } from '#shared/quantities/parse-reading';
import { type RackTable } from './rack-table';

type Fault = RackPreview['faults'][number];

/** One reading of a rack file. Value in SI base units, or pass or fail. */
export interface RackReading {
  unit: number;
  characteristicId: number;
  key: string;
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
  /** Whether a unit has a counting reading of a characteristic already. */
  hasReading(unit: number, characteristicId: number): boolean;
  /** Whether the reading was taken, and taken back, as often as it may be. */
  isUsedUp(unit: number, characteristicId: number): boolean;
}

interface Column {
  header: string;
  index: number;
  characteristic: { id: number; content: Characteristic };
}

const UNIT = 'unit';

function columnFault(header: string, target: RackTarget, seen: ReadonlySet<string>): string | undefined {
  if (header === '') return 'A column has no name.';
  if (seen.has(header)) return `Two columns are named ${header}.`;
  if (header === UNIT) return undefined;
  const found = target.characteristics.find(({ content }) => content.key === header);
  if (!found) return `The plan has no characteristic ${header}.`;
  if (found.content.kind === 'computed') return `${found.content.name} is computed from other readings; leave it out.`;
  return undefined;
}

function columnsOf(table: Extract<RackTable, { state: 'table' }>, target: RackTarget) {
  const faults: Fault[] = [];
  const columns: Column[] = [];
  const seen = new Set<string>();
  table.headers.forEach((header, index) => {
    const message = columnFault(header, target, seen);
    seen.add(header);
    const characteristic = target.characteristics.find(({ content }) => content.key === header);
    if (message !== undefined) faults.push({ line: table.headerLine, column: header || null, message });
    else if (characteristic) columns.push({ header, index, characteristic });
  });
  if (!seen.has(UNIT))
    faults.push({
      line: table.headerLine,
      column: UNIT,
      message: 'The column unit is missing: the number of the unit in draw order.',
    });
  return { columns, faults };
}

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

function cellValue(
  text: string,
  content: Characteristic,
  decimalComma: boolean,
): { value: number | null; pass: boolean | null } {
  if (content.kind === 'attribute') {
    const pass = PASS.get(text.toLowerCase());
    if (pass === undefined) throw new RangeError(`"${text}" is neither pass nor fail.`);
    return { value: null, pass };
  }
  if (content.kind === 'computed') throw new RangeError(`${content.name} is computed.`);
  return { value: parseReading(text, content.unit, { decimalComma }), pass: null };
}

/** Reads the cells of a rack file against the plan. An empty cell is a reading not taken; every other fault is named. */
export function rackReadings(table: Extract<RackTable, { state: 'table' }>, target: RackTarget): RackContent {
  const { columns, faults } = columnsOf(table, target);
  const unitIndex = table.headers.indexOf(UNIT);
  const seen = new Map<number, number>();
  const readings: RackReading[] = [];
  for (const { line, cells } of table.rows) {
    if (cells.length !== table.headers.length) {
      faults.push({
        line,
        column: null,
        message: `${cells.length} columns, where the head has ${table.headers.length}.`,
      });
      continue;
    }
    const unit = unitIndex < 0 ? '' : unitOf(cells[unitIndex] ?? '', target.sampleSize, seen);
    if (typeof unit === 'string') {
      if (unitIndex >= 0) faults.push({ line, column: UNIT, message: unit });
      continue;
    }
    seen.set(unit, line);
    for (const { header, index, characteristic } of columns) {
      const text = cells[index] ?? '';
      if (text === '') continue;
      const { id, content } = characteristic;
      if (target.hasReading(unit, id)) {
        faults.push({ line, column: header, message: `Unit ${unit} has this reading already.` });
        continue;
      }
      if (target.isUsedUp(unit, id)) {
        const message = `Unit ${unit} has had this reading three times; set the unit aside.`;
        faults.push({ line, column: header, message });
        continue;
      }
      try {
        readings.push({ unit, characteristicId: id, key: header, ...cellValue(text, content, table.decimalComma) });
      } catch (error) {
        if (!(error instanceof RangeError)) throw error;
        faults.push({ line, column: header, message: error.message });
      }
    }
  }
  return {
    columns: table.headers.map((header) => ({
      header,
      characteristicKey: columns.find((column) => column.header === header)?.header ?? null,
    })),
    rows: table.rows.length,
    readings,
    faults: faults.sort((a, b) => a.line - b.line),
  };
}
