import { type Db } from '#db/open-database';
import { parts } from '#db/schema/parts';
import { planRevisions, plans } from '#db/schema/plans';
import { record } from '#server/audit/record';
import { type Caller } from '#server/caller';
import { type Context } from '#server/context';
import { Refused } from '#server/problems';
import { type Plan, type RevisionBody } from '#shared/contract/plans';
import { eq, sql } from 'drizzle-orm';
import { findPlan } from './plan-queries';
import { headColumns, holdPlanRules, keepContent, revisionName } from './revision-rows';

/** Plans are never removed, so the next number follows the highest. */
function nextPlanNumber(db: Db): string {
  const highest = db
    .select({ last: sql<number | null>`max(cast(substr(${plans.number}, 3) as integer))` })
    .from(plans)
    .get();
  return `P-${String((highest?.last ?? 0) + 1).padStart(3, '0')}`;
}

function holdPart(db: Db, partId: number): void {
  const refuse = (message: string) => {
    throw new Refused('part-refused', 'The plan was not started.', [{ path: ['partId'], message }]);
  };
  if (!db.select({ id: parts.id }).from(parts).where(eq(parts.id, partId)).get()) refuse('This part does not exist.');
  const plan = db.select({ number: plans.number }).from(plans).where(eq(plans.partId, partId)).get();
  if (plan) refuse(`This part has plan ${plan.number}; draft a revision of it.`);
}

/** Starts the plan of a part with its first draft. */
export function addPlan(
  { db, clock }: Context,
  caller: Caller,
  { partId, content }: { partId: number; content: RevisionBody },
): Plan {
  return db.transaction((tx) => {
    holdPart(tx, partId);
    holdPlanRules(content, ['content']);
    const now = clock.now();
    const number = nextPlanNumber(tx);
    const { id } = tx.insert(plans).values({ number, partId }).returning({ id: plans.id }).get();
    draftRevision(tx, { planId: id, revision: 1, authorId: caller.id, now, content });
    const after = { partId, ...content };
    const subjectId = revisionName(number, 1);
    record(tx, { at: now, person: caller, action: 'drafted', subject: 'plan-revision', subjectId, after });
    return findPlan(tx, caller, id);
  });
}

/** Writes a new draft. */
export function draftRevision(
  db: Db,
  draft: { planId: number; revision: number; authorId: number; now: Date; content: RevisionBody },
): void {
  const { planId, revision, authorId, now, content } = draft;
  const { id } = db
    .insert(planRevisions)
    .values({ planId, revision, status: 'draft', ...headColumns(content), authorId, createdAt: now.toISOString() })
    .returning({ id: planRevisions.id })
    .get();
  keepContent(db, id, content);
}
