/** A place in a study, each counted from 0. */
export interface StudyCell {
  part: number;
  person: number;
  trial: number;
}

/** What a study crosses. */
export interface StudyPlan {
  parts: readonly string[];
  persons: readonly string[];
  trials: number;
}

/** A text for a cell, as typed. */
export interface PlacedText {
  cell: StudyCell;
  text: string;
}

/** A cell as people call it: "Unit 3, I. Sandvær, trial 2". */
export function cellName({ parts, persons }: StudyPlan, { part, person, trial }: StudyCell): string {
  return `${parts[part] ?? ''}, ${persons[person] ?? ''}, trial ${String(trial + 1)}`;
}

/** The column of a cell in a table whose columns are the trials of each person in turn, from 0. */
export function columnOf({ trials }: StudyPlan, { person, trial }: StudyCell): number {
  return person * trials + trial;
}

/** The cell in a row and a column of that table. */
export function cellAt({ trials }: StudyPlan, part: number, column: number): StudyCell {
  return { part, person: Math.floor(column / trials), trial: column % trials };
}
