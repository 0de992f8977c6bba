import { type Db } from '#db/open-database';
import { planCharacteristics, planClassAqls, planRevisions, plans } from '#db/schema/plans';
import { Conflict, holdVersion, NotFound, Refused } from '#server/problems';
import { dayOf, listInstruments } from '#server/instruments/instrument-queries';
import { type Fault } from '#shared/contract/problem';
import { type RevisionBody, type RevisionStatus } from '#shared/contract/plans';
import { guardFaults } from '#shared/plan/guard-faults';
import { planFaults } from '#shared/plan/plan-faults';
import { typicalUncertainties } from '#shared/plan/typical-uncertainty';
import { and, eq, sql } from 'drizzle-orm';

/** Which revision is meant, and which version of it the caller saw. */
export interface NamedRevision {
  id: number;
  revision: number;
  version: number;
}

const STATUS_WORDS: Record<RevisionStatus, string> = {
  draft: 'a draft',
  'in-review': 'in review',
  effective: 'effective',
  retired: 'retired',
};

/** @throws {NotFound | LostRace | Conflict} when it is another version than the caller saw, or not in the state that the act needs */
export function holdRevision(db: Db, named: NamedRevision, needed: RevisionStatus) {
  const found = db
    .select({ row: planRevisions, planNumber: plans.number })
    .from(planRevisions)
    .innerJoin(plans, eq(plans.id, planRevisions.planId))
    .where(and(eq(planRevisions.planId, named.id), eq(planRevisions.revision, named.revision)))
    .get();
  if (!found) throw new NotFound('This revision');
  holdVersion('The revision', found.row.version, named.version);
  if (found.row.status !== needed)
    throw new Conflict(
      'revision-state',
      `The revision is ${STATUS_WORDS[found.row.status]}, not ${STATUS_WORDS[needed]}.`,
    );
  return { ...found.row, subjectId: revisionName(found.planNumber, named.revision) };
}
export type HeldRevision = ReturnType<typeof holdRevision>;

/** How the audit trail names a revision. */
export function revisionName(planNumber: string, revision: number): string {
  return `${planNumber} rev ${revision}`;
}

/** @throws {Refused} for a plan that could not be used; faults are placed under `at`, where the content stands in the body */
export function holdPlanRules(
  content: Pick<RevisionBody, 'level' | 'classAqls' | 'characteristics'>,
  at: Fault['path'] = [],
): void {
  refuseFaults(planFaults(content), at);
}

function refuseFaults(faults: readonly Fault[], at: Fault['path'] = []): void {
  if (faults.length > 0)
    throw new Refused(
      'plan-not-sound',
      'The plan cannot be used as it stands.',
      faults.map(({ path, message }) => ({ path: [...at, ...path], message })),
    );
}

/**
 * Holds that guard bands leave something to accept with the finest instruments that the site has now. A draft may be kept
 * without; what goes to review and into force may not.
 *
 * @throws {Refused} with U at the limit that it takes
 */
export function holdGuardBands(
  db: Db,
  content: Pick<RevisionBody, 'characteristics' | 'decisionRule' | 'coverageFactor'>,
  now: Date,
): void {
  if (content.decisionRule === 'simple') return;
  refuseFaults(guardFaults(content, typicalUncertainties(content, listInstruments(db, dayOf(now)))));
}

/** Writes what a draft holds in place of what it held. */
export function keepContent(
  db: Db,
  revisionId: number,
  body: Pick<RevisionBody, 'classAqls' | 'characteristics'>,
): void {
  db.delete(planClassAqls).where(eq(planClassAqls.revisionId, revisionId)).run();
  db.delete(planCharacteristics).where(eq(planCharacteristics.revisionId, revisionId)).run();
  for (const entry of body.classAqls)
    db.insert(planClassAqls)
      .values({ revisionId, ...entry })
      .run();
  body.characteristics.forEach((content, index) =>
    db
      .insert(planCharacteristics)
      .values({ revisionId, position: index + 1, key: content.key, content })
      .run(),
  );
}

/** What stands in the revision's own row of its content. */
export function headColumns<Head extends RevisionHeadFields>(body: Head): RevisionHeadFields {
  const { level, decisionRule, coverageFactor, warmUpMinutes, changeNote } = body;
  return { level, decisionRule, coverageFactor, warmUpMinutes, changeNote };
}
type RevisionHeadFields = Pick<
  RevisionBody,
  'level' | 'decisionRule' | 'coverageFactor' | 'warmUpMinutes' | 'changeNote'
>;

/** Moves a revision on; every step is a new version of it. */
export function moveRevision(db: Db, revisionId: number, change: Partial<typeof planRevisions.$inferInsert>): void {
  db.update(planRevisions)
    .set({ ...change, version: sql`${planRevisions.version} + 1` })
    .where(eq(planRevisions.id, revisionId))
    .run();
}
