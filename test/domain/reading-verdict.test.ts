import { describe, expect, it } from 'vitest';
import { countingReading, mayRepeat, MOST_REPEATS } from '#shared/verdict/counting-reading';
import { judgeAttribute, judgeValue } from '#shared/verdict/reading-verdict';

describe('a reading against its limits', () => {
  const both = { lower: 15.8, upper: 18.2 };

  it.each([
    [15.8, 'conforming'],
    [18.2, 'conforming'],
    [17, 'conforming'],
    [15.799, 'nonconforming'],
    [18.201, 'nonconforming'],
  ])('%d V is %s with 15.8 to 18.2 V', (value, verdict) => {
    expect(judgeValue(value, both)).toBe(verdict);
  });

  it('conforms at a limit reached by arithmetic', () => {
    expect(3 * 0.1).toBeGreaterThan(0.3);
    expect(judgeValue(3 * 0.1, { lower: null, upper: 0.3 })).toBe('conforming');
    expect(judgeValue((15.6 - 12) / 12, { lower: 0.3, upper: 0.3 })).toBe('conforming');
  });

  it('fails by the least an instrument could resolve', () => {
    expect(judgeValue(2.400000001, { lower: null, upper: 2.4 })).toBe('nonconforming');
    expect(judgeValue(-2.400000001, { lower: -2.4, upper: null })).toBe('nonconforming');
    expect(judgeValue(1e-15, { lower: null, upper: 0 })).toBe('nonconforming');
  });

  it('has one limit, or none', () => {
    expect(judgeValue(-1e9, { lower: null, upper: 1 })).toBe('conforming');
    expect(judgeValue(1e9, { lower: 1, upper: null })).toBe('conforming');
    expect(judgeValue(1e9, { lower: null, upper: null })).toBe('conforming');
  });

  it('is not judged where it is no number or the limits are the wrong way round', () => {
    expect(() => judgeValue(NaN, both)).toThrow(/value/);
    expect(() => judgeValue(1, { lower: 2, upper: 1 })).toThrow(/limits/);
  });
});

describe('an attribute', () => {
  it('conforms when it passes and does not when it fails', () => {
    expect(judgeAttribute(true)).toBe('conforming');
    expect(judgeAttribute(false)).toBe('nonconforming');
  });
});

describe('repeated readings', () => {
  const kept = (id: string, withdrawn = false) => ({ id, withdrawn });

  it('count by the last not withdrawn', () => {
    expect(countingReading([kept('first'), kept('second')])?.id).toBe('second');
    expect(countingReading([kept('first'), kept('second', true)])?.id).toBe('first');
  });

  it('leave nothing where all are withdrawn or none was taken', () => {
    expect(countingReading([kept('first', true)])).toBeUndefined();
    expect(countingReading([])).toBeUndefined();
  });

  it('are two at most, and withdrawing one does not win another', () => {
    expect(MOST_REPEATS).toBe(2);
    expect(mayRepeat([])).toBe(true);
    expect(mayRepeat([kept('a'), kept('b')])).toBe(true);
    expect(mayRepeat([kept('a'), kept('b'), kept('c')])).toBe(false);
    expect(mayRepeat([kept('a'), kept('b', true), kept('c', true)])).toBe(false);
  });
});
