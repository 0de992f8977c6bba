import { type SamplingGroup } from '../sampling/sampling-group';
import { type JudgingRules } from './judging-rules';
import { type GroupVerdict, type UnitVerdict } from './sample-verdict';
import { staysAtClass, unitInGroup } from './unit-in-group';
import { acceptanceClause, openReason, rejectionClause, sentence, uncertainReason } from './verdict-reason';

interface Tally {
  found: number;
  /** Of those found, the units that may still move to a worse class. */
  unsettled: number;
  judged: number;
  undecided: number;
}

function tallyOf(group: SamplingGroup, rules: JudgingRules, units: readonly UnitVerdict[]): Tally {
  const tally: Tally = { found: 0, unsettled: 0, judged: 0, undecided: 0 };
  for (const unit of units) {
    const { counts, state } = unitInGroup(group, unit);
    if (state === 'judged') tally.judged += 1;
    if (state === 'undecided') tally.undecided += 1;
    if (counts) tally.found += 1;
    if (counts && !staysAtClass(rules.characteristics, unit)) tally.unsettled += 1;
  }
  return tally;
}

function decide(group: SamplingGroup, tally: Tally): Pick<GroupVerdict, 'verdict' | 'reason'> {
  const { found, unsettled, judged, undecided } = tally;
  if (found - unsettled >= group.rejection) {
    return { verdict: 'rejected', reason: sentence('Rejected', [rejectionClause(group, found, judged)]) };
  }
  if (found >= group.rejection) return { verdict: 'open', reason: uncertainReason(group, found, unsettled) };
  if (judged < group.sampleSize) {
    return { verdict: 'open', reason: openReason({ judged, undecided, sampleSize: group.sampleSize }) };
  }
  return { verdict: 'accepted', reason: sentence('Accepted', [acceptanceClause(group, found)]) };
}

/**
 * Combines unit verdicts into the verdict of each sampling group, in the order of the groups.
 *
 * A group rejects as soon as its rejection number is reached by units that can no longer move to a worse class, and
 * accepts when every unit it covers is judged and the number is not reached.
 *
 * @param units one verdict a unit, in any order; units not yet measured may be left out
 */
export function judgeGroups(rules: JudgingRules, units: readonly UnitVerdict[]): GroupVerdict[] {
  return rules.groups.map((group) => {
    const tally = tallyOf(group, rules, units);
    return {
      group,
      found: tally.found,
      undecided: tally.undecided,
      judged: tally.judged,
      moreToReject: Math.max(0, group.rejection - tally.found),
      ...decide(group, tally),
    };
  });
}
