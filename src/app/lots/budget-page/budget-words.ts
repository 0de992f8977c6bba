import { type Budget } from '#shared/contract/budgets';
import { DECISION_RULE_TITLES } from '#shared/contract/plans';
import { FORMULAS } from '#shared/measurement/formula';
import { displayUnit, inDisplayUnit, unitParts } from '#shared/quantities/display-unit';
import { formatLimits } from '#shared/quantities/format-limits';
import { formatNumber } from '#shared/quantities/format-number';
import { formatQuantity } from '#shared/quantities/format-quantity';
import { LEAST_TEST_UNCERTAINTY_RATIO } from '#shared/uncertainty/test-uncertainty-ratio';
import { uncertaintyDecimals } from '../../ui/values/uncertainty-text';

type Result = NonNullable<Budget['result']>;
type Limited = Exclude<Budget['characteristic'], { kind: 'attribute' }>;

/** An uncertainty or half-width to three significant digits, in the prefix that suits it. */
export function smallQuantity(value: number, unit: string): string {
  return formatQuantity(value, unit.replace(/ (p-p|rms)$/, ''), { significant: 3 });
}

/** How much the result changes with an input: a plain number where both are of one kind, else as 8.33 %/V. */
export function sensitivityText(sensitivity: number, resultUnit: string, inputUnit: string): string {
  if (unitParts(resultUnit).unit === unitParts(inputUnit).unit) return plainNumber(sensitivity);
  const { base } = displayUnit(inputUnit);
  return `${smallQuantity(sensitivity, resultUnit)}/${base.replace(/ (p-p|rms)$/, '')}`;
}

function plainNumber(value: number): string {
  if (Number.isInteger(value)) return formatNumber(value, 0);
  const digits = Math.max(0, 2 - Math.floor(Math.log10(Math.abs(value))));
  return formatNumber(value, Math.min(digits, 9));
}

/** A share of the variance: whole percents, and the smallest as less than one. */
export function shareText(share: number): string {
  const percent = inDisplayUnit(share, '%');
  return percent > 0 && percent < 1 ? `<\u00a01\u00a0%` : `${formatNumber(percent, 0)}\u00a0%`;
}

/** A probability, never rounded to certainty. */
export function probabilityText(probability: number): string {
  const percent = inDisplayUnit(probability, '%');
  if (percent > 99.99) return 'more than 99.99\u00a0%';
  if (percent < 0.01) return 'less than 0.01\u00a0%';
  return `${formatNumber(percent, percent > 99 || percent < 1 ? 2 : 1)}\u00a0%`;
}

/** Limits, finely enough that a guard band shows in them. */
export function limitsText({ lower, upper }: Result['accepted'], { unit, decimals }: Limited, guardBand = 0): string {
  if (lower === null && upper === null) return 'none';
  if (lower !== null && upper !== null && lower > upper) return 'nothing: the guard bands meet';
  return formatLimits(lower, upper, unit, Math.max(decimals, guardBand > 0 ? uncertaintyDecimals(guardBand, unit) : 0));
}

/** Why the value is judged as it is, under the plan's rule. */
export function verdictSentence({ verdict, side }: Result, rule: Budget['decisionRule'], hasLimits: boolean): string {
  if (!hasLimits) return 'There is no limit: the value is recorded and fails no unit.';
  switch (verdict) {
    case 'conforming':
      return rule === 'simple' ? 'It lies within the limits.' : 'It lies within what the guard bands leave.';
    case 'conditional':
      return side === 'inside'
        ? 'It lies within the limits, but nearer to one than U: its unit is undecided until quality rules.'
        : 'It lies outside a limit, but by less than U: its unit is undecided until quality rules.';
    case 'nonconforming':
      if (rule === 'simple') return 'It lies outside the limits.';
      return rule === 'guarded'
        ? 'It lies outside what the guard bands leave.'
        : 'It lies outside a limit by more than U.';
    case 'not judged':
      return 'The rule needs its uncertainty.';
  }
}

/** How fine the measurement is for its limits, with what that means. */
export function finenessText(fineness: Result['fineness'], { unit, target }: Limited): string {
  switch (fineness.kind) {
    case 'ratio': {
      const ratio = formatNumber(fineness.ratio, fineness.ratio < 10 ? 1 : 0);
      return fineness.coarse ? `${ratio}, coarse: under ${LEAST_TEST_UNCERTAINTY_RATIO}` : ratio;
    }
    case 'distance': {
      const share = formatNumber(inDisplayUnit(fineness.share, '%'), 0);
      return `not defined for one limit; U is ${share}\u00a0% of the ${smallQuantity(fineness.distance, unit)} from ${target === null ? 'the model’s value' : 'target'} to limit`;
    }
    case 'none':
      return 'not defined without a second limit or a typical value';
  }
}

/** The rule of the plan with its name. */
export function ruleTitle({ decisionRule }: Budget): string {
  return DECISION_RULE_TITLES[decisionRule];
}

/** What an input of a computed characteristic's formula is called; empty for a reading itself. */
export function inputTitle({ characteristic }: Budget, input: string | null): string {
  if (input === null || characteristic.kind !== 'computed') return '';
  return FORMULAS[characteristic.formula.key].inputs.find(({ name }) => name === input)?.title ?? input;
}

/** Degrees of freedom; null are infinitely many. */
export function freedomText(degreesOfFreedom: number | null): string {
  return degreesOfFreedom === null ? '∞' : formatNumber(Math.floor(degreesOfFreedom), 0);
}
