import { type RevisionRules } from '#server/judging/lot-judging';
import { type Budget, type budgetLine } from '#shared/contract/budgets';
import { type LimitedCharacteristic } from '#shared/plan/plan-content';
import { budgetLines } from '#shared/uncertainty/budget-lines';
import { type WeightedComponent } from '#shared/uncertainty/component';
import { conformityProbability } from '#shared/uncertainty/conformity-probability';
import { coverageSentence } from '#shared/uncertainty/expanded-uncertainty';
import { acceptanceLimits, guardBand } from '#shared/uncertainty/guard-band';
import { measurementFineness } from '#shared/uncertainty/test-uncertainty-ratio';
import { judgeReading } from '#shared/verdict/reading-verdict';
import type * as z from 'zod';

type Result = NonNullable<Budget['result']>;

/** JSON has no infinity: null stands for infinitely many degrees of freedom. */
const finite = (degreesOfFreedom: number) => (Number.isFinite(degreesOfFreedom) ? degreesOfFreedom : null);

function lineOf({
  divisor,
  degreesOfFreedom,
  ...line
}: ReturnType<typeof budgetLines>['lines'][number]): z.input<typeof budgetLine> {
  return { ...line, divisor: divisor.text, degreesOfFreedom: finite(degreesOfFreedom) };
}

/**
 * What a budget combines to and how the plan's rule judges by it. SI base units.
 *
 * @param nominal what the part's model gives, for a characteristic without a target; null where it says nothing of it
 */
export function budgetResult(
  value: number,
  components: readonly WeightedComponent[],
  { lowerLimit: lower, upperLimit: upper, target }: LimitedCharacteristic,
  { revision: { decisionRule: rule, coverageFactor }, nominal }: { revision: RevisionRules; nominal: number | null },
): Result {
  const { lines, combined } = budgetLines(components);
  const limits = { lower, upper };
  const expandedUncertainty = coverageFactor * combined.standardUncertainty;
  const hasLimit = lower !== null || upper !== null;
  return {
    lines: lines.map(lineOf),
    standardUncertainty: combined.standardUncertainty,
    degreesOfFreedom: finite(combined.effectiveDegreesOfFreedom),
    expandedUncertainty,
    coverage: coverageSentence(combined, coverageFactor),
    guardBand: guardBand(rule, expandedUncertainty),
    accepted: acceptanceLimits(limits, guardBand(rule, expandedUncertainty)),
    fineness:
      expandedUncertainty > 0 ? measurementFineness(limits, expandedUncertainty, target ?? nominal) : { kind: 'none' },
    conformityProbability: hasLimit ? conformityProbability(value, combined.standardUncertainty, limits) : null,
    ...judgeReading(value, limits, { rule, expandedUncertainty }),
  };
}
