import { Problem } from '#server/problems';

export interface PageQuery {
  after?: string | undefined;
  limit: number;
}
export interface Page<T> {
  items: T[];
  next: string | null;
}

/** The place of a page is the id of the last row before it. */
export function idOf(cursor: string): number {
  const id = Number(cursor);
  if (!Number.isSafeInteger(id) || id < 1)
    throw new Problem(400, 'not-the-shape', 'The place in the list was not understood.', [
      { path: ['after'], message: 'Take this from the page before.' },
    ]);
  return id;
}

/** Rows come newest first; one row more than asked for tells whether another page follows. */
export function pageOfRows<Row extends { id: number }, T>(rows: Row[], limit: number, show: (row: Row) => T): Page<T> {
  const shown = rows.slice(0, limit);
  const last = shown.at(-1);
  return { items: shown.map(show), next: rows.length > limit && last ? String(last.id) : null };
}
