import { AQLS, CODE_LETTERS, type Aql, type PlanLetter } from './scheme';

/** A cell of a master table: a plan's numbers, an arrow to the plan below or above, or nothing printed. */
export type MasterCell = { acceptance: number; rejection: number } | 'down' | 'up' | 'blank';

/** A row of a master table: its letter, its sample size in units and one cell for each AQL. */
export interface MasterRow {
  letter: PlanLetter;
  sampleSize: number;
  cells: ReadonlyMap<Aql, MasterCell>;
}

/** A master table, rows in the order of the printed page. */
export type MasterTable = readonly MasterRow[];

const SIGNS: Readonly<Record<string, MasterCell>> = { v: 'down', '^': 'up', '.': 'blank' };

function readCell(text: string): MasterCell {
  const sign = SIGNS[text];
  if (sign !== undefined) return sign;
  const [acceptance, rejection] = text.split('/').map(Number);
  if (acceptance === undefined || !Number.isInteger(acceptance)) throw new RangeError(`Master table cell "${text}"`);
  return { acceptance, rejection: rejection ?? acceptance + 1 };
}

function readRow(line: string): MasterRow {
  const [name, size, ...texts] = line.trim().split(/\s+/);
  const letter = ([...CODE_LETTERS, 'S'] as const).find((known) => known === name);
  if (letter === undefined || texts.length !== AQLS.length) throw new RangeError(`Master table row "${line}"`);
  const cells = texts.map(readCell);
  return {
    letter,
    sampleSize: Number(size),
    cells: new Map(AQLS.map((aql, column) => [aql, cells[column] ?? 'blank'])),
  };
}

/**
 * Reads a master table written as on the printed page: a head line of AQLs, then letter, sample size and cells.
 *
 * @throws {RangeError} where a row or a cell is not of that form
 */
export function readMasterTable(text: string): MasterTable {
  const [, ...lines] = text.trim().split('\n');
  return lines.map(readRow);
}
