import { type Characteristic, DECISION_RULE_TITLES, type DecisionRule } from '#shared/contract/plans';
import { formatLimits } from '#shared/quantities/format-limits';
import { acceptanceLimits, leavesNoAcceptance } from '#shared/uncertainty/guard-band';
import { readingText } from '../../../ui/values/reading-text';
import { uncertaintyDecimals, uncertaintyText } from '../../../ui/values/uncertainty-text';

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
  // As fine as the guard band, or a narrow one would not show.
  const fine = Math.max(decimals, uncertaintyDecimals(uncertainty, unit));
  const text = (value: number) => readingText(value, unit, fine);
  const guard = `Guard band ${uncertaintyText(uncertainty, unit).slice(2)}.`;
  if (accepted.lower === null) return `Accept to ${text(accepted.upper ?? 0)}. ${guard}`;
  if (accepted.upper === null) return `Accept from ${text(accepted.lower)}. ${guard}`;
  return `Accept ${formatLimits(accepted.lower, accepted.upper, unit, fine)}. ${guard}`;
}
