import { planRevisions, plans } from '#db/schema/plans';
import { record } from '#server/audit/record';
import { type Caller } from '#server/caller';
import { type Context } from '#server/context';
import { Conflict, NotFound } from '#server/problems';
import { type Plan } from '#shared/contract/plans';
import { desc, eq } from 'drizzle-orm';
import { draftRevision } from './add-plan';
import { findPlan } from './plan-queries';
import { contentOf } from './plan-rows';
import { headColumns, revisionName } from './revision-rows';

/** Drafts the next revision as a copy of the newest one; a plan has one open revision at a time. */
export function addRevision({ db, clock }: Context, caller: Caller, planId: number): Plan {
  return db.transaction((tx) => {
    const newest = tx
      .select({ row: planRevisions, planNumber: plans.number })
      .from(planRevisions)
      .innerJoin(plans, eq(plans.id, planRevisions.planId))
      .where(eq(planRevisions.planId, planId))
      .orderBy(desc(planRevisions.revision))
      .limit(1)
      .get();
    if (!newest) throw new NotFound('This plan');
    const { row, planNumber } = newest;
    if (row.status === 'draft' || row.status === 'in-review')
      throw new Conflict('revision-open', `Revision ${row.revision} is open already.`);
    const now = clock.now();
    const revision = row.revision + 1;
    const content = { ...headColumns(row), changeNote: '', ...contentOf(tx, row.id) };
    draftRevision(tx, { planId, revision, authorId: caller.id, now, content });
    record(tx, {
      at: now,
      person: caller,
      action: 'drafted',
      subject: 'plan-revision',
      subjectId: revisionName(planNumber, revision),
      after: { copyOf: row.revision },
    });
    return findPlan(tx, caller, planId);
  });
}
