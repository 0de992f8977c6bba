import { record } from '#server/audit/record';
import { type Caller } from '#server/caller';
import { type Context } from '#server/context';
import { type Plan, type RevisionBody } from '#shared/contract/plans';
import { findPlan } from './plan-queries';
import { contentOf } from './plan-rows';
import {
  headColumns,
  holdPlanRules,
  holdRevision,
  keepContent,
  moveRevision,
  type NamedRevision,
} from './revision-rows';

/** Changes a draft; whoever does has written it, and cannot approve it. */
export function changeRevision({ db, clock }: Context, caller: Caller, named: NamedRevision, body: RevisionBody): Plan {
  return db.transaction((tx) => {
    const held = holdRevision(tx, named, 'draft');
    holdPlanRules(body);
    const before = { ...headColumns(held), ...contentOf(tx, held.id) };
    keepContent(tx, held.id, body);
    moveRevision(tx, held.id, headColumns(body));
    const change = { action: 'changed', subject: 'plan-revision', subjectId: held.subjectId, before, after: body };
    record(tx, { at: clock.now(), person: caller, ...change });
    return findPlan(tx, caller, named.id);
  });
}
