import { budgetLines } from '#shared/uncertainty/budget-lines';
import { combine } from '#shared/uncertainty/combine';
import { normal, rectangular, unweighted } from '#shared/uncertainty/component';
import { propagate } from '#shared/uncertainty/propagate';
import { describe, expect, it } from 'vitest';

const accuracy = (volts: number) => rectangular('Accuracy of DC 20 V', 0.001 * volts, 'range 7', 0.001 * volts);
const resolution = () => rectangular('Resolution of the display', 0.0005);

describe('the budget of one reading, laid out', () => {
  const { lines, combined } = budgetLines(unweighted([accuracy(12), resolution(), normal('Repeatability', 0.002)]));

  it('says of each line where it comes from, its width, its divisor and what it contributes', () => {
    expect(lines[0]).toMatchObject({
      line: 1,
      source: 'Accuracy of DC 20 V',
      input: null,
      distribution: 'rectangular',
      halfWidth: 0.012,
      divisor: { value: Math.sqrt(3), text: '√3' },
      sensitivity: 1,
      degreesOfFreedom: Infinity,
      sharedWith: [],
      note: null,
    });
    expect(lines[0]?.contribution).toBeCloseTo(0.012 / Math.sqrt(3), 12);
    expect(lines[2]).toMatchObject({ distribution: 'normal', halfWidth: null, divisor: { value: 1, text: '1' } });
  });

  it('divides each width into its standard uncertainty', () => {
    for (const { halfWidth, divisor, standardUncertainty } of lines)
      if (halfWidth !== null) expect(halfWidth / divisor.value).toBeCloseTo(standardUncertainty, 12);
  });

  it('gives shares that add to the whole', () => {
    expect(lines.reduce((sum, { share }) => sum + (share ?? 0), 0)).toBeCloseTo(1, 12);
    expect(lines[0]?.share).toBeCloseTo((0.012 / Math.sqrt(3) / combined.standardUncertainty) ** 2, 12);
  });
});

describe('the budget of a computed characteristic, laid out', () => {
  const budgetOf = (compute: (open: number, loaded: number) => number) => {
    const inputs = new Map([
      ['no_load', { value: 15, components: [accuracy(15), resolution()] }],
      ['loaded', { value: 12, components: [accuracy(12), resolution()] }],
    ]);
    const { components } = propagate((given) => compute(given['no_load'] ?? 0, given['loaded'] ?? 0), inputs);
    return { ...budgetLines(components), components };
  };

  it('names the input of each line and the sign of its sensitivity', () => {
    const { lines } = budgetOf((open, loaded) => (open - loaded) / loaded);
    expect(lines.map(({ input }) => input)).toEqual(['no_load', 'no_load', 'loaded', 'loaded']);
    expect(lines.map(({ sensitivity }) => Math.sign(sensitivity))).toEqual([1, 1, -1, -1]);
    expect(lines[2]?.sensitivity).toBeCloseTo(-15 / 144, 6);
  });

  it('says that a gain error both readings share cancels in a ratio', () => {
    const { lines } = budgetOf((open, loaded) => open / loaded);
    expect(lines[0]).toMatchObject({ sharedWith: [3], note: 'The same error as in line 3: it cancels.' });
    expect(lines[2]).toMatchObject({ sharedWith: [1], share: null, note: 'The same error as in line 1: it cancels.' });
    expect(lines[0]?.share).toBeCloseTo(0, 9);
  });

  it('says that it adds in a sum, and counts its share once', () => {
    const { lines, combined, components } = budgetOf((open, loaded) => open + loaded);
    expect(lines[0]?.note).toBe('The same error as in line 3: it adds.');
    expect(lines.reduce((sum, { share }) => sum + (share ?? 0), 0)).toBeCloseTo(1, 12);
    expect(combined).toEqual(combine(components));
  });

  it('says that it cancels in part in a difference of unlike readings', () => {
    expect(budgetOf((open, loaded) => open - loaded).lines[0]?.note).toBe(
      'The same error as in line 3: it cancels in part.',
    );
  });

  it('lists all lines of one origin', () => {
    const three = ['a', 'b', 'c'].map((name) => rectangular(name, 1, 'range 1'));
    expect(budgetLines(unweighted(three)).lines[1]?.note).toBe('The same error as in lines 1 and 3: it adds.');
  });

  it('has no lines where nothing is known, and no shares where all is exact', () => {
    expect(budgetLines([]).lines).toEqual([]);
    expect(budgetLines(unweighted([rectangular('exact', 0)])).lines[0]?.share).toBe(0);
  });
});
