import { describe, expect, it } from 'vitest';
import { mean } from '#shared/statistics/mean';
import { sampleStandardDeviation } from '#shared/statistics/sample-standard-deviation';
import { summary } from '#shared/statistics/summary';
import { TooFewReadings } from '#shared/statistics/too-few-readings';
import strd from './data/strd-univariate.json' with { type: 'json' };

// NIST Statistical Reference Datasets, univariate; certified values and provenance in the data file.

interface Case {
  id: string;
  n: number;
  certified: { mean: number; sd: number };
  data?: number[];
}

/** NumAcc2 and NumAcc3 are given by rule: first m, then 500 pairs of m − 0.1 and m + 0.1. */
const RULED: Record<string, number> = { 'C-NumAcc2': 1.2, 'C-NumAcc3': 1_000_000.2 };

function seriesOf({ id, data }: Case): number[] {
  const centre = RULED[id];
  if (centre === undefined) return data ?? [];
  return [centre, ...Array.from({ length: 1000 }, (_, index) => centre + (index % 2 === 0 ? -0.1 : 0.1))];
}

/** Digits that agree: the log relative error, at most 15. */
function agreeingDigits(computed: number, certified: number): number {
  return computed === certified ? 15 : -Math.log10(Math.abs(computed - certified) / Math.abs(certified));
}

describe.each(strd.cases as Case[])('$id', (data) => {
  const series = seriesOf(data);

  it('has its published length', () => {
    expect(series).toHaveLength(data.n);
  });

  it('has the certified mean to 14 digits', () => {
    expect(agreeingDigits(mean(series), data.certified.mean)).toBeGreaterThan(14);
  });

  it('has the certified standard deviation as far as its readings can be written in binary', () => {
    const digits = data.id === 'C-NumAcc3' ? 9 : 13;
    expect(agreeingDigits(sampleStandardDeviation(series), data.certified.sd)).toBeGreaterThan(digits);
  });
});

describe('a summary', () => {
  it('gives number, least, mean, greatest and standard deviation', () => {
    // s of 1, 2, 4: squares of the deviations 16/9 + 1/9 + 25/9 = 14/3, over 2.
    expect(summary([4, 1, 2])).toEqual({ n: 3, min: 1, mean: 7 / 3, max: 4, s: Math.sqrt(14 / 6) });
  });

  it('of a single reading states no standard deviation', () => {
    expect(summary([2.4])).toEqual({ n: 1, min: 2.4, mean: 2.4, max: 2.4, s: null });
  });

  it('of readings all alike has no scatter at all', () => {
    expect(sampleStandardDeviation([0.1, 0.1, 0.1])).toBe(0);
  });

  it('leaves the readings as they were', () => {
    const readings = Object.freeze([3, 1, 2]);
    expect(summary(readings).n).toBe(3);
    expect(readings).toEqual([3, 1, 2]);
  });

  it('keeps small readings beside large ones', () => {
    expect(mean([1e16, 1, -1e16, 3])).toBe(1);
  });

  it.each([() => mean([]), () => summary([]), () => sampleStandardDeviation([1])])('needs enough readings', (ask) => {
    expect(ask).toThrow(TooFewReadings);
  });

  it.each([NaN, Infinity, -Infinity])('refuses a reading of %s', (reading) => {
    expect(() => mean([1, reading])).toThrow(/readings must be a finite number/);
  });
});
