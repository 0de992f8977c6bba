import { FORMS, TOPOLOGIES, type ExpectedBands } from '#shared/contract/parts';
import { sql } from 'drizzle-orm';
import { check, integer, real, sqliteTable, text } from 'drizzle-orm/sqlite-core';
import { flag, oneOf, version } from './columns';

/** A supply or adapter model, with what it is electrically (SI base units, ratios as fractions). */
export const parts = sqliteTable(
  'parts',
  {
    id: integer().primaryKey({ autoIncrement: true }),
    number: text().notNull().unique(),
    name: text().notNull(),
    form: text({ enum: FORMS }).notNull(),
    topology: text({ enum: TOPOLOGIES }).notNull(),
    lineVolts: real().notNull(),
    lineHertz: integer().notNull(),
    ratedVolts: real().notNull(),
    ratedAmperes: real().notNull(),
    secondaryPeakVolts: real(),
    sourceOhms: real(),
    diodeDropVolts: real(),
    filterFarads: real(),
    filterTolerance: real(),
    filterEsrOhms: real(),
    /** What its rectifier ought to give; computed when the part is saved, null where there is no model. */
    expected: text({ mode: 'json' }).$type<ExpectedBands>(),
    active: flag().notNull().default(true),
    version: version(),
  },
  (table) => [
    check('parts_form', oneOf(table.form, FORMS)),
    check('parts_topology', oneOf(table.topology, TOPOLOGIES)),
    check('parts_line_hertz', sql`${table.lineHertz} in (50, 60)`),
  ],
);
