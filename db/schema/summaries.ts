import { integer, primaryKey, real, sqliteTable, text, index } from 'drizzle-orm/sqlite-core';
import { moment } from './columns';
import { lots } from './lots';
import { parts } from './parts';
import { suppliers } from './suppliers';

/** Written once when a lot is decided: the cost of trends grows with lots, not readings. */
export const lotSummaries = sqliteTable(
  'lot_summaries',
  {
    lotId: integer()
      .primaryKey()
      .references(() => lots.id),
    /** Month of the decision, as 2026-03. */
    month: text().notNull(),
    decidedAt: moment().notNull(),
    supplierId: integer()
      .notNull()
      .references(() => suppliers.id),
    partId: integer()
      .notNull()
      .references(() => parts.id),
    verdict: text({ enum: ['accepted', 'rejected'] }).notNull(),
    lotSize: integer().notNull(),
    unitsJudged: integer().notNull(),
    unitsConforming: integer().notNull(),
    criticalUnits: integer().notNull(),
    majorUnits: integer().notNull(),
    minorUnits: integer().notNull(),
    unitsReleased: integer().notNull(),
  },
  (table) => [index('lot_summaries_month').on(table.month)],
);

export const characteristicSummaries = sqliteTable(
  'characteristic_summaries',
  {
    lotId: integer()
      .notNull()
      .references(() => lots.id),
    key: text().notNull(),
    n: integer().notNull(),
    found: integer().notNull(),
    min: real(),
    mean: real(),
    max: real(),
    s: real(),
  },
  (table) => [primaryKey({ columns: [table.lotId, table.key] })],
);
