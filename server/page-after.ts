import { Problem } from './problems';

/** Which page of a list is asked for. */
export interface PageQuery {
  after?: string | undefined;
  limit: number;
}
export interface Page<T> {
  items: T[];
  next: string | null;
}

/** The place in a list is not understood: it is taken from the page before, never made up. */
export function cursorFault(): Problem {
  return new Problem(400, 'not-the-shape', 'The place in the list was not understood.', [
    { path: ['after'], message: 'Take this from the page before.' },
  ]);
}

/**
 * A page of a list that is ordered by id, newest first. The cursor is the id of the last line of the page before.
 *
 * @param read reads at most `limit` lines with ids below `before` (all, when undefined)
 * @throws {Problem} for a cursor that is no id
 */
export function pageAfter<T extends { id: number }>(
  page: PageQuery,
  read: (before: number | undefined, limit: number) => T[],
): Page<T> {
  const before = page.after === undefined ? undefined : Number(page.after);
  if (before !== undefined && (!Number.isSafeInteger(before) || before < 1)) throw cursorFault();
  const rows = read(before, page.limit + 1);
  const items = rows.slice(0, page.limit);
  return { items, next: rows.length > page.limit ? String(items.at(-1)?.id) : null };
}
