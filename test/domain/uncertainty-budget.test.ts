import { combine } from '#shared/uncertainty/combine';
import { rectangular, unweighted, type Component } from '#shared/uncertainty/component';
import { conformityProbability } from '#shared/uncertainty/conformity-probability';
import { expandedUncertainty } from '#shared/uncertainty/expanded-uncertainty';
import { leavesNoAcceptance } from '#shared/uncertainty/guard-band';
import { type InstrumentRange } from '#shared/uncertainty/instrument-range';
import { propagate } from '#shared/uncertainty/propagate';
import { readingBudget } from '#shared/uncertainty/reading-budget';
import { measurementFineness } from '#shared/uncertainty/test-uncertainty-ratio';
import { judgeReading } from '#shared/verdict/reading-verdict';
import fc from 'fast-check';
import { uniformFloat64 } from 'pure-rand/distribution/uniformFloat64';
import { xoroshiro128plus } from 'pure-rand/generator/xoroshiro128plus';
import { describe, expect, it } from 'vitest';

const METER: InstrumentRange = {
  id: 7,
  form: 'digital',
  name: 'DC 20 V',
  unit: 'V',
  fullScale: 20,
  resolution: 0.001,
  ofReading: 0.001,
  ofRange: 0.0002,
  counts: 3,
};
const SCOPE: InstrumentRange = {
  id: 8,
  form: 'graticule',
  name: 'Screen',
  unit: 'V',
  screenDivisions: 8,
  ofReading: 0.02,
  ofFullScale: 0.005,
  readingStep: 0.1,
};
const settings = { voltsPerDivision: 0.05, probeFactor: 10, coupling: 'ac' } as const;
const uOf = (components: readonly Component[]) => combine(unweighted(components)).standardUncertainty;

describe('the budget of a reading', () => {
  it('adds the terms of the accuracy to one half-width, and the resolution beside it', () => {
    const [accuracy, resolution] = readingBudget(12, null, METER);
    // 0.1 % of 12 V, 0.02 % of 20 V, 3 counts of 1 mV.
    expect(accuracy?.halfWidth).toBeCloseTo(0.012 + 0.004 + 0.003, 12);
    expect(accuracy?.standardUncertainty).toBeCloseTo(0.019 / Math.sqrt(3), 12);
    expect(resolution?.standardUncertainty).toBeCloseTo(0.001 / Math.sqrt(12), 12);
  });

  it('takes two edges of a whole wave, each read to a tenth of a division', () => {
    const entry = { kind: 'scope', scope: { form: 'whole', divisions: 3.7, ...settings } } as const;
    const [accuracy, ...edges] = readingBudget(1.85, entry, SCOPE);
    // 2 % of 1.85 V and 0.5 % of 8 divisions of 0.5 V.
    expect(accuracy?.halfWidth).toBeCloseTo(0.037 + 0.02, 12);
    expect(edges.map((edge) => edge.standardUncertainty)).toEqual([
      expect.closeTo((0.1 * 0.5) / Math.sqrt(12), 12),
      expect.closeTo((0.1 * 0.5) / Math.sqrt(12), 12),
    ]);
  });

  it('takes four edges of two halves, and half of each where the mean of two peaks counts', () => {
    const halves = { form: 'halves', upperDivisions: 4, lowerDivisions: 4, ...settings } as const;
    const alternate = { form: 'alternate', higherDivisions: 4, lowerDivisions: 3, ...settings } as const;
    expect(readingBudget(4, { kind: 'scope', scope: halves }, SCOPE)).toHaveLength(5);
    expect(readingBudget(2, { kind: 'scope', scope: alternate }, SCOPE)).toHaveLength(3);
    const [, edge] = readingBudget(1.75, { kind: 'scope', scope: alternate }, SCOPE, 'mean');
    expect(edge?.standardUncertainty).toBeCloseTo((0.1 * 0.5) / Math.sqrt(12) / 2, 12);
  });
});

