import { type Characteristic, DECISION_RULE_TITLES, type DecisionRule } from '#shared/contract/plans';
import { acceptanceLimits, leavesNoAcceptance } from '#shared/uncertainty/guard-band';
import { readingText } from '../../../ui/values/reading-text';
import { uncertaintyText } from '../../../ui/values/uncertainty-text';

/** How a value is judged: by its limits alone, or between limits pulled in by its uncertainty. SI base units. */
export function ruleWords(rule: DecisionRule, characteristic: Characteristic, uncertainty: number | null): string {
  if (characteristic.kind === 'attribute') return 'Judged by eye';
  const { lowerLimit: lower, upperLimit: upper, unit, decimals } = characteristic;
  if (lower === null && upper === null) return 'No limits';
  if (rule === 'simple') return DECISION_RULE_TITLES.simple;
  if (uncertainty === null) return `${DECISION_RULE_TITLES[rule]}; the uncertainty is not known yet`;
  const limits = { lower, upper };
  if (leavesNoAcceptance(limits, uncertainty)) return 'The guard bands leave nothing to accept';
  const accepted = acceptanceLimits(limits, uncertainty);
  const text = (value: number) => readingText(value, unit, decimals);
  const guard = `Guard band ${uncertaintyText(uncertainty, unit).slice(2)}.`;
  if (accepted.lower === null) return `Accept to ${text(accepted.upper ?? 0)}. ${guard}`;
  if (accepted.upper === null) return `Accept from ${text(accepted.lower)}. ${guard}`;
  return `Accept ${text(accepted.lower)} to ${text(accepted.upper)}. ${guard}`;
}
