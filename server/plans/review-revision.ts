import { record } from '#server/audit/record';
import { type Caller } from '#server/caller';
import { type Context } from '#server/context';
import { type Plan } from '#shared/contract/plans';
import { findPlan } from './plan-queries';
import { contentOf } from './plan-rows';
import {
  headColumns,
  holdGuardBands,
  holdPlanRules,
  holdRevision,
  moveRevision,
  type NamedRevision,
} from './revision-rows';

/** Sends a draft for review. */
export function submitRevision({ db, clock }: Context, caller: Caller, named: NamedRevision): Plan {
  return db.transaction((tx) => {
    const now = clock.now();
    const held = holdRevision(tx, named, 'draft');
    const content = { ...headColumns(held), ...contentOf(tx, held.id) };
    holdPlanRules(content);
    holdGuardBands(tx, content, now);
    moveRevision(tx, held.id, { status: 'in-review', submittedAt: now.toISOString() });
    const { subjectId } = held;
    record(tx, { at: now, person: caller, action: 'submitted', subject: 'plan-revision', subjectId });
    return findPlan(tx, caller, named.id);
  });
}

/** Sends a revision in review back to draft; the reason goes on record. */
export function returnRevision({ db, clock }: Context, caller: Caller, named: NamedRevision, reason: string): Plan {
  return db.transaction((tx) => {
    const { id, subjectId } = holdRevision(tx, named, 'in-review');
    moveRevision(tx, id, { status: 'draft', submittedAt: null });
    const change = { action: 'returned', subject: 'plan-revision', subjectId, after: { reason } };
    record(tx, { at: clock.now(), person: caller, ...change });
    return findPlan(tx, caller, named.id);
  });
}
