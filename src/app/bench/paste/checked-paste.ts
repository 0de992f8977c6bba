import { type ReadingEntry } from '#shared/contract/bench';
import { type Characteristic } from '#shared/contract/plans';
import { type LotVerdict, type UnitVerdict } from '#shared/verdict/sample-verdict';
import { type ReadingValue } from '../sheet/bench-reading';

/** A pasted cell: what it was read as, or why it cannot be kept. */
export interface CheckedCell {
  readonly unit: number;
  readonly characteristic: Characteristic;
  readonly text: string;
  /** What can be kept, at once or with a reason; null where it cannot. */
  readonly reading: {
    readonly entry: ReadingEntry;
    readonly value: ReadingValue;
    readonly rangeId: number | null;
  } | null;
  /** "question" is far from what the part can give; "skipped" needs no keeping, as the program computes it. */
  readonly state: 'good' | 'question' | 'fault' | 'skipped';
  /** Why it is questioned, skipped or faulty. */
  readonly why: string;
}

/** A pasted block, checked. */
export interface CheckedPaste {
  readonly headed: boolean;
  readonly columns: readonly Characteristic[];
  readonly rows: readonly {
    readonly unit: number;
    /** By characteristic. */
    readonly cells: ReadonlyMap<string, CheckedCell>;
    /** The unit's verdict as if all that can be kept were. */
    readonly verdict: UnitVerdict;
  }[];
  /** What lies on nothing in the grid. */
  readonly outside: readonly string[];
  readonly lot: LotVerdict;
}

/** The cells of a block in one state. */
export function cellsIn(checked: CheckedPaste, state: CheckedCell['state']): CheckedCell[] {
  return checked.rows.flatMap(({ cells }) => [...cells.values()].filter((cell) => cell.state === state));
}
