import { AS_FOUND, REVIEW_EFFECTS, type CalibrationPoint } from '#shared/contract/calibrations';
import { sql } from 'drizzle-orm';
import { check, index, integer, primaryKey, real, sqliteTable, text } from 'drizzle-orm/sqlite-core';
import { flag, moment, oneOf, version } from './columns';
import { instruments } from './instruments';
import { lots } from './lots';
import { people } from './people';
import { storedFiles } from './stored-files';

/** A calibration as its certificate states it. Days as 2026-09-30. Append-only by trigger, but for its file. */
export const calibrations = sqliteTable(
  'calibrations',
  {
    id: integer().primaryKey({ autoIncrement: true }),
    instrumentId: integer()
      .notNull()
      .references(() => instruments.id),
    calibratedOn: text().notNull(),
    dueOn: text().notNull(),
    laboratory: text().notNull(),
    certificateNumber: text().notNull(),
    asFound: text({ enum: AS_FOUND }).notNull(),
    adjusted: flag().notNull(),
    points: text({ mode: 'json' }).$type<CalibrationPoint[]>().notNull(),
    note: text().notNull(),
    fileId: text().references(() => storedFiles.id),
    recordedAt: moment().notNull(),
    recordedById: integer()
      .notNull()
      .references(() => people.id),
  },
  (table) => [
    check('calibrations_as_found', oneOf(table.asFound, AS_FOUND)),
    check('calibrations_days', sql`${table.dueOn} >= ${table.calibratedOn}`),
    index('calibrations_instrument').on(table.instrumentId, table.calibratedOn),
  ],
);

/** What must be answered after an instrument was found out of tolerance: what rests on it since the last good calibration. */
export const instrumentReviews = sqliteTable('instrument_reviews', {
  id: integer().primaryKey({ autoIncrement: true }),
  number: text().notNull().unique(),
  calibrationId: integer()
    .notNull()
    .unique()
    .references(() => calibrations.id),
  /** First and last day in doubt; no first day where no good calibration is known. */
  doubtFrom: text(),
  doubtTo: text().notNull(),
  openedAt: moment().notNull(),
  closedAt: moment(),
  closedById: integer().references(() => people.id),
  conclusion: text(),
  version: version(),
});

/** A lot in doubt, and what quality says of it. */
export const reviewLots = sqliteTable(
  'review_lots',
  {
    reviewId: integer()
      .notNull()
      .references(() => instrumentReviews.id),
    lotId: integer()
      .notNull()
      .references(() => lots.id),
    readings: integer().notNull(),
    effect: text({ enum: REVIEW_EFFECTS }),
    note: text().notNull().default(''),
    assessedById: integer().references(() => people.id),
    assessedAt: moment(),
  },
  (table) => [
    primaryKey({ columns: [table.reviewId, table.lotId] }),
    check('review_lots_effect', oneOf(table.effect, REVIEW_EFFECTS)),
  ],
);

/** Reminders sent, so that each is sent once for a due date. */
export const calibrationReminders = sqliteTable(
  'calibration_reminders',
  {
    instrumentId: integer()
      .notNull()
      .references(() => instruments.id),
    dueOn: text().notNull(),
    /** How many days before the due date it is for; 0 and less: it has passed. */
    days: integer().notNull(),
    sentAt: moment().notNull(),
  },
  (table) => [primaryKey({ columns: [table.instrumentId, table.dueOn, table.days] })],
);

/** A check of an instrument against its reference; SI base units. */
export const instrumentChecks = sqliteTable(
  'instrument_checks',
  {
    id: integer().primaryKey({ autoIncrement: true }),
    instrumentId: integer()
      .notNull()
      .references(() => instruments.id),
    /** Day of the site, as 2026-09-30. */
    day: text().notNull(),
    observed: real().notNull(),
    reference: real().notNull(),
    tolerance: real().notNull(),
    passed: flag().notNull(),
    at: moment().notNull(),
    personId: integer()
      .notNull()
      .references(() => people.id),
  },
  (table) => [index('instrument_checks_day').on(table.instrumentId, table.day)],
);
