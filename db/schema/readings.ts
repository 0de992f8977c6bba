import { REPEAT_REASONS, type PlausibilityQuestion, type ReadingEntry } from '#shared/contract/bench';
import { sql } from 'drizzle-orm';
import { check, index, integer, real, sqliteTable, text, uniqueIndex } from 'drizzle-orm/sqlite-core';
import { moment, oneOf } from './columns';
import { instrumentRanges, instruments } from './instruments';
import { lots, sampleUnits } from './lots';
import { people } from './people';
import { planCharacteristics } from './plans';
import { racks } from './racks';
import { waveforms } from './waveforms';

/** A rack file as it was imported. */
export const rackImports = sqliteTable('rack_imports', {
  id: integer().primaryKey({ autoIncrement: true }),
  lotId: integer()
    .notNull()
    .references(() => lots.id),
  fileName: text().notNull(),
  sha256: text().notNull(),
  text: text().notNull(),
  rows: integer().notNull(),
  importedAt: moment().notNull(),
  importedById: integer()
    .notNull()
    .references(() => people.id),
});

/** Every reading ever kept; a repeat or an undo never removes one. Values in SI base units. */
export const readings = sqliteTable(
  'readings',
  {
    /** Made by the client (UUID), so that sending it twice changes nothing. */
    id: text().primaryKey(),
    lotId: integer()
      .notNull()
      .references(() => lots.id),
    unitId: integer()
      .notNull()
      .references(() => sampleUnits.id),
    characteristicId: integer()
      .notNull()
      .references(() => planCharacteristics.id),
    attempt: integer().notNull(),
    value: real(),
    pass: integer({ mode: 'boolean' }),
    entry: text({ mode: 'json' }).$type<ReadingEntry>(),
    instrumentId: integer().references(() => instruments.id),
    note: text().notNull(),
    repeatReason: text({ enum: REPEAT_REASONS }),
    repeatNote: text(),
    /** Null when a rack took it: such readings count as taken by nobody. */
    takenById: integer().references(() => people.id),
    rackImportId: integer().references(() => rackImports.id),
    /** The rack that sent it by itself. */
    rackId: integer().references(() => racks.id),
    rangeId: integer().references(() => instrumentRanges.id),
    /** U = k u_c in SI base units; null where the instrument has no accuracy specification. */
    expandedUncertainty: real(),
    /** The file it was taken from. */
    waveformId: text().references(() => waveforms.id),
    /** Where the value is far from what the part can give: how the question was answered. */
    question: text({ mode: 'json' }).$type<PlausibilityQuestion>(),
    takenAt: moment().notNull(),
    receivedAt: moment().notNull(),
    withdrawnAt: moment(),
    withdrawnById: integer().references(() => people.id),
  },
  (table) => [
    check('readings_one_value', sql`(${table.value} is null) <> (${table.pass} is null)`),
    check('readings_repeat_reason', oneOf(table.repeatReason, REPEAT_REASONS)),
    check('readings_attempt', sql`${table.attempt} between 1 and 3`),
    index('readings_lot').on(table.lotId, table.unitId),
    uniqueIndex('readings_attempt_once')
      .on(table.unitId, table.characteristicId, table.attempt)
      .where(sql`${table.withdrawnAt} is null`),
  ],
);
