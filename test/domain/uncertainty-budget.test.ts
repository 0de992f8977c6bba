import { FORMULAS } from '#shared/measurement/formula';
import { combine } from '#shared/uncertainty/combine';
import { rectangular, unweighted, type Component } from '#shared/uncertainty/component';
import { type InstrumentRange } from '#shared/uncertainty/instrument-range';
import { NoSensitivity, propagate } from '#shared/uncertainty/propagate';
import { readingBudget } from '#shared/uncertainty/reading-budget';
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

/** The accuracy component of a reading on the meter: 0.1 % of it, 0.02 % of 20 V and 3 counts. */
function accuracyAt(reading: number): Component {
  const [accuracy] = readingBudget(reading, null, METER);
  if (!accuracy) throw new Error('A budget starts with the accuracy of the range.');
  return accuracy;
}

describe('the budget of a reading out of a captured file', () => {
  it('has the accuracy of the range, and the resolution of its samples where that is known', () => {
    expect(readingBudget(1.5, { kind: 'waveform' }, METER)).toHaveLength(1);
    const [, ...samples] = readingBudget(1.5, { kind: 'waveform', resolution: 0.02 }, SCOPE);
    expect(samples.map((one) => one.standardUncertainty)).toEqual([
      expect.closeTo(0.02 / Math.sqrt(12), 12),
      expect.closeTo(0.02 / Math.sqrt(12), 12),
    ]);
  });

  it('takes the smallest scale that shows the wave, as no scale was noted', () => {
    // 1.5 V p-p on 8 divisions: 0.2 V per division; 2 % of it and 0.5 % of 1.6 V.
    expect(readingBudget(1.5, { kind: 'waveform' }, SCOPE)[0]?.halfWidth).toBeCloseTo(0.03 + 0.008, 12);
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

  const zeroOnly = (name: string, reading: number) =>
    [
      name,
      { value: reading, components: readingBudget(reading, null, { ...METER, ofReading: 0, resolution: 0 }) },
    ] as const;

  it('add over opposite polarities where they are a gain error, and cancel where they are a zero error', () => {
    const span = (given: Readonly<Record<string, number>>) => value(given, 'a') - value(given, 'b');
    const gain = propagate(span, inputs(12, -12));
    expect(combine(gain.components).standardUncertainty).toBeCloseTo((0.001 * 24) / Math.sqrt(3), 9);
    const zero = propagate(span, new Map([zeroOnly('a', 12), zeroOnly('b', -12)]));
    expect(combine(zero.components).standardUncertainty).toBeLessThan(1e-9);
  });

  it('cancel of both kinds in one reading against another of the same value', () => {
    const readings = new Map(['a', 'b'].map((name) => [name, { value: 9, components: [accuracyAt(9)] }]));
    const difference = propagate((given) => value(given, 'a') - value(given, 'b'), readings);
    expect(combine(difference.components).standardUncertainty).toBeLessThan(1e-9);
  });

  it('never let a gain error cancel a zero error: their terms add', () => {
    const own = accuracyAt(12);
    expect(combine([{ component: own, sensitivity: -1 }]).standardUncertainty).toBeCloseTo(own.standardUncertainty, 12);
    const opposed = { ...own, proportional: -own.proportional };
    const both = [own, opposed].map((component) => ({ component, sensitivity: 1 }));
    const zero = own.standardUncertainty - own.proportional;
    expect(combine(both).standardUncertainty).toBeCloseTo(2 * zero, 12);
  });

  it('are those of one scale of a screen; another scale has errors of its own', () => {
    const read = (divisions: number, voltsPerDivision: number) =>
      readingBudget(
        divisions * voltsPerDivision,
        { kind: 'scope', scope: { form: 'whole', divisions, voltsPerDivision, probeFactor: 1, coupling: 'ac' } },
        SCOPE,
      )[0]?.origin;
    expect(read(4, 0.5)).toBe(read(3, 0.5));
    expect(read(4, 0.5)).not.toBe(read(4, 0.2));
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
    // 100 000 draws leave the deviation uncertain by 0.2 %.
    expect(Math.abs(combine(propagated.components).standardUncertainty / deviation - 1)).toBeLessThan(0.01);
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

describe('the rated voltage a formula takes', () => {
  it('is exact: the uncertainty is that of the readings against it', () => {
    const inputs = new Map([
      ['no_load', { value: 16, components: [rectangular('no load', 0.3)] }],
      ['loaded', { value: 12, components: [rectangular('loaded', 0.4)] }],
    ]);
    const { value, components } = propagate(FORMULAS['load-regulation-rated'].compute, inputs, { rated: 10 });
    expect(value).toBeCloseTo(0.4, 12);
    expect(components).toHaveLength(2);
    expect(combine(components).standardUncertainty).toBeCloseTo(0.05 / Math.sqrt(3), 9);
  });
});

describe('a formula at the end of its domain', () => {
  const rippleRatio = (given: Readonly<Record<string, number>>) => FORMULAS['ripple-ratio'].compute(given);
  const inputs = (ripple: number, loaded: number) =>
    new Map([
      ['ripple', { value: ripple, components: [rectangular('ripple', 0.01)] }],
      ['loaded', { value: loaded, components: [rectangular('loaded', 0.01)] }],
    ]);

  it('is propagated by the side that it has: no ripple at all', () => {
    const { value, components } = propagate(rippleRatio, inputs(0, 10));
    expect(value).toBe(0);
    expect(combine(components).standardUncertainty).toBeCloseTo(0.01 / Math.sqrt(3) / 10, 9);
  });

  it('says so where it has none', () => {
    const onlyAtOne = (given: Readonly<Record<string, number>>) => {
      if (given['x'] !== 1) throw new RangeError('x must be 1.');
      return 1;
    };
    const input = new Map([['x', { value: 1, components: [rectangular('x', 0.1)] }]]);
    expect(() => propagate(onlyAtOne, input)).toThrow(NoSensitivity);
  });

  it('hides no fault of the program', () => {
    const broken = (given: Readonly<Record<string, number>>) => {
      if (given['x'] !== 1) throw new TypeError('broken');
      return 1;
    };
    const input = new Map([['x', { value: 1, components: [rectangular('x', 0.1)] }]]);
    expect(() => propagate(broken, input)).toThrow('broken');
  });
});
