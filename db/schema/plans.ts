import { DECISION_RULES, REVISION_STATUSES, type StoredCharacteristic } from '#shared/contract/plans';
import {
  AQLS,
  INSPECTION_LEVELS,
  NONCONFORMITY_CLASSES,
  type Aql,
  type NonconformityClass,
} from '#shared/sampling/scheme';
import { check, integer, primaryKey, real, sqliteTable, text, unique } from 'drizzle-orm/sqlite-core';
import { moment, oneOf, version } from './columns';
import { parts } from './parts';
import { people } from './people';

/** The inspection plan of a part; its content is in its revisions. */
export const plans = sqliteTable('plans', {
  id: integer().primaryKey({ autoIncrement: true }),
  number: text().notNull().unique(),
  partId: integer()
    .notNull()
    .unique()
    .references(() => parts.id),
});

export const planRevisions = sqliteTable(
  'plan_revisions',
  {
    id: integer().primaryKey({ autoIncrement: true }),
    planId: integer()
      .notNull()
      .references(() => plans.id),
    revision: integer().notNull(),
    status: text({ enum: REVISION_STATUSES }).notNull(),
    level: text({ enum: INSPECTION_LEVELS }).notNull(),
    decisionRule: text({ enum: DECISION_RULES }).notNull().default('simple'),
    /** k, by which the combined standard uncertainty is expanded. */
    coverageFactor: real().notNull().default(2),
    /** Minutes a unit warms up before it is measured; null where the plan asks for none. */
    warmUpMinutes: integer(),
    changeNote: text().notNull(),
    authorId: integer()
      .notNull()
      .references(() => people.id),
    approverId: integer().references(() => people.id),
    createdAt: moment().notNull(),
    submittedAt: moment(),
    effectiveAt: moment(),
    retiredAt: moment(),
    version: version(),
  },
  (table) => [
    unique('plan_revisions_number').on(table.planId, table.revision),
    check('plan_revisions_status', oneOf(table.status, REVISION_STATUSES)),
    check('plan_revisions_level', oneOf(table.level, INSPECTION_LEVELS)),
    check('plan_revisions_rule', oneOf(table.decisionRule, DECISION_RULES)),
  ],
);

export const planClassAqls = sqliteTable(
  'plan_class_aqls',
  {
    revisionId: integer()
      .notNull()
      .references(() => planRevisions.id),
    class: text().$type<NonconformityClass>().notNull(),
    aql: text().$type<Aql>().notNull(),
  },
  (table) => [
    primaryKey({ columns: [table.revisionId, table.class] }),
    check('plan_class_aqls_class', oneOf(table.class, NONCONFORMITY_CLASSES)),
    check('plan_class_aqls_aql', oneOf(table.aql, AQLS)),
  ],
);

/** One characteristic of a revision; what differs by kind stands in `content`, checked by the contract's schema. */
export const planCharacteristics = sqliteTable(
  'plan_characteristics',
  {
    id: integer().primaryKey({ autoIncrement: true }),
    revisionId: integer()
      .notNull()
      .references(() => planRevisions.id),
    position: integer().notNull(),
    key: text().notNull(),
    content: text({ mode: 'json' }).$type<StoredCharacteristic>().notNull(),
  },
  (table) => [
    unique('plan_characteristics_key').on(table.revisionId, table.key),
    unique('plan_characteristics_position').on(table.revisionId, table.position),
  ],
);
