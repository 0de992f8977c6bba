import { REVIEWED_PART, REVISED_PART, reviewedRevision, secondRevision, thirdRevision } from '#db/demo/demo-plans';
import { demoPart } from '#db/demo/demo-parts';
import { type Quarter } from '#db/demo/quarter';
import { type Caller } from '#server/caller';
import { type Context } from '#server/context';
import { addRevision } from '#server/plans/add-revision';
import { approveRevision } from '#server/plans/approve-revision';
import { changeRevision } from '#server/plans/change-revision';
import { findPlan } from '#server/plans/plan-queries';
import { submitRevision } from '#server/plans/review-revision';
import { type NamedRevision } from '#server/plans/revision-rows';
import { type RevisionBody } from '#shared/contract/plans';
import { type Agenda } from './agenda';
import { type Cast } from './cast';
import { type DemoClock } from './demo-clock';
import { type Stage } from './stage';

/** The newest revision of a plan, at the version it has now. */
function newest(context: Context, caller: Caller, planId: number): NamedRevision {
  const [revision] = findPlan(context.db, caller, planId).revisions;
  if (!revision) throw new Error('A plan without revisions.');
  return { id: planId, revision: revision.revision, version: revision.version };
}

function draft(context: Context, author: Caller, planId: number, content: RevisionBody): void {
  addRevision(context, author, planId);
  changeRevision(context, author, newest(context, author, planId), content);
}

function submit(context: Context, author: Caller, planId: number): void {
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

/** Puts the revisions of the quarter on the agenda: one that becomes effective, one left a draft, one left in review. */
export function addPlanSteps(
  context: Context,
  clock: DemoClock,
  agenda: Agenda,
  { cast, stage, quarter }: { cast: Cast; stage: Stage; quarter: Quarter },
): void {
  const [first, second] = cast.quality;
  const revised = stage.planIds.get(REVISED_PART);
  const reviewed = stage.planIds.get(REVIEWED_PART);
  if (revised === undefined || reviewed === undefined) throw new Error('A plan of the demo was not added.');
  agenda.add(quarter.revisedAt, () => {
    draft(context, first, revised, secondRevision(demoPart(REVISED_PART)));
    clock.advance(240);
    approvePlan(context, clock, { planId: revised, author: first, approver: second });
  });
  agenda.add(quarter.lastAfternoon, () => {
    draft(context, second, revised, thirdRevision(demoPart(REVISED_PART)));
    clock.advance(300);
    draft(context, first, reviewed, reviewedRevision(demoPart(REVIEWED_PART)));
    clock.advance(60);
    submit(context, first, reviewed);
  });
}