describe('components of one origin', () => {
  const inputs = (first: number, second: number) =>
    new Map([
      [
        'a',
        { value: first, components: readingBudget(first, null, { ...METER, ofRange: 0, counts: 0, resolution: 0 }) },
      ],
      [
        'b',
        { value: second, components: readingBudget(second, null, { ...METER, ofRange: 0, counts: 0, resolution: 0 }) },
      ],
    ]);
  const value = (given: Readonly<Record<string, number>>, name: string) => given[name] ?? Number.NaN;

  it('cancel in a ratio: a gain error changes both readings alike', () => {
    const ratio = propagate((given) => value(given, 'a') / value(given, 'b'), inputs(15, 12));
    expect(combine(ratio.components).standardUncertainty).toBeLessThan(1e-9);
  });

  it('add in a sum, not in quadrature', () => {
    const sum = propagate((given) => value(given, 'a') + value(given, 'b'), inputs(15, 12));
    expect(combine(sum.components).standardUncertainty).toBeCloseTo((0.001 * 27) / Math.sqrt(3), 9);
  });

  it('are added in quadrature where their origins differ', () => {
    const two = [rectangular('one', 0.3, 'range 1'), rectangular('other', 0.4, 'range 2')];
    expect(uOf(two)).toBeCloseTo(0.5 / Math.sqrt(3), 12);
    expect(uOf(two.map((one) => ({ ...one, origin: 'range 1' })))).toBeCloseTo(0.7 / Math.sqrt(3), 12);
    expect(uOf(two.map((one) => ({ ...one, origin: null })))).toBeCloseTo(0.5 / Math.sqrt(3), 12);
  });
});

describe('the uncertainty of a computed characteristic', () => {
  it('agrees with drawing the errors of its readings a hundred thousand times', () => {
    const compute = (given: Readonly<Record<string, number>>) =>
      ((given['open'] ?? 0) - (given['loaded'] ?? 0)) / (given['loaded'] ?? 0);
    const budget = (v: number) => readingBudget(v, null, METER);
    const propagated = propagate(
      compute,
      new Map([
        ['open', { value: 16, components: budget(16) }],
        ['loaded', { value: 12, components: budget(12) }],
      ]),
    );
    const random = xoroshiro128plus(2026);
    const draw = () => 2 * uniformFloat64(random) - 1;
    const [open, loaded] = [budget(16), budget(12)];
    const results = Array.from({ length: 100_000 }, () => {
      const shared = draw();
      return compute({
        open: 16 + shared * (open[0]?.halfWidth ?? 0) + draw() * (open[1]?.halfWidth ?? 0),
        loaded: 12 + shared * (loaded[0]?.halfWidth ?? 0) + draw() * (loaded[1]?.halfWidth ?? 0),
      });
    });
    const mean = results.reduce((sum, one) => sum + one, 0) / results.length;
    const deviation = Math.sqrt(results.reduce((sum, one) => sum + (one - mean) ** 2, 0) / (results.length - 1));
    expect(combine(propagated.components).standardUncertainty / deviation).toBeCloseTo(1, 1);
    expect(propagated.value).toBeCloseTo(mean, 4);
  });

  it('is not underrated at the corner of a balance of two equal halves', () => {
    const compute = (given: Readonly<Record<string, number>>) => Math.abs((given['a'] ?? 0) - (given['b'] ?? 0));
    const own = [rectangular('own', 0.1)];
    const balance = propagate(
      compute,
      new Map([
        ['a', { value: 10, components: own }],
        ['b', { value: 10, components: own }],
      ]),
    );
    expect(combine(balance.components).standardUncertainty).toBeCloseTo((0.1 * Math.SQRT2) / Math.sqrt(3), 6);
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

  it('U grows with k', () => {
    const components = readingBudget(12, null, METER);
    expect(expandedUncertainty(components, 3)).toBeCloseTo(1.5 * expandedUncertainty(components, 2), 12);
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
