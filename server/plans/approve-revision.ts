import { type Db } from '#db/open-database';
import { auditEntries } from '#db/schema/audit';
import { planRevisions, plans } from '#db/schema/plans';
import { record } from '#server/audit/record';
import { type Caller } from '#server/caller';
import { type Context } from '#server/context';
import { Conflict } from '#server/problems';
import { findSite } from '#server/site/site-queries';
import { type Plan } from '#shared/contract/plans';
import { and, eq, inArray } from 'drizzle-orm';
import { findPlan } from './plan-queries';
import { contentOf } from './plan-rows';
import {
  headColumns,
  type HeldRevision,
  holdGuardBands,
  holdPlanRules,
  holdRevision,
  moveRevision,
  type NamedRevision,
  revisionName,
} from './revision-rows';

/** Whether the caller wrote any of a revision: drafted it, or changed the draft of somebody else. */
function hasWritten(db: Db, caller: Caller, { authorId, subjectId }: HeldRevision): boolean {
  if (authorId === caller.id) return true;
  const entry = db
    .select({ id: auditEntries.id })
    .from(auditEntries)
    .where(
      and(
        eq(auditEntries.subject, 'plan-revision'),
        eq(auditEntries.subjectId, subjectId),
        eq(auditEntries.personId, caller.id),
        inArray(auditEntries.action, ['drafted', 'changed']),
      ),
    )
    .get();
  return entry !== undefined;
}

/** The revision in force until now is retired with the approval of its successor. */
function retireEarlier(db: Db, caller: Caller, { planId, revision }: HeldRevision, now: Date): void {
  const earlier = db
    .select({ id: planRevisions.id, revision: planRevisions.revision, planNumber: plans.number })
    .from(planRevisions)
    .innerJoin(plans, eq(plans.id, planRevisions.planId))
    .where(and(eq(planRevisions.planId, planId), eq(planRevisions.status, 'effective')))
    .all();
  for (const one of earlier) {
    moveRevision(db, one.id, { status: 'retired', retiredAt: now.toISOString() });
    const subjectId = revisionName(one.planNumber, one.revision);
    const after = { replacedBy: revision };
    record(db, { at: now, person: caller, action: 'retired', subject: 'plan-revision', subjectId, after });
  }
}

/** Makes a revision effective. Its author cannot, unless the site waives that; a waiver that was used goes on record. */
export function approveRevision({ db, clock }: Context, caller: Caller, named: NamedRevision): Plan {
  return db.transaction((tx) => {
    const now = clock.now();
    const held = holdRevision(tx, named, 'in-review');
    const isOwn = hasWritten(tx, caller, held);
    if (isOwn && !findSite(tx).approveOwnPlans)
      throw new Conflict('own-plan', 'You wrote this revision; somebody else approves it.');
    const content = { ...headColumns(held), ...contentOf(tx, held.id) };
    holdPlanRules(content);
    holdGuardBands(tx, content, now);
    retireEarlier(tx, caller, held, now);
    moveRevision(tx, held.id, { status: 'effective', approverId: caller.id, effectiveAt: now.toISOString() });
    const { subjectId } = held;
    const after = isOwn ? { twoPersonRuleWaived: true } : undefined;
    record(tx, { at: now, person: caller, action: 'approved', subject: 'plan-revision', subjectId, after });
    return findPlan(tx, caller, named.id);
  });
}
