import { integer, sqliteTable, text } from 'drizzle-orm/sqlite-core';
import { flag, version } from './columns';

export const suppliers = sqliteTable('suppliers', {
  id: integer().primaryKey({ autoIncrement: true }),
  code: text().notNull().unique(),
  name: text().notNull().unique(),
  address: text().notNull(),
  contactName: text().notNull(),
  contactEmail: text(),
  active: flag().notNull().default(true),
  version: version(),
});
