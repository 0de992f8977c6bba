import { correctedBy, plausibility, plausibilitySentence, slipAdvice } from '#shared/measurement/plausibility';
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';

const band = { low: 0.3, high: 0.9 };
const scope = { voltsPerDivision: 0.5, probeFactor: 10 };

describe('a reading beside what its part can give', () => {
  it.each([0.3, 0.6, 0.9, 0.1 + 0.2])('%s V is inside the band, bounds included', (value) => {
    expect(plausibility(value, band).state).toBe('inside');
  });

  it.each([0.1, 0.2, 1, 2.7])('%s V is outside and noted, at three times the band too', (value) => {
    expect(plausibility(value, band).state).toBe('outside');
  });

  it.each([0.0999, 2.701, 0, -0.5])('%s V is a question', (value) => {
    expect(plausibility(value, band).state).toBe('question');
  });

  it.each([
    [4, 10],
    [0.04, 0.1],
    [40, 100],
    [0.005, 0.01],
    [400, 1000],
    [0.0005, 0.001],
  ])('%s V would fit by a factor: %s', (value, factor) => {
    expect(plausibility(value, band)).toMatchObject({ state: 'question', slip: { kind: 'factor', factor } });
  });

  it('a step of the scale is a slip of the scope alone, and a factor of ten comes first', () => {
    const narrow = { low: 0.9, high: 1 };
    expect(plausibility(4.7, narrow, { scope })).toMatchObject({ slip: { kind: 'scale-step', factor: 5 } });
    expect(plausibility(2.4, narrow, { scope })).toMatchObject({ slip: { kind: 'scale-step', factor: 2.5 } });
    expect(plausibility(4.7, narrow)).toMatchObject({ state: 'question', slip: null });
    expect(plausibility(9.5, narrow, { scope })).toMatchObject({ slip: { kind: 'factor', factor: 10 } });
  });

  it('the corrected value is the one the slip hid, without a trace of binary arithmetic', () => {
    expect(correctedBy({ kind: 'factor', factor: 10 }, 18.5)).toBe(1.85);
    expect(correctedBy({ kind: 'factor', factor: 0.1 }, 0.185)).toBe(1.85);
    fc.assert(
      fc.property(fc.double({ min: 0.3, max: 0.9, noNaN: true }), fc.constantFrom(10, 0.1, 1000), (value, slip) => {
        const found = plausibility(value * slip, band);
        if (found.state !== 'question' || found.slip === null) throw new Error('A slip was not found.');
        expect(correctedBy(found.slip, value * slip)).toBeCloseTo(value, 9);
      }),
    );
  });

  it('the question names the value, the band, the slip and what to look at', () => {
    const found = plausibility(4, band);
    if (found.state === 'inside') throw new Error('4 V is inside.');
    expect(plausibilitySentence(4, band, found, 'V p-p').replaceAll(/\s/g, ' ')).toBe(
      '4.00 V p-p is more than what this part can give (300 to 900 mV p-p); ten times less would fit. Look at the switch on the probe.',
    );
  });

  it('a value with no likely slip says how far it is', () => {
    const found = plausibility(20, { low: 1, high: 1.1 });
    if (found.state === 'inside') throw new Error('20 V is inside.');
    expect(plausibilitySentence(20, { low: 1, high: 1.1 }, found, 'V p-p').replaceAll(/\s/g, ' ')).toMatch(
      /18 times more than what/,
    );
  });

  it('a band that begins at nothing says nothing', () => {
    expect(() => plausibility(1, { low: 0, high: 1 })).toThrow(RangeError);
    expect(() => plausibility(Number.NaN, band)).toThrow(RangeError);
  });
});

describe('what to look at', () => {
  const tenTimes = { kind: 'factor', factor: 10 } as const;

  it('is the probe where its switch can be the cause, else the scale', () => {
    expect(slipAdvice(tenTimes, { voltsPerDivision: 0.5, probeFactor: 10 })).toBe('Look at the switch on the probe.');
    expect(slipAdvice(tenTimes, { voltsPerDivision: 5, probeFactor: 1 })).toBe('Look at the volts per division.');
    expect(slipAdvice({ kind: 'factor', factor: 0.1 }, { voltsPerDivision: 0.05, probeFactor: 1 })).toBe(
      'Look at the switch on the probe.',
    );
  });

  it('is the decimal point where the value stood on a display', () => {
    expect(slipAdvice(tenTimes, null)).toBe('Look at the decimal point and at the prefix of the unit.');
  });
});
