import { type SiteInstrument, typicalUncertainties } from '#shared/plan/typical-uncertainty';
import { describe, expect, it } from 'vitest';
import { computed, measured, revisionBody } from '../support/plan-bodies';

/** A range of ±(share of reading + counts) with a display of 10 mV, in V. */
function range(fullScale: number, ofReading: number): SiteInstrument['ranges'][number] {
  const accuracy = { resolution: 0.01, ofReading, ofRange: 0, counts: 0 };
  return { id: fullScale, form: 'digital', name: `${fullScale} V`, unit: 'V', current: 'dc', fullScale, ...accuracy };
}
function meter(...ranges: SiteInstrument['ranges']): SiteInstrument {
  return { kind: 'multimeter', status: 'in-service', ranges };
}
const plan = (...characteristics: ReturnType<typeof measured>[]) => revisionBody({ characteristics });

/** U = 2 √(a²/3 + δ²/12), by hand: JCGM 100, 4.3.7. */
const byHand = (value: number, ofReading: number) => 2 * Math.sqrt((ofReading * value) ** 2 / 3 + 0.01 ** 2 / 12);

describe('the uncertainty of a usual reading', () => {
  const loaded = measured('loaded', { target: 12, lowerLimit: 11.4, upperLimit: 12.8 });

  it('is that of the finest instrument in service, on the smallest range that holds the target', () => {
    const found = typicalUncertainties(plan(loaded), [
      meter(range(10, 0.0001), range(20, 0.01)),
      meter(range(20, 0.003)),
    ]);
    expect(found.get('loaded')).toBeCloseTo(byHand(12, 0.003), 12);
  });

  it('takes the middle between two limits where there is no target, and the only limit where there is one', () => {
    const instruments = [meter(range(20, 0.01))];
    const middle = typicalUncertainties(plan({ ...loaded, target: null }), instruments);
    expect(middle.get('loaded')).toBeCloseTo(byHand(12.1, 0.01), 12);
    const single = typicalUncertainties(plan({ ...loaded, target: null, lowerLimit: null }), instruments);
    expect(single.get('loaded')).toBeCloseTo(byHand(12.8, 0.01), 12);
  });

  it('of a scope counts both edges of a wave that fills the screen', () => {
    const scope: SiteInstrument = {
      kind: 'oscilloscope',
      status: 'in-service',
      ranges: [
        {
          id: 1,
          form: 'graticule',
          name: 'Screen',
          unit: 'V',
          screenDivisions: 8,
          ofReading: 0.03,
          ofFullScale: 0,
          readingStep: 0.1,
        },
      ],
    };
    const ripple = measured('ripple', {
      unit: 'mV p-p',
      target: null,
      upperLimit: 1.2,
      entryMode: 'scope',
      instrumentKind: 'oscilloscope',
    });
    // 1.2 V stands whole on 8 divisions at 0.2 V per division.
    const byEdges = 2 * Math.sqrt((0.03 * 1.2) ** 2 / 3 + (2 * (0.1 * 0.2) ** 2) / 12);
    expect(typicalUncertainties(plan(ripple), [scope]).get('ripple')).toBeCloseTo(byEdges, 12);
  });

  it('of what is computed comes of the readings it takes, the gain error they share cancelling', () => {
    const noLoad = measured('no_load', { target: 12 });
    const regulation = computed('regulation', {
      key: 'load-regulation',
      inputs: { no_load: 'no_load', loaded: 'loaded' },
      constants: {},
    });
    const found = typicalUncertainties(revisionBody({ characteristics: [noLoad, loaded, regulation] }), [
      meter({ ...range(20, 0.01), resolution: 1e-9 } as SiteInstrument['ranges'][number]),
    ]);
    expect(found.get('regulation')).toBeLessThan(1e-6);
  });

  it('is not known without a range, an instrument in service, or a value', () => {
    expect(typicalUncertainties(plan(loaded), []).size).toBe(0);
    expect(typicalUncertainties(plan(loaded), [meter(range(10, 0.01))]).size).toBe(0);
    expect(typicalUncertainties(plan(loaded), [{ ...meter(range(20, 0.01)), status: 'withdrawn' }]).size).toBe(0);
    expect(typicalUncertainties(plan(measured('free')), [meter(range(20, 0.01))]).size).toBe(0);
  });
});
