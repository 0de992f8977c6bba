import { type Assessment } from '#shared/contract/decision';
import { type UnitState } from '../../ui/tally/tally-shapes';

type AssessedState = Assessment['units'][number]['state'];

const STATES: Readonly<Record<AssessedState, UnitState>> = {
  conforming: 'ok',
  minor: 'minor',
  major: 'major',
  critical: 'critical',
  undecided: 'hold',
  'not-judged': null,
};

/** What the tally shows of an assessed unit. */
export function tallyState(state: AssessedState): UnitState {
  return STATES[state];
}

/** Unit numbers as a list that stays short: "23, 58" or "1, 2, 3 and 40 more". */
export function unitNumbers(units: readonly number[], most = 8): string {
  if (units.length <= most) return units.join(', ');
  return `${units.slice(0, most).join(', ')} and ${units.length - most} more`;
}
