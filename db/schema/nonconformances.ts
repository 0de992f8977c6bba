import { type Failure } from '#shared/contract/nonconformances';
import { check, integer, sqliteTable, text } from 'drizzle-orm/sqlite-core';
import { moment, oneOf } from './columns';
import { lots } from './lots';
import { people } from './people';

const STATUSES = ['open'] as const;

export const nonconformances = sqliteTable(
  'nonconformances',
  {
    id: integer().primaryKey({ autoIncrement: true }),
    number: text().notNull().unique(),
    lotId: integer()
      .notNull()
      .unique()
      .references(() => lots.id),
    status: text({ enum: STATUSES }).notNull(),
    summary: text().notNull(),
    failures: text({ mode: 'json' }).$type<Failure[]>().notNull(),
    containment: text().notNull(),
    openedAt: moment().notNull(),
    openedById: integer()
      .notNull()
      .references(() => people.id),
  },
  (table) => [check('nonconformances_status', oneOf(table.status, STATUSES))],
);
