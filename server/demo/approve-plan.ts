import { type Caller } from '#server/caller';
import { type Context } from '#server/context';
import { approveRevision } from '#server/plans/approve-revision';
import { findPlan } from '#server/plans/plan-queries';
import { submitRevision } from '#server/plans/review-revision';
import { type NamedRevision } from '#server/plans/revision-rows';
import { type DemoClock } from './demo-clock';

/** The newest revision of a plan, at the version it has now. */
export function newest(context: Context, caller: Caller, planId: number): NamedRevision {
  const [revision] = findPlan(context.db, caller, planId).revisions;
  if (!revision) throw new Error('A plan without revisions.');
  return { id: planId, revision: revision.revision, version: revision.version };
}

export function submit(context: Context, author: Caller, planId: number): void {
  submitRevision(context, author, newest(context, author, planId));
}

/** Sends the newest draft for review and has it approved by somebody else. */
export function approvePlan(
  context: Context,
  clock: DemoClock,
  { planId, author, approver }: { planId: number; author: Caller; approver: Caller },
): void {
  submit(context, author, planId);
  clock.advance(540);
  approveRevision(context, approver, newest(context, approver, planId));
}
