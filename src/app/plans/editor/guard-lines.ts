import { type Characteristic, type RevisionBody } from '#shared/contract/plans';
import { formatLimits } from '#shared/quantities/format-limits';
import { inDisplayUnit } from '#shared/quantities/display-unit';
import { formatNumber } from '#shared/quantities/format-number';
import { type SiteInstrument, typicalUncertainties } from '#shared/plan/typical-uncertainty';
import { acceptanceLimits, guardBand, leavesNoAcceptance } from '#shared/uncertainty/guard-band';
import { LEAST_TEST_UNCERTAINTY_RATIO, measurementFineness } from '#shared/uncertainty/test-uncertainty-ratio';
import { uncertaintyDecimals, uncertaintyText } from '../../ui/values/uncertainty-text';

/** What the site's instruments make of one characteristic: U of a usual reading, how fine that is, and what is accepted. */
export interface GuardLine {
  readonly key: string;
  readonly name: string;
  readonly uncertainty: string;
  readonly fineness: string;
  readonly coarse: boolean;
  /** What is accepted between the guard bands; empty under simple acceptance and without limits. */
  readonly accepted: string;
  readonly nothingLeft: boolean;
}

type Limited = Exclude<Characteristic, { kind: 'attribute' }>;

/** The lines of those characteristics of which U is known, in the order of the plan. */
export function guardLines(plan: RevisionBody, instruments: readonly SiteInstrument[]): GuardLine[] {
  const typical = typicalUncertainties(plan, instruments);
  return plan.characteristics.flatMap((one) => {
    const uncertainty = typical.get(one.key);
    if (one.kind === 'attribute' || uncertainty === undefined || !(uncertainty > 0)) return [];
    return [guardLine(one, plan.decisionRule, uncertainty)];
  });
}

function guardLine(one: Limited, rule: RevisionBody['decisionRule'], uncertainty: number): GuardLine {
  const limits = { lower: one.lowerLimit, upper: one.upperLimit };
  const width = guardBand(rule, uncertainty);
  const { text, coarse } = finenessText(one, uncertainty);
  const nothingLeft = width > 0 && leavesNoAcceptance(limits, width);
  return {
    key: one.key,
    name: one.name,
    uncertainty: uncertaintyText(uncertainty, one.unit),
    fineness: text,
    coarse,
    accepted: width === 0 ? '' : nothingLeft ? 'nothing' : acceptedText(one, width),
    nothingLeft,
  };
}

function acceptedText({ lowerLimit, upperLimit, unit, decimals }: Limited, width: number): string {
  const { lower, upper } = acceptanceLimits({ lower: lowerLimit, upper: upperLimit }, width);
  if (lower === null && upper === null) return '';
  return formatLimits(lower, upper, unit, Math.max(decimals, uncertaintyDecimals(width, unit)));
}

function finenessText(one: Limited, uncertainty: number): { text: string; coarse: boolean } {
  const limits = { lower: one.lowerLimit, upper: one.upperLimit };
  const found = measurementFineness(limits, uncertainty, one.target);
  if (found.kind === 'ratio') {
    const ratio = formatNumber(found.ratio, found.ratio < 10 ? 1 : 0);
    return { text: found.coarse ? `${ratio}, under ${LEAST_TEST_UNCERTAINTY_RATIO}` : ratio, coarse: found.coarse };
  }
  if (found.kind === 'none') return { text: '', coarse: false };
  return { text: `${formatNumber(inDisplayUnit(found.share, '%'), 0)}\u00a0% of margin`, coarse: false };
}
