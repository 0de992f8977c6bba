import { EnvelopePyramid } from '#shared/waveform/envelope-pyramid';
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';

describe('the envelope of a waveform', () => {
  // Against the plain search through every slice.
  it('has the lowest and the highest of every slice, wherever it lies', () => {
    const volts = fc.array(fc.float({ noNaN: true, noDefaultInfinity: true }), { minLength: 1, maxLength: 700 });
    fc.assert(
      fc.property(volts, fc.nat(), fc.nat(), fc.integer({ min: 1, max: 40 }), (values, one, other, columns) => {
        const samples = Float32Array.from(values);
        const ends = [one % values.length, other % values.length].sort((a, b) => a - b);
        const from = ends[0] ?? 0;
        const to = (ends[1] ?? 0) + 1;
        const { low, high } = new EnvelopePyramid(samples).between(from, to, columns);
        for (let column = 0; column < columns; column += 1) {
          const width = (to - from) / columns;
          const first = Math.floor(from + column * width);
          const last = Math.max(first + 1, Math.ceil(from + (column + 1) * width));
          const slice = [...samples.subarray(first, Math.min(last, values.length))];
          expect(low[column]).toBe(Math.min(...slice));
          expect(high[column]).toBe(Math.max(...slice));
        }
      }),
      { numRuns: 300 },
    );
  });

  it('keeps a single spike in a million samples', () => {
    const samples = new Float32Array(1_000_000);
    samples[777_777] = 5;
    const { low, high } = new EnvelopePyramid(samples).between(0, samples.length, 800);
    expect(high.filter((value) => value === 5)).toHaveLength(1);
    expect(low.every((value) => value === 0)).toBe(true);
  });
});
