import { index, integer, sqliteTable, text } from 'drizzle-orm/sqlite-core';
import { moment } from './columns';
import { people } from './people';

/** Who did what to what, when, before and after; hash-chained, and append-only by trigger. */
export const auditEntries = sqliteTable(
  'audit_entries',
  {
    id: integer().primaryKey({ autoIncrement: true }),
    at: moment().notNull(),
    personId: integer().references(() => people.id),
    /** Name at the time, or the name of the program's part that acted. */
    actor: text().notNull(),
    action: text().notNull(),
    subject: text().notNull(),
    subjectId: text().notNull(),
    /** Canonical JSON. */
    before: text(),
    after: text(),
    previousHash: text().notNull(),
    hash: text().notNull(),
  },
  (table) => [
    index('audit_entries_subject').on(table.subject, table.subjectId),
    index('audit_entries_person').on(table.personId),
  ],
);
