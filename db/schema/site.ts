import { sql } from 'drizzle-orm';
import { check, integer, primaryKey, real, sqliteTable, text } from 'drizzle-orm/sqlite-core';
import { flag, version } from './columns';

/** The one row of site settings. */
export const site = sqliteTable(
  'site',
  {
    id: integer().primaryKey().default(1),
    name: text().notNull(),
    department: text().notNull(),
    address: text().notNull(),
    engineeringList: text({ mode: 'json' }).$type<string[]>().notNull(),
    waitingTargetHours: real().notNull(),
    approveOwnPlans: flag().notNull(),
    releaseOwnReadings: flag().notNull(),
    /** Whether an instrument is checked against its reference before its first reading of a day. */
    dailyChecks: flag().notNull().default(false),
    version: version(),
  },
  (table) => [check('site_single', sql`${table.id} = 1`)],
);

/** Last number given out, per kind of paper and year; taken inside the transaction that uses it, so no number is lost. */
export const numberSeries = sqliteTable(
  'number_series',
  {
    kind: text().notNull(),
    year: integer().notNull(),
    last: integer().notNull(),
  },
  (table) => [primaryKey({ columns: [table.kind, table.year] })],
);
