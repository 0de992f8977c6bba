import { type LotConditions } from '#shared/contract/conditions';
import { index, integer, sqliteTable, text } from 'drizzle-orm/sqlite-core';
import { moment } from './columns';
import { lots } from './lots';
import { people } from './people';

/** The conditions a lot was measured under, as noted; the newest row counts, the others stay on record. */
export const lotConditions = sqliteTable(
  'lot_conditions',
  {
    id: integer().primaryKey({ autoIncrement: true }),
    lotId: integer()
      .notNull()
      .references(() => lots.id),
    conditions: text({ mode: 'json' }).$type<LotConditions>().notNull(),
    notedAt: moment().notNull(),
    notedById: integer()
      .notNull()
      .references(() => people.id),
  },
  (table) => [index('lot_conditions_lot').on(table.lotId)],
);
