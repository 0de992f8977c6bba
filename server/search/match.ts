import { or, sql, type SQL } from 'drizzle-orm';
import { type AnySQLiteColumn } from 'drizzle-orm/sqlite-core';

/** Per cent and underscore are letters like any other to whoever types them. */
function literal(text: string): string {
  return text.replaceAll(/[\\%_]/g, (letter) => `\\${letter}`);
}

/** Whether the text stands anywhere in one of the columns; capitals and small letters are the same. */
export function matches(text: string, ...columns: AnySQLiteColumn[]): SQL | undefined {
  return or(...columns.map((column) => sql`${column} like ${`%${literal(text)}%`} escape '\\'`));
}

/** Rows that begin with the text before those that only contain it. */
export function prefixesFirst(text: string, column: AnySQLiteColumn): SQL {
  return sql`${column} like ${`${literal(text)}%`} escape '\\' desc`;
}
