import { sql, type SQL } from 'drizzle-orm';
import { integer, text, type AnySQLiteColumn } from 'drizzle-orm/sqlite-core';

/** Instants are UTC ISO text with milliseconds, so that they sort as text. */
export const moment = () => text();

/** Counts the edits of a row; an edit names the version it changes (If-Match). */
export const version = () => integer().notNull().default(1);

export const flag = () => integer({ mode: 'boolean' });

/** CHECK that a column holds one of an enumeration's words. */
export function oneOf(column: AnySQLiteColumn, words: readonly string[]): SQL {
  return sql`${column} in (${sql.raw(words.map((word) => `'${word}'`).join(', '))})`;
}
