import { type JudgingRules } from './judging-rules';
import { type GroupVerdict, type LotVerdict, type UnitVerdict } from './sample-verdict';
import { unitInGroup } from './unit-in-group';
import { acceptanceClause, openReason, rejectionClause, sentence } from './verdict-reason';

function progressOf(rules: JudgingRules, units: readonly UnitVerdict[]) {
  const progress = { judged: 0, undecided: 0, sampleSize: rules.sampleSize };
  for (const unit of units) {
    if (unit.unit > rules.sampleSize) continue;
    const states = rules.groups.map((group) => unitInGroup(group, unit).state);
    if (states.includes('undecided')) progress.undecided += 1;
    else if (!states.includes('open')) progress.judged += 1;
  }
  return progress;
}

function continueReason(rules: JudgingRules, units: readonly UnitVerdict[], groups: readonly GroupVerdict[]): string {
  const uncertain = groups.find((each) => each.moreToReject === 0);
  return uncertain?.reason ?? openReason(progressOf(rules, units));
}

/**
 * Combines group verdicts into the verdict of the lot: rejected as soon as any group rejects, accepted when every group
 * accepts, open until then.
 *
 * @param groups the verdicts of the rules' groups over these units
 */
export function judgeLot(
  rules: JudgingRules,
  units: readonly UnitVerdict[],
  groups: readonly GroupVerdict[],
): LotVerdict {
  const complete = groups.every(({ judged, undecided, group }) => judged + undecided >= group.sampleSize);
  const rejecting = groups.filter(({ verdict }) => verdict === 'rejected');
  if (rejecting.length > 0) {
    const clauses = rejecting.map(({ group, found, judged }) => rejectionClause(group, found, judged));
    return { verdict: 'rejected', reason: sentence('Rejected', clauses), stop: true, complete };
  }
  if (groups.every(({ verdict }) => verdict === 'accepted')) {
    const clauses = groups.map(({ group, found }) => acceptanceClause(group, found));
    return { verdict: 'accepted', reason: sentence('Accepted', clauses), stop: false, complete };
  }
  return { verdict: 'continue', reason: continueReason(rules, units, groups), stop: false, complete };
}
