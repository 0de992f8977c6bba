import { type Db } from '#db/open-database';
import { planRevisions, plans } from '#db/schema/plans';
import { type Caller, hasRole } from '#server/caller';
import { NotFound } from '#server/problems';
import { findSite } from '#server/site/site-queries';
import { type Plan, type RevisionStatus } from '#shared/contract/plans';
import { asc, countDistinct, eq, inArray } from 'drizzle-orm';
import { type PlanRow, plansWithParts, revisionHeads, type RevisionHead, revisionsOf } from './plan-rows';

type Head = Omit<Plan, 'revisions' | 'approveOwn'>;

/** Whether the caller also reads what is not, or not yet, in force; the dock and the bench work to what is. */
export function readsDrafts(caller: Caller): boolean {
  return hasRole(caller, 'quality', 'engineering', 'auditor');
}

function isInForce({ status }: { status: RevisionStatus }): boolean {
  return status === 'effective' || status === 'retired';
}

function openRevisionOf(revisions: readonly RevisionHead[]): Head['openRevision'] {
  for (const { revision, status } of revisions)
    if (status === 'draft' || status === 'in-review') return { revision, status };
  return null;
}

function headOf(plan: PlanRow, revisions: readonly RevisionHead[]): Head {
  const effective = revisions.find(({ status }) => status === 'effective');
  return {
    ...plan,
    effectiveRevision: effective?.revision ?? null,
    openRevision: openRevisionOf(revisions),
    characteristics: (effective ?? revisions[0])?.characteristics ?? 0,
    effectiveAt: effective?.effectiveAt ?? null,
  };
}

export function listPlans(db: Db, caller: Caller): Head[] {
  const seesAll = readsDrafts(caller);
  const revisions = revisionHeads(db)
    .all()
    .filter((one) => seesAll || isInForce(one));
  return plansWithParts(db)
    .orderBy(asc(plans.number))
    .all()
    .flatMap((plan) => {
      const own = revisions.filter(({ planId }) => planId === plan.id);
      return own.length > 0 ? [headOf(plan, own)] : [];
    });
}

/** How many plans the caller sees. */
export function countPlans(db: Db, caller: Caller): number {
  const inForce = readsDrafts(caller) ? undefined : inArray(planRevisions.status, ['effective', 'retired']);
  return (
    db
      .select({ plans: countDistinct(planRevisions.planId) })
      .from(planRevisions)
      .where(inForce)
      .get()?.plans ?? 0
  );
}

/** @throws {NotFound} also when nothing of the plan is in force and the caller reads only what is */
export function findPlan(db: Db, caller: Caller, id: number): Plan {
  const plan = plansWithParts(db).where(eq(plans.id, id)).get();
  const seesAll = readsDrafts(caller);
  const heads = revisionHeads(db)
    .where(eq(planRevisions.planId, id))
    .all()
    .filter((one) => seesAll || isInForce(one));
  if (!plan || heads.length === 0) throw new NotFound('This plan');
  const revisions = revisionsOf(db, id).filter((one) => seesAll || isInForce(one));
  return { ...headOf(plan, heads), revisions, approveOwn: findSite(db).approveOwnPlans };
}
