import { Refused } from './problems';

/**
 * A page of a list that is ordered by id, newest first. The cursor is the id of the last line of the page before.
 *
 * @param read reads at most `limit` lines with ids below `before` (all, when undefined)
 * @throws {Refused} for a cursor that is no id
 */
export function pageAfter<T extends { id: number }>(
  page: { after?: string | undefined; limit: number },
  read: (before: number | undefined, limit: number) => T[],
): { items: T[]; next: string | null } {
  const before = page.after === undefined ? undefined : Number(page.after);
  if (before !== undefined && !Number.isSafeInteger(before))
    throw new Refused('cursor-not-understood', 'The place in the list is not understood.');
  const rows = read(before, page.limit + 1);
  const items = rows.slice(0, page.limit);
  return { items, next: rows.length > page.limit ? String(items.at(-1)?.id) : null };
}
