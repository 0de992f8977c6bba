import { REVIEWED_PART, REVISED_PART, reviewedRevision, secondRevision, thirdRevision } from '#db/demo/demo-plans';
import { demoPart } from '#db/demo/demo-parts';
import { type Quarter } from '#db/demo/quarter';
import { type Caller } from '#server/caller';
import { type Context } from '#server/context';
import { addRevision } from '#server/plans/add-revision';
import { changeRevision } from '#server/plans/change-revision';
import { type RevisionBody } from '#shared/contract/plans';
import { type Agenda } from './agenda';
import { approvePlan, newest, submit } from './approve-plan';
import { type Cast } from './cast';
import { type DemoClock } from './demo-clock';
import { type Stage } from './stage';

function draft(context: Context, author: Caller, planId: number, content: RevisionBody): void {
  addRevision(context, author, planId);
  changeRevision(context, author, newest(context, author, planId), content);
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
