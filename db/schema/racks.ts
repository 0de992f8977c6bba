import { index, integer, primaryKey, sqliteTable, text } from 'drizzle-orm/sqlite-core';
import { flag, moment, version } from './columns';
import { parts } from './parts';
import { people } from './people';

/** An automated test rack, with what its files call the characteristics. */
export const racks = sqliteTable('racks', {
  id: integer().primaryKey({ autoIncrement: true }),
  name: text().notNull().unique(),
  place: text().notNull(),
  active: flag().notNull().default(true),
  /** Heading of a column in its files to the key of a characteristic, "unit" for the unit's number, or null to skip it. */
  mapping: text({ mode: 'json' }).$type<Record<string, string | null>>().notNull().default({}),
  version: version(),
});

/** The parts that a rack may send readings of. */
export const rackParts = sqliteTable(
  'rack_parts',
  {
    rackId: integer()
      .notNull()
      .references(() => racks.id),
    partId: integer()
      .notNull()
      .references(() => parts.id),
  },
  (table) => [primaryKey({ columns: [table.rackId, table.partId] })],
);

/** A token of a rack: shown once, kept as its SHA-256. */
export const rackTokens = sqliteTable(
  'rack_tokens',
  {
    id: integer().primaryKey({ autoIncrement: true }),
    rackId: integer()
      .notNull()
      .references(() => racks.id),
    hash: text().notNull().unique(),
    /** Its first characters, by which people tell tokens apart. */
    beginning: text().notNull(),
    issuedAt: moment().notNull(),
    issuedById: integer()
      .notNull()
      .references(() => people.id),
    lastUsedAt: moment(),
    revokedAt: moment(),
    revokedById: integer().references(() => people.id),
  },
  (table) => [index('rack_tokens_rack').on(table.rackId)],
);
