import { type Db } from '#db/open-database';
import { parts } from '#db/schema/parts';
import { people } from '#db/schema/people';
import { planCharacteristics, planClassAqls, planRevisions, plans } from '#db/schema/plans';
import { type Revision, type RevisionBody } from '#shared/contract/plans';
import { NONCONFORMITY_CLASSES } from '#shared/sampling/scheme';
import { asc, count, desc, eq } from 'drizzle-orm';
import { alias } from 'drizzle-orm/sqlite-core';
import { wholeCharacteristic } from './whole-characteristic';

const authors = alias(people, 'authors');
const approvers = alias(people, 'approvers');

export function plansWithParts(db: Db) {
  return db
    .select({
      id: plans.id,
      number: plans.number,
      part: { id: parts.id, number: parts.number, name: parts.name },
    })
    .from(plans)
    .innerJoin(parts, eq(parts.id, plans.partId));
}
export type PlanRow = ReturnType<ReturnType<typeof plansWithParts>['all']>[number];

/** Revisions with the number of their characteristics, newest first. */
export function revisionHeads(db: Db) {
  const counted = db
    .select({ revisionId: planCharacteristics.revisionId, characteristics: count().as('characteristics') })
    .from(planCharacteristics)
    .groupBy(planCharacteristics.revisionId)
    .as('counted');
  return db
    .select({
      planId: planRevisions.planId,
      revision: planRevisions.revision,
      status: planRevisions.status,
      effectiveAt: planRevisions.effectiveAt,
      characteristics: counted.characteristics,
    })
    .from(planRevisions)
    .leftJoin(counted, eq(counted.revisionId, planRevisions.id))
    .orderBy(desc(planRevisions.revision))
    .$dynamic();
}
export type RevisionHead = ReturnType<ReturnType<typeof revisionHeads>['all']>[number];

/** What a revision holds, but for its note. */
export function contentOf(db: Db, revisionId: number): Pick<RevisionBody, 'classAqls' | 'characteristics'> {
  const aqls = db
    .select({ class: planClassAqls.class, aql: planClassAqls.aql })
    .from(planClassAqls)
    .where(eq(planClassAqls.revisionId, revisionId))
    .all();
  const rows = db
    .select({ content: planCharacteristics.content })
    .from(planCharacteristics)
    .where(eq(planCharacteristics.revisionId, revisionId))
    .orderBy(asc(planCharacteristics.position))
    .all();
  return {
    classAqls: NONCONFORMITY_CLASSES.flatMap((one) => aqls.filter((entry) => entry.class === one)),
    characteristics: rows.map(({ content }) => wholeCharacteristic(content)),
  };
}

/** The revisions of a plan with their contents, newest first. */
export function revisionsOf(db: Db, planId: number): Revision[] {
  const rows = db
    .select({ revision: planRevisions, author: authors.name, approver: approvers.name })
    .from(planRevisions)
    .innerJoin(authors, eq(authors.id, planRevisions.authorId))
    .leftJoin(approvers, eq(approvers.id, planRevisions.approverId))
    .where(eq(planRevisions.planId, planId))
    .orderBy(desc(planRevisions.revision))
    .all();
  return rows.map(({ revision, author, approver }) => ({
    ...revision,
    author,
    approver,
    ...contentOf(db, revision.id),
  }));
}
