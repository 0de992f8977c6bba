import { efficiency, type EfficiencyInput } from './efficiency';

/** The loads at which efficiency is measured, in percent of the nameplate current. */
export const LOAD_POINTS = [100, 75, 50, 25] as const;

/**
 * Average active-mode efficiency, as a fraction: the mean of the efficiencies at 100, 75, 50 and 25 % load, not the ratio of
 * summed powers.
 *
 * Source: 10 CFR part 430, subpart B, Appendix Z; Commission Regulation (EU) 2019/1782, Annex II.
 *
 * @param points one for each load that the unit can sustain
 * @throws {RangeError} where there is none, or a power is outside the domain
 */
export function averageActiveEfficiency(points: readonly EfficiencyInput[]): number {
  if (points.length === 0) throw new RangeError('points must hold at least one load.');
  return points.reduce((sum, point) => sum + efficiency(point), 0) / points.length;
}
