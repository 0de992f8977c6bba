import { integer, sqliteTable, text } from 'drizzle-orm/sqlite-core';
import { moment } from './columns';

/** A file that was uploaded; its bytes lie in the data folder under a random name. */
export const storedFiles = sqliteTable('stored_files', {
  /** The random name. */
  id: text().primaryKey(),
  fileName: text().notNull(),
  mediaType: text().notNull(),
  bytes: integer().notNull(),
  sha256: text().notNull(),
  receivedAt: moment().notNull(),
});
