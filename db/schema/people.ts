import { ROLES } from '#shared/contract/roles';
import { check, integer, primaryKey, sqliteTable, text } from 'drizzle-orm/sqlite-core';
import { flag, moment, oneOf, version } from './columns';

export const people = sqliteTable('people', {
  id: integer().primaryKey({ autoIncrement: true }),
  name: text().notNull(),
  email: text().notNull().unique(),
  stampNumber: text().unique(),
  /** Null until the person has set one with a one-time link. */
  passwordHash: text(),
  active: flag().notNull().default(true),
  lastSignInAt: moment(),
  version: version(),
});

export const personRoles = sqliteTable(
  'person_roles',
  {
    personId: integer()
      .notNull()
      .references(() => people.id),
    role: text({ enum: ROLES }).notNull(),
  },
  (table) => [
    primaryKey({ columns: [table.personId, table.role] }),
    check('person_roles_role', oneOf(table.role, ROLES)),
  ],
);
