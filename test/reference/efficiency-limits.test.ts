import { averageActiveEfficiency } from '#shared/measurement/average-active-efficiency';
import { efficiency } from '#shared/measurement/efficiency';
import { efficiencyLimits, SUPPLY_CLASSES, supplyClassOf } from '#shared/measurement/efficiency-limits';
import { describe, expect, it } from 'vitest';
import reference from './data/g-eps-efficiency.json' with { type: 'json' };

// Source: 10 CFR 430.32(w)(1)(ii) and Commission Regulation (EU) 2019/1782, Annex II; recomputed from their formulas
// (data/g-eps-efficiency.json tells what was read and what is from memory).
describe('what the law asks of an external supply', () => {
  it.each(reference.check_points.points)('$cls, $Pout_W W', (point) => {
    const supply = SUPPLY_CLASSES.find((one) => one === point.cls);
    if (!supply) throw new Error(`No such class: ${point.cls}`);
    const limits = efficiencyLimits(supply, point.Pout_W);
    expect(limits.averageEfficiency).toBeCloseTo(point.min_efficiency, 9);
    expect(limits.noLoadWattsUs).toBe(point.max_no_load_us_W);
    expect(limits.noLoadWattsEu).toBe(point.max_no_load_eu_W);
  });

  // Source: constructed case, method of 10 CFR 430 Appendix Z: the mean of four efficiencies, not of summed powers.
  it.each(reference.cases)(
    '$id $inputs.nameplate',
    ({ inputs, eff, average, required, wrong_method_sum_of_powers }) => {
      const points = inputs.Pout.map((outputWatts, index) => ({ outputWatts, inputWatts: inputs.Pin[index] ?? 0 }));
      expect(points.map(efficiency)).toEqual(eff.map((one) => expect.closeTo(one, 9) as number));
      expect(averageActiveEfficiency(points)).toBeCloseTo(average, 9);
      expect(averageActiveEfficiency(points)).not.toBeCloseTo(wrong_method_sum_of_powers, 3);
      expect(efficiencyLimits(supplyClassOf(12, 1.5), 18).averageEfficiency).toBeCloseTo(required, 9);
      expect(averageActiveEfficiency(points)).toBeGreaterThan(required);
      expect(inputs.no_load_W).toBeLessThan(efficiencyLimits('basic', 18).noLoadWattsEu ?? 0);
    },
  );

  it('a supply of 5 V and 1 A is a low-voltage one, of 5 V and 0.5 A or of 6 V it is not', () => {
    expect(supplyClassOf(5, 1)).toBe('low');
    expect(supplyClassOf(5, 0.5)).toBe('basic');
    expect(supplyClassOf(6, 1)).toBe('basic');
  });
});
