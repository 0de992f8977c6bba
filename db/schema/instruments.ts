import { INSTRUMENT_KINDS } from '#shared/contract/instruments';
import { check, integer, sqliteTable, text } from 'drizzle-orm/sqlite-core';
import { oneOf, version } from './columns';

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
  },
  (table) => [
    check('instruments_kind', oneOf(table.kind, INSTRUMENT_KINDS)),
    check('instruments_status', oneOf(table.status, STATUSES)),
  ],
);
