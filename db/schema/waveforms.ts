import { type WaveformRecord } from '#shared/contract/waveforms';
import { index, integer, sqliteTable, text } from 'drizzle-orm/sqlite-core';
import { moment, version } from './columns';
import { lots, sampleUnits } from './lots';
import { people } from './people';
import { planCharacteristics } from './plans';
import { racks } from './racks';
import { storedFiles } from './stored-files';

/** A captured waveform of a unit: the file as it came, its samples, and what was computed from them. */
export const waveforms = sqliteTable(
  'waveforms',
  {
    /** Made by the client (UUID), so that sending it twice changes nothing. */
    id: text().primaryKey(),
    lotId: integer()
      .notNull()
      .references(() => lots.id),
    unitId: integer()
      .notNull()
      .references(() => sampleUnits.id),
    characteristicId: integer().references(() => planCharacteristics.id),
    fileId: text()
      .notNull()
      .references(() => storedFiles.id),
    samplesId: text()
      .notNull()
      .references(() => storedFiles.id),
    record: text({ mode: 'json' }).$type<WaveformRecord>().notNull(),
    uploadedAt: moment().notNull(),
    /** Null when a rack sent it. */
    uploadedById: integer().references(() => people.id),
    rackId: integer().references(() => racks.id),
    withdrawnAt: moment(),
    withdrawnById: integer().references(() => people.id),
    withdrawReason: text(),
    version: version(),
  },
  (table) => [index('waveforms_lot').on(table.lotId, table.unitId)],
);
