import { describe, expect, it } from 'vitest';
import { efficiency } from '#shared/measurement/efficiency';
import { loadRegulation } from '#shared/measurement/load-regulation';
import { rippleRatio } from '#shared/measurement/ripple-ratio';

describe('derived characteristics against worked examples', () => {
  it('gives 7.1 % load regulation for 60 V falling to 56 V', () => {
    // Boylestad & Nashelsky, Electronic Devices and Circuit Theory, Example 15.2 (from memory); recomputed 7.142857 %.
    expect(loadRegulation({ noLoadVolts: 60, loadedVolts: 56 })).toBeCloseTo(0.07142857, 8);
  });

  it('gives a ripple ratio of 0.039 for 0.591 V on 15.3 V', () => {
    // Floyd, Electronic Devices, filtered bridge example (from memory); recomputed 0.03861004 from the unrounded voltages.
    expect(rippleRatio({ rippleVolts: 0.5909091, loadedVolts: 15.30455 })).toBeCloseTo(0.03861004, 7);
  });

  it.each([
    { load: 100, outputWatts: 18.02, inputWatts: 20.85, expected: 0.8642685851 },
    { load: 75, outputWatts: 13.56, inputWatts: 15.62, expected: 0.8681177977 },
    { load: 50, outputWatts: 9.05, inputWatts: 10.52, expected: 0.8602661597 },
    { load: 25, outputWatts: 4.53, inputWatts: 5.44, expected: 0.8327205882 },
  ])('gives the efficiency at $load % load of a 12 V, 1.5 A adapter', ({ outputWatts, inputWatts, expected }) => {
    // Constructed readings, answers recomputed; the definition is that of 10 CFR part 430, subpart B, Appendix Z.
    expect(efficiency({ outputWatts, inputWatts })).toBeCloseTo(expected, 9);
  });
});
