import { combine } from '#shared/uncertainty/combine';
import { normal, rectangular, unweighted } from '#shared/uncertainty/component';
import { conformityProbability } from '#shared/uncertainty/conformity-probability';
import {
  coverageSentence,
  expandedUncertainty,
  isDominatedByRectangular,
} from '#shared/uncertainty/expanded-uncertainty';
import { globalRisk } from '#shared/uncertainty/global-risk';
import { leavesNoAcceptance } from '#shared/uncertainty/guard-band';
import { measurementFineness } from '#shared/uncertainty/test-uncertainty-ratio';
import { judgeReading } from '#shared/verdict/reading-verdict';
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';

describe('what k covers', () => {
  const dominated = combine(unweighted([rectangular('accuracy', 1), rectangular('resolution', 0.1)]));

  it('is said for a dominating rectangular component, whatever k is', () => {
    expect(isDominatedByRectangular(dominated)).toBe(true);
    expect(coverageSentence(dominated, 2)).toMatch(/k = 2 covers more than 95 %/);
    expect(coverageSentence(dominated, 1.65)).toMatch(/k = 1.65 covers about 95 %/);
    expect(coverageSentence(dominated, 1)).toMatch(/k = 1 covers less than 95 %/);
  });

  it('is that of a normal distribution where several alike make the sum', () => {
    const several = combine(unweighted(['a', 'b', 'c', 'd'].map((name) => rectangular(name, 1))));
    expect(isDominatedByRectangular(several)).toBe(false);
    expect(coverageSentence(several, 2)).toBe('k = 2 covers about 95 % of a normal distribution.');
    expect(coverageSentence(combine(unweighted([normal('few', 1, { degreesOfFreedom: 4 })])), 2)).toMatch(
      /4 effective/,
    );
    expect(coverageSentence(combine([]), 2)).toBe('No component of uncertainty is known.');
  });

  it('takes one error that two readings share for one component', () => {
    const shared = ['a', 'b'].map((name) => rectangular(name, 1, 'range 1'));
    expect(isDominatedByRectangular(combine(unweighted(shared)))).toBe(true);
  });
});

describe('global risks of a fine measurement', () => {
  it('are those of its own width at the limits', () => {
    // Near a limit the density is that of the limit, and the integral of Φ(-t/u) over t from 0 is u / √(2π).
    const u = 1e-4;
    const process = { mean: 0, processDeviation: 1, standardUncertainty: u, lower: null, upper: 1, guardWidth: 0 };
    const expected = (Math.exp(-0.5) / Math.sqrt(2 * Math.PI)) * (u / Math.sqrt(2 * Math.PI));
    expect(globalRisk(process).consumer / expected).toBeCloseTo(1, 3);
    expect(globalRisk(process).producer / expected).toBeCloseTo(1, 3);
    expect(() => globalRisk({ ...process, standardUncertainty: 0 })).toThrow(RangeError);
    expect(() => globalRisk({ ...process, mean: Number.NaN })).toThrow(RangeError);
  });

  it('cost more good units and let fewer bad ones pass, the wider the guard band', () => {
    const at = (guardWidth: number) =>
      globalRisk({ mean: 12, processDeviation: 0.2, standardUncertainty: 0.05, lower: 11.5, upper: 12.5, guardWidth });
    const widths = [0, 0.05, 0.1, 0.2];
    const risks = widths.map(at);
    expect(risks.map(({ consumer }) => consumer)).toEqual(risks.map((one) => one.consumer).sort((a, b) => b - a));
    expect(risks.map(({ producer }) => producer)).toEqual(risks.map((one) => one.producer).sort((a, b) => a - b));
  });
});

