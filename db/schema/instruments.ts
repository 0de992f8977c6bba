import { INSTRUMENT_KINDS, type RangeBody } from '#shared/contract/instruments';
import { check, index, integer, real, sqliteTable, text } from 'drizzle-orm/sqlite-core';
import { moment, oneOf, version } from './columns';

const STATUSES = ['in-service', 'withdrawn'] as const;

export const instruments = sqliteTable(
  'instruments',
  {
    id: integer().primaryKey({ autoIncrement: true }),
    assetNumber: text().notNull().unique(),
    kind: text({ enum: INSTRUMENT_KINDS }).notNull(),
    description: text().notNull(),
    serialNumber: text().notNull(),
    place: text().notNull(),
    /** Day, as 2026-09-30; the instrument may be used on it and not after it. */
    calibrationDue: text().notNull(),
    status: text({ enum: STATUSES }).notNull(),
    version: version(),
    /** The reference it is checked against before its first reading of a day; no name, no check. SI base units. */
    checkName: text(),
    checkUnit: text(),
    checkValue: real(),
    checkTolerance: real(),
  },
  (table) => [
    check('instruments_kind', oneOf(table.kind, INSTRUMENT_KINDS)),
    check('instruments_status', oneOf(table.status, STATUSES)),
  ],
);

/**
 * A range of an instrument with its accuracy specification. Never altered, since readings rest on it: a changed range is
 * a new row, and the old one is retired.
 */
export const instrumentRanges = sqliteTable(
  'instrument_ranges',
  {
    id: integer().primaryKey({ autoIncrement: true }),
    instrumentId: integer()
      .notNull()
      .references(() => instruments.id),
    position: integer().notNull(),
    specification: text({ mode: 'json' }).$type<RangeBody>().notNull(),
    retiredAt: moment(),
  },
  (table) => [index('instrument_ranges_instrument').on(table.instrumentId)],
);
