import { check, index, integer, sqliteTable, text } from 'drizzle-orm/sqlite-core';
import { flag, moment, oneOf } from './columns';
import { people } from './people';

/** A sign-in on one device; its refresh tokens replace one another. */
export const sessions = sqliteTable(
  'sessions',
  {
    id: text().primaryKey(),
    personId: integer()
      .notNull()
      .references(() => people.id),
    keep: flag().notNull(),
    startedAt: moment().notNull(),
    expiresAt: moment().notNull(),
    endedAt: moment(),
    endReason: text(),
  },
  (table) => [index('sessions_person').on(table.personId)],
);

/** Only the hash of a token is kept; one that is used twice ends its session. */
export const refreshTokens = sqliteTable('refresh_tokens', {
  tokenHash: text().primaryKey(),
  sessionId: text()
    .notNull()
    .references(() => sessions.id),
  issuedAt: moment().notNull(),
  usedAt: moment(),
});

const PURPOSES = ['first-admin', 'set-password'] as const;

export const oneTimeLinks = sqliteTable(
  'one_time_links',
  {
    tokenHash: text().primaryKey(),
    purpose: text({ enum: PURPOSES }).notNull(),
    personId: integer().references(() => people.id),
    issuedAt: moment().notNull(),
    expiresAt: moment().notNull(),
    usedAt: moment(),
  },
  (table) => [check('one_time_links_purpose', oneOf(table.purpose, PURPOSES))],
);