describe('decisions by uncertainty', () => {
  const value = fc.double({ min: -20, max: 20, noNaN: true });
  const width = fc.double({ min: 0, max: 3, noNaN: true });
  const limits = { lower: -5, upper: 5 };

  it('guarded acceptance never takes what simple acceptance refuses', () => {
    fc.assert(
      fc.property(value, width, (y, expandedUncertainty) => {
        const simple = judgeReading(y, limits, { rule: 'simple', expandedUncertainty: null }).verdict;
        const guarded = judgeReading(y, limits, { rule: 'guarded', expandedUncertainty }).verdict;
        const both = judgeReading(y, limits, { rule: 'non-binary', expandedUncertainty });
        if (simple === 'nonconforming') expect(guarded).toBe('nonconforming');
        if (guarded === 'conforming') expect(both.verdict).toBe('conforming');
        if (both.verdict === 'conforming') expect(simple).toBe('conforming');
        if (both.verdict === 'nonconforming') expect(simple).toBe('nonconforming');
      }),
    );
  });

  it('a reading without a known uncertainty is not judged by a rule that needs it', () => {
    for (const rule of ['guarded', 'non-binary'] as const)
      expect(judgeReading(0, limits, { rule, expandedUncertainty: null }).verdict).toBe('not judged');
    expect(judgeReading(0, { lower: null, upper: null }, { rule: 'guarded', expandedUncertainty: null }).verdict).toBe(
      'conforming',
    );
  });

  it('guard bands that meet leave nothing to accept', () => {
    expect(leavesNoAcceptance(limits, 5)).toBe(false);
    expect(leavesNoAcceptance(limits, 5.1)).toBe(true);
    expect(judgeReading(0, limits, { rule: 'guarded', expandedUncertainty: 6 }).verdict).toBe('nonconforming');
    expect(judgeReading(0, limits, { rule: 'non-binary', expandedUncertainty: 6 })).toMatchObject({
      verdict: 'conditional',
      side: 'inside',
    });
  });

  it('the probability of conformity is one, and falls as the value leaves the limits', () => {
    fc.assert(
      fc.property(value, fc.double({ min: 0.01, max: 3, noNaN: true }), (y, u) => {
        const p = conformityProbability(y, u, limits);
        expect(p).toBeGreaterThanOrEqual(0);
        expect(p).toBeLessThanOrEqual(1);
        expect(conformityProbability(Math.abs(y) + 1, u, limits)).toBeLessThanOrEqual(
          conformityProbability(Math.abs(y), u, limits) + 1e-12,
        );
      }),
    );
  });

  it('U grows with k, and with its components all alike', () => {
    const widths = fc.array(fc.double({ min: 0, max: 10, noNaN: true }), { minLength: 1, maxLength: 6 });
    const scale = fc.double({ min: 0.01, max: 100, noNaN: true });
    fc.assert(
      fc.property(widths, scale, fc.boolean(), (halfWidths, factor, shared) => {
        const budget = (by: number) =>
          halfWidths.map((one, index) => rectangular(`line ${index}`, one * by, shared ? 'range 1' : null));
        const U = expandedUncertainty(budget(1), 2);
        expect(expandedUncertainty(budget(factor), 2)).toBeCloseTo(factor * U, 6);
        expect(U).toBeCloseTo(2 * combine(unweighted(budget(1))).standardUncertainty, 9);
        expect(expandedUncertainty(budget(1), 2 * factor)).toBeCloseTo(factor * U, 6);
        expect(U).toBeGreaterThanOrEqual(expandedUncertainty(budget(1).slice(1), 2) - 1e-9);
      }),
    );
  });
});

describe('how fine a measurement is for its limits', () => {
  it('is a ratio for two limits, coarse under 4', () => {
    expect(measurementFineness({ lower: 11.4, upper: 12.6 }, 0.1, 12)).toEqual({
      kind: 'ratio',
      ratio: expect.closeTo(6, 9) as number,
      coarse: false,
    });
    expect(measurementFineness({ lower: 11.4, upper: 12.6 }, 0.2, 12)).toMatchObject({ coarse: true });
  });

  it('is what U is of the way from target to limit for one limit, where a target is known', () => {
    expect(measurementFineness({ lower: null, upper: 2.4 }, 0.1, 1.9)).toEqual({
      kind: 'distance',
      distance: expect.closeTo(0.5, 9) as number,
      share: expect.closeTo(0.2, 9) as number,
    });
    expect(measurementFineness({ lower: null, upper: 2.4 }, 0.1, null)).toEqual({ kind: 'none' });
  });
});
