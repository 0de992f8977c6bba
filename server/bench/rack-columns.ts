import { type RackPreview } from '#shared/contract/bench';
import { type Characteristic } from '#shared/contract/plans';
import { type RackTable } from './rack-table';

type Fault = RackPreview['faults'][number];

/** A column of a rack file that holds readings. */
export interface RackColumn {
  header: string;
  index: number;
  characteristic: { id: number; content: Characteristic };
}

/** What the columns of a file are understood by. */
interface ColumnTarget {
  characteristics: readonly { id: number; content: Characteristic }[];
  mapping: Readonly<Record<string, string | null>>;
}

/** What a heading stands for where it is the number of the unit. */
export const UNIT = 'unit';

/** What a heading means: a key, the unit's number, or null for a column to be skipped. */
function meaningOf(header: string, { mapping }: ColumnTarget): string | null {
  return Object.hasOwn(mapping, header) ? (mapping[header] ?? null) : header;
}

function columnFault(
  header: string,
  meaning: string,
  target: ColumnTarget,
  seen: { headers: ReadonlySet<string>; meanings: ReadonlyMap<string, string> },
): string | undefined {
  if (header === '') return 'A column has no name.';
  if (seen.headers.has(header)) return `Two columns are named ${header}.`;
  const before = seen.meanings.get(meaning);
  if (before !== undefined) return `${before} and ${header} both stand for ${meaning}.`;
  if (meaning === UNIT) return undefined;
  const found = target.characteristics.find(({ content }) => content.key === meaning);
  if (!found) return `The plan has no characteristic ${meaning}.`;
  if (found.content.kind === 'computed') return `${found.content.name} is computed from other readings; leave it out.`;
  return undefined;
}

/** The columns of a table as the plan understands them, with what is wrong with its head. */
export function columnsOf(table: Extract<RackTable, { state: 'table' }>, target: ColumnTarget) {
  const faults: Fault[] = [];
  const columns: RackColumn[] = [];
  const headers = new Set<string>();
  const meanings = new Map<string, string>();
  table.headers.forEach((header, index) => {
    const meaning = meaningOf(header, target);
    if (meaning === null) return;
    const message = columnFault(header, meaning, target, { headers, meanings });
    headers.add(header);
    if (message !== undefined) {
      faults.push({ line: table.headerLine, column: header || null, message });
      return;
    }
    meanings.set(meaning, header);
    const characteristic = target.characteristics.find(({ content }) => content.key === meaning);
    if (characteristic) columns.push({ header, index, characteristic });
  });
  const unitHeader = meanings.get(UNIT) ?? UNIT;
  if (!meanings.has(UNIT)) {
    const message = 'The column unit is missing: the number of the unit in draw order.';
    faults.push({ line: table.headerLine, column: UNIT, message });
  }
  return { columns, faults, unitIndex: meanings.has(UNIT) ? table.headers.indexOf(unitHeader) : -1, unitHeader };
}
