import { pastedRows } from '../bench/pasted-cells';
import { cellAt, cellName, columnOf, type PlacedText, type StudyCell, type StudyPlan } from './study-cell';

/** A block of a spreadsheet set into a study, or the sentence that says why it was not. */
export type StudyBlock = { state: 'placed'; texts: PlacedText[] } | { state: 'refused'; message: string };

function plural(count: number, one: string): string {
  return `${String(count)} ${one}${count === 1 ? '' : 's'}`;
}

/**
 * Sets a block copied from a spreadsheet, its cells parted by tabs, into the table of a study from one cell on. A block that
 * reaches beyond the table is not placed at all, so that no reading slips into another's place; its empty cells change nothing.
 */
export function studyBlock(text: string, from: StudyCell, plan: StudyPlan): StudyBlock {
  const rows = pastedRows(text);
  const column = columnOf(plan, from);
  const wide = Math.max(0, ...rows.map(({ length }) => length));
  const left = { rows: plan.parts.length - from.part, columns: plan.persons.length * plan.trials - column };
  if (rows.length > left.rows || wide > left.columns)
    return {
      state: 'refused',
      message:
        `The block has ${plural(rows.length, 'row')} and ${plural(wide, 'column')}; from ${cellName(plan, from)} on ` +
        `there is room for ${plural(left.rows, 'row')} and ${plural(left.columns, 'column')}. Nothing was placed.`,
    };
  const texts = rows.flatMap((cells, down) =>
    cells.map((cell, right) => ({ cell: cellAt(plan, from.part + down, column + right), text: cell })),
  );
  return { state: 'placed', texts: texts.filter((placed) => placed.text !== '') };
}
