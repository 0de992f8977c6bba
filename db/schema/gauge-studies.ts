import { GAUGE_STUDY_STATUSES, type GaugeStudyBody } from '#shared/contract/gauge-studies';
import { UNITS } from '#shared/contract/plans';
import { check, index, integer, real, sqliteTable, text } from 'drizzle-orm/sqlite-core';
import { moment, oneOf, version } from './columns';
import { instruments } from './instruments';
import { people } from './people';

/** A crossed gauge study: parts measured by persons, several times each. SI base units. */
export const gaugeStudies = sqliteTable(
  'gauge_studies',
  {
    id: integer().primaryKey({ autoIncrement: true }),
    number: text().notNull().unique(),
    title: text().notNull(),
    instrumentId: integer()
      .notNull()
      .references(() => instruments.id),
    quantity: text().notNull(),
    unit: text({ enum: UNITS }).notNull(),
    decimals: integer().notNull(),
    lowerLimit: real(),
    upperLimit: real(),
    parts: text({ mode: 'json' }).$type<string[]>().notNull(),
    persons: text({ mode: 'json' }).$type<string[]>().notNull(),
    trials: integer().notNull(),
    /** By part, person, trial; null where none is entered yet. */
    values: text({ mode: 'json' }).$type<GaugeStudyBody['values']>().notNull(),
    note: text().notNull(),
    status: text({ enum: GAUGE_STUDY_STATUSES }).notNull(),
    createdAt: moment().notNull(),
    createdById: integer()
      .notNull()
      .references(() => people.id),
    closedAt: moment(),
    closedById: integer().references(() => people.id),
    version: version(),
  },
  (table) => [
    check('gauge_studies_status', oneOf(table.status, GAUGE_STUDY_STATUSES)),
    index('gauge_studies_instrument').on(table.instrumentId),
  ],
);
