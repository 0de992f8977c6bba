import { LOT_STATUSES } from '#shared/contract/lots';
import { type SamplingGroup } from '#shared/sampling/sampling-group';
import { SEVERITIES } from '#shared/sampling/scheme';
import { sql } from 'drizzle-orm';
import { check, index, integer, primaryKey, sqliteTable, text, unique } from 'drizzle-orm/sqlite-core';
import { flag, moment, oneOf, version } from './columns';
import { parts } from './parts';
import { people } from './people';
import { planRevisions } from './plans';
import { suppliers } from './suppliers';

const VERDICTS = ['accepted', 'rejected'] as const;
const RULINGS = ['conforming', 'nonconforming'] as const;

export const lots = sqliteTable(
  'lots',
  {
    id: integer().primaryKey({ autoIncrement: true }),
    number: text().notNull().unique(),
    status: text({ enum: LOT_STATUSES }).notNull(),
    partId: integer()
      .notNull()
      .references(() => parts.id),
    supplierId: integer()
      .notNull()
      .references(() => suppliers.id),
    deliveryNumber: text().notNull(),
    orderNumber: text().notNull(),
    countedQuantity: integer().notNull(),
    statedQuantity: integer().notNull(),
    dateCode: text().notNull(),
    cartons: integer().notNull(),
    place: text().notNull(),
    note: text().notNull(),
    neededBy: moment(),
    arrivedAt: moment().notNull(),
    bookedById: integer()
      .notNull()
      .references(() => people.id),
    cancelReason: text(),
    /** From here on fixed by the draw. */
    revisionId: integer().references(() => planRevisions.id),
    severity: text({ enum: SEVERITIES }),
    sampleSize: integer(),
    seed: integer(),
    drawnAt: moment(),
    drawnById: integer().references(() => people.id),
    /** Whether a rejection number is reached; kept in step by every reading. */
    stopped: flag().notNull().default(false),
    /** Units on which nothing is left to measure; kept in step by every reading. */
    unitsJudged: integer().notNull().default(0),
    submittedAt: moment(),
    submittedById: integer().references(() => people.id),
    verdict: text({ enum: VERDICTS }),
    decidedAt: moment(),
    decidedById: integer().references(() => people.id),
    decisionReason: text(),
    decisionNote: text(),
    holdReason: text(),
    version: version(),
  },
  (table) => [
    check('lots_status', oneOf(table.status, LOT_STATUSES)),
    check('lots_severity', oneOf(table.severity, SEVERITIES)),
    check('lots_verdict', oneOf(table.verdict, VERDICTS)),
    check('lots_counted', sql`${table.countedQuantity} > 0`),
    check('lots_cartons', sql`${table.cartons} between 1 and ${table.countedQuantity}`),
    check(
      'lots_drawn',
      sql`${table.status} in ('arrived', 'cancelled') or (${table.revisionId} is not null and ${table.severity} is not null and ${table.seed} is not null and ${table.drawnAt} is not null)`,
    ),
    check('lots_released', sql`${table.status} <> 'released' or ${table.verdict} = 'accepted'`),
    index('lots_station').on(table.status, table.arrivedAt),
    index('lots_decided').on(table.supplierId, table.partId, table.decidedAt),
  ],
);

/** A sampling group of a lot as fixed by the draw. */
export const lotGroups = sqliteTable(
  'lot_groups',
  {
    lotId: integer()
      .notNull()
      .references(() => lots.id),
    position: integer().notNull(),
    group: text({ mode: 'json' }).$type<SamplingGroup>().notNull(),
  },
  (table) => [primaryKey({ columns: [table.lotId, table.position] })],
);

/** A drawn unit: its number in draw order and where it lies in the lot. */
export const sampleUnits = sqliteTable(
  'sample_units',
  {
    id: integer().primaryKey({ autoIncrement: true }),
    lotId: integer()
      .notNull()
      .references(() => lots.id),
    unit: integer().notNull(),
    position: integer().notNull(),
    carton: integer().notNull(),
    setAsideReason: text(),
    /** Quality's ruling on an undecided unit. */
    ruling: text({ enum: RULINGS }),
    rulingReason: text(),
    ruledById: integer().references(() => people.id),
    ruledAt: moment(),
  },
  (table) => [
    unique('sample_units_unit').on(table.lotId, table.unit),
    unique('sample_units_position').on(table.lotId, table.position),
  ],
);
