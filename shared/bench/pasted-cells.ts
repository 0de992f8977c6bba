/** A column of the measuring grid, as far as a pasted block needs it. */
export interface PasteColumn {
  readonly key: string;
  readonly name: string;
}

/** A cell of a pasted block, laid onto the grid. */
export interface PastedCell {
  /** Number of the unit in draw order. */
  readonly unit: number;
  readonly key: string;
  /** As it stood in the spreadsheet. */
  readonly text: string;
}

/** A cell, a row or a column of a block that lies on nothing in the grid, with the reason in words. */
export interface PasteFault {
  /** Row of the block, from 1; null for a whole column. */
  readonly row: number | null;
  readonly message: string;
}

/** A block laid onto the grid. */
export interface PastedBlock {
  /** Whether its first row was read as names of characteristics. */
  readonly headed: boolean;
  readonly cells: readonly PastedCell[];
  readonly faults: readonly PasteFault[];
}

/** Where a block without names begins, and what it can lie on. */
export interface PasteTarget {
  readonly units: number;
  readonly columns: readonly PasteColumn[];
  /** The cell in focus: unit from 1, column from 0. */
  readonly from: { readonly unit: number; readonly column: number };
}

/** What a column of the block means: a characteristic, the unit's number, or nothing here. */
type Meaning = { readonly key: string } | 'unit' | null;

/**
 * The cells of text copied from a spreadsheet: rows on lines, columns between tabs, a cell with a tab or a line break in double
 * quotes, which are doubled inside. Empty rows at the end are left out.
 */
export function pastedRows(text: string): string[][] {
  const rows: string[][] = [[]];
  const cells = /(?:"((?:[^"]|"")*)"|([^\t\r\n]*))(\t|\r\n|\n|\r|$)/g;
  for (const [all, quoted, plain = '', end] of text.matchAll(cells)) {
    if (all === '' && end === '' && rows.at(-1)?.length === 0) break;
    rows.at(-1)?.push((quoted?.replaceAll('""', '"') ?? plain).trim());
    if (end === '') break;
    if (end !== '\t') rows.push([]);
  }
  while (rows.length > 0 && rows.at(-1)?.every((cell) => cell === '')) rows.pop();
  return rows;
}

/**
 * Lays a block of cells onto the grid: from the cell in focus down and to the right, or by the names in its first row, which may
 * name the unit's number too. Empty cells are passed over.
 */
export function pastedCells(rows: readonly (readonly string[])[], target: PasteTarget): PastedBlock {
  const [first = []] = rows;
  const named = first.map((cell) => meaningOf(cell, target.columns));
  const headed = named.some((meaning) => meaning !== null && meaning !== 'unit');
  return headed ? headedBlock(rows, first, named, target) : bareBlock(rows, target);
}

function meaningOf(cell: string, columns: readonly PasteColumn[]): Meaning {
  const text = plain(cell);
  if (['unit', 'unit no', 'no', '#', 'nr'].includes(text)) return 'unit';
  const column = columns.find(({ key, name }) => plain(key) === text || plain(name) === text);
  return column === undefined ? null : { key: column.key };
}

/** A heading without its unit in brackets, case and points. */
function plain(heading: string): string {
  return heading
    .replace(/[([].*$/, '')
    .replaceAll(/[.:_\s]+/g, ' ')
    .trim()
    .toLowerCase();
}

function headedBlock(
  rows: readonly (readonly string[])[],
  headings: readonly string[],
  meanings: readonly Meaning[],
  target: PasteTarget,
): PastedBlock {
  const faults: PasteFault[] = headings.flatMap((heading, index) =>
    meanings[index] === null && heading !== ''
      ? [{ row: null, message: `The plan has no characteristic “${heading}”.` }]
      : [],
  );
  const unitColumn = meanings.indexOf('unit');
  const cells = rows.slice(1).flatMap((row, index) => {
    const number = unitColumn < 0 ? String(target.from.unit + index) : (row[unitColumn] ?? '');
    const unit = unitOf(number, index + 2, target, faults);
    if (unit === null) return [];
    return row.flatMap((text, column) => {
      const meaning = meanings[column] ?? null;
      return meaning === null || meaning === 'unit' || text === '' ? [] : [{ unit, key: meaning.key, text }];
    });
  });
  return { headed: true, cells, faults };
}

function unitOf(number: string, row: number, { units }: PasteTarget, faults: PasteFault[]): number | null {
  const unit = /^\d+$/.test(number) ? Number(number) : Number.NaN;
  if (unit >= 1 && unit <= units) return unit;
  const what =
    number === '' ? 'The number of the unit is missing.' : `Unit ${number} is not in the sample of ${units}.`;
  faults.push({ row, message: what });
  return null;
}

function bareBlock(rows: readonly (readonly string[])[], { units, columns, from }: PasteTarget): PastedBlock {
  const faults: PasteFault[] = [];
  const cells = rows.flatMap((row, index) => {
    const unit = from.unit + index;
    if (unit > units) {
      if (row.some((text) => text !== ''))
        faults.push({ row: index + 1, message: `Unit ${unit} is not in the sample of ${units}.` });
      return [];
    }
    return row.flatMap((text, offset) => {
      const column = columns[from.column + offset];
      if (text === '') return [];
      if (column !== undefined) return [{ unit, key: column.key, text }];
      faults.push({ row: index + 1, message: `“${text}” lies beyond the last characteristic.` });
      return [];
    });
  });
  return { headed: false, cells, faults };
}
