/** How measurement uncertainty enters a verdict. Source: ILAC-G8:09/2019, 4.2. */
export type DecisionRule = 'simple' | 'guarded' | 'non-binary';

/** Limits in the unit of the value; null is no limit. */
interface Limits {
  lower: number | null;
  upper: number | null;
}

/** Width of the guard band: none under simple acceptance, U under the other two rules (ILAC-G8:09/2019, Table 2). */
export function guardBand(rule: DecisionRule, expandedUncertainty: number): number {
  return rule === 'simple' ? 0 : expandedUncertainty;
}

/** The limits between which a reading is accepted: those of the specification, pulled in by the guard band. */
export function acceptanceLimits({ lower, upper }: Limits, width: number): Limits {
  return { lower: lower === null ? null : lower + width, upper: upper === null ? null : upper - width };
}

/** Whether the guard bands of two limits leave nothing between them, so that no reading could ever be accepted. */
export function leavesNoAcceptance(limits: Limits, width: number): boolean {
  const { lower, upper } = acceptanceLimits(limits, width);
  return lower !== null && upper !== null && lower > upper;
}
