import { check, index, integer, sqliteTable, text } from 'drizzle-orm/sqlite-core';
import { moment, oneOf } from './columns';
import { nonconformances } from './nonconformances';

const STATUSES = ['queued', 'sent', 'failed'] as const;

/** The outbox: a message is written in the transaction of its cause and sent afterwards under one Message-ID. */
export const messages = sqliteTable(
  'messages',
  {
    id: integer().primaryKey({ autoIncrement: true }),
    messageId: text().notNull().unique(),
    event: text().notNull(),
    nonconformanceId: integer().references(() => nonconformances.id),
    recipients: text({ mode: 'json' }).$type<string[]>().notNull(),
    subject: text().notNull(),
    html: text().notNull(),
    text: text().notNull(),
    status: text({ enum: STATUSES }).notNull(),
    queuedAt: moment().notNull(),
    nextAttemptAt: moment(),
    sentAt: moment(),
  },
  (table) => [
    check('messages_status', oneOf(table.status, STATUSES)),
    index('messages_due').on(table.status, table.nextAttemptAt),
  ],
);

export const messageAttempts = sqliteTable(
  'message_attempts',
  {
    id: integer().primaryKey({ autoIncrement: true }),
    messageId: integer()
      .notNull()
      .references(() => messages.id),
    at: moment().notNull(),
    outcome: text({ enum: ['sent', 'failed'] }).notNull(),
    detail: text().notNull(),
  },
  (table) => [index('message_attempts_message').on(table.messageId)],
);

/** What the local SMTP fake has received. */
export const receivedMessages = sqliteTable('received_messages', {
  id: integer().primaryKey({ autoIncrement: true }),
  messageId: text().notNull(),
  sender: text().notNull(),
  recipients: text({ mode: 'json' }).$type<string[]>().notNull(),
  subject: text().notNull(),
  html: text().notNull(),
  text: text().notNull(),
  receivedAt: moment().notNull(),
});
