import { describe, expect, it } from 'vitest';
import { alternatePeakDifference } from '#shared/measurement/alternate-peak-difference';
import { efficiency } from '#shared/measurement/efficiency';
import { FORMULA_KEYS, FORMULAS, type FormulaKey } from '#shared/measurement/formula';
import { loadRegulation } from '#shared/measurement/load-regulation';
import { outputResistance } from '#shared/measurement/output-resistance';
import { ReadingNotFinite } from '#shared/measurement/reading-not-finite';
import { rippleRatio } from '#shared/measurement/ripple-ratio';
import { transformerBalance } from '#shared/measurement/transformer-balance';
import { displayUnit } from '#shared/quantities/format-quantity';

describe('load regulation', () => {
  it('is stated against the loaded voltage', () => {
    expect(loadRegulation({ noLoadVolts: 15, loadedVolts: 12 })).toBe(0.25);
  });

  it('is stated against the rated voltage where the plan says so', () => {
    expect(loadRegulation({ noLoadVolts: 15, loadedVolts: 12, ratedVolts: 10 })).toBe(0.3);
  });

  it('of a negative rail is that of the positive one', () => {
    expect(loadRegulation({ noLoadVolts: -15, loadedVolts: -12 })).toBe(0.25);
  });

  it('does not exist against 0 V', () => {
    expect(() => loadRegulation({ noLoadVolts: 15, loadedVolts: 0 })).toThrow(/loadedVolts/);
    expect(() => loadRegulation({ noLoadVolts: 15, loadedVolts: 12, ratedVolts: 0 })).toThrow(/ratedVolts/);
  });
});

describe('ripple ratio', () => {
  it('is the ripple over the direct voltage, whatever its sign', () => {
    expect(rippleRatio({ rippleVolts: 1.2, loadedVolts: 12 })).toBeCloseTo(0.1, 12);
    expect(rippleRatio({ rippleVolts: 1.2, loadedVolts: -12 })).toBeCloseTo(0.1, 12);
  });

  it('names what cannot be', () => {
    expect(() => rippleRatio({ rippleVolts: -0.1, loadedVolts: 12 })).toThrow(/rippleVolts/);
    expect(() => rippleRatio({ rippleVolts: 0.1, loadedVolts: 0 })).toThrow(/loadedVolts/);
  });
});

describe('transformer balance', () => {
  it('is the difference of the halves over their mean, either way round', () => {
    expect(transformerBalance({ firstHalfVolts: 11, secondHalfVolts: 9 })).toBe(0.2);
    expect(transformerBalance({ firstHalfVolts: 9, secondHalfVolts: 11 })).toBe(0.2);
  });

  it('of one dead half is at its greatest, 200 %', () => {
    expect(transformerBalance({ firstHalfVolts: 10, secondHalfVolts: 0 })).toBe(2);
  });

  it('names what cannot be', () => {
    expect(() => transformerBalance({ firstHalfVolts: -1, secondHalfVolts: 1 })).toThrow(/firstHalfVolts/);
    expect(() => transformerBalance({ firstHalfVolts: 1, secondHalfVolts: -1 })).toThrow(/secondHalfVolts/);
    expect(() => transformerBalance({ firstHalfVolts: 0, secondHalfVolts: 0 })).toThrow(/both/);
  });
});

describe('output resistance', () => {
  it('is the fall of the voltage for each ampere more', () => {
    expect(outputResistance({ noLoadVolts: 15, loadedVolts: 12, loadAmperes: 0.5 })).toBe(6);
    expect(outputResistance({ noLoadVolts: 15, loadedVolts: 12, loadAmperes: 0.6, noLoadAmperes: 0.1 })).toBe(6);
  });

  it('needs more current at full load than at none', () => {
    expect(() => outputResistance({ noLoadVolts: 15, loadedVolts: 12, loadAmperes: 0 })).toThrow(/loadAmperes/);
  });
});

describe('efficiency', () => {
  it('needs power drawn from the line', () => {
    expect(() => efficiency({ outputWatts: 1, inputWatts: 0 })).toThrow(/inputWatts/);
    expect(() => efficiency({ outputWatts: -1, inputWatts: 1 })).toThrow(/outputWatts/);
  });
});

describe('alternate-peak difference', () => {
  it('has no sign', () => {
    expect(alternatePeakDifference({ oddPeakVolts: 12.5, evenPeakVolts: 12.25 })).toBe(0.25);
    expect(alternatePeakDifference({ oddPeakVolts: 12.25, evenPeakVolts: 12.5 })).toBe(0.25);
  });
});

describe('the formulas a plan may name', () => {
  const cases: { key: FormulaKey; inputs: Record<string, number>; expected: number }[] = [
    { key: 'load-regulation', inputs: { no_load: 15, loaded: 12 }, expected: 0.25 },
    { key: 'ripple-ratio', inputs: { ripple: 3, loaded: 12 }, expected: 0.25 },
    { key: 'transformer-balance', inputs: { half1: 11, half2: 9 }, expected: 0.2 },
    { key: 'output-resistance', inputs: { no_load: 15, loaded: 12, load_current: 0.5 }, expected: 6 },
    { key: 'efficiency', inputs: { output_power: 6, input_power: 8 }, expected: 0.75 },
    { key: 'alternate-peak-difference', inputs: { odd: 12.5, even: 12 }, expected: 0.5 },
    { key: 'load-regulation-rated', inputs: { no_load: 15, loaded: 12, rated: 12.5 }, expected: 0.24 },
    { key: 'line-regulation', inputs: { high_line: 13, low_line: 11, rated: 12.5 }, expected: 0.16 },
    { key: 'ripple-ratio-peak', inputs: { ripple: 3, peak: 15 }, expected: 0.2 },
    { key: 'ripple-factor', inputs: { ripple_rms: 1.5, loaded: 25 }, expected: 0.06 },
    { key: 'ripple-rms-estimate', inputs: { ripple: 6 * Math.sqrt(3) }, expected: 3 },
    {
      key: 'average-active-efficiency',
      inputs: { out_100: 8, in_100: 10, out_75: 6, in_75: 8, out_50: 3, in_50: 4, out_25: 1, in_25: 2 },
      expected: 0.7,
    },
    { key: 'time-constant', inputs: { resistance: 470, capacitance: 0.001 }, expected: 0.47 },
  ];

  it('are all tried here', () => {
    expect(cases.map(({ key }) => key)).toEqual([...FORMULA_KEYS]);
    expect(Object.keys(FORMULAS)).toEqual([...FORMULA_KEYS]);
  });

  it.each(cases)('$key takes exactly its inputs', ({ key, inputs, expected }) => {
    const { inputs: taken, constants, compute } = FORMULAS[key];
    expect([...taken, ...constants].map(({ name }) => name)).toEqual(Object.keys(inputs));
    expect(compute(inputs)).toBeCloseTo(expected, 12);
  });

  it.each(cases)('$key refuses a missing input and one that is no number', ({ key, inputs }) => {
    const [first = '', ...others] = Object.keys(inputs);
    const without = Object.fromEntries(others.map((name) => [name, inputs[name] ?? NaN]));
    expect(() => FORMULAS[key].compute(without)).toThrow(ReadingNotFinite);
    expect(() => FORMULAS[key].compute({ ...inputs, [first]: Infinity })).toThrow(ReadingNotFinite);
  });

  it.each(cases)('$key is shown in a known unit', ({ key }) => {
    expect(displayUnit(FORMULAS[key].unit).label).toBe(FORMULAS[key].unit);
  });
});
