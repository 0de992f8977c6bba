import { expectedBands, missingForModel, type RectifierModel } from '#shared/measurement/rectifier/expected-bands';
import { type RectifierCircuit, SILICON_DIODE } from '#shared/measurement/rectifier/rectifier-circuit';
import { simulateRectifier } from '#shared/measurement/rectifier/simulate-rectifier';
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';

const IDEAL = { kind: 'drop', dropVolts: 0, onOhms: 0.01 } as const;

interface Given {
  topology: RectifierCircuit['topology'];
  lineHertz: number;
  peak: number;
  sourceOhms: number;
  farads: number;
  esrOhms: number;
  ohms: number;
}
const GIVEN = { lineHertz: 50, peak: 17, sourceOhms: 0.5, farads: 1e-3, esrOhms: 0, ohms: 100 };

/** Circuits from a small adapter to a large open frame; a run of each costs some ten milliseconds. */
const circuits: fc.Arbitrary<Given> = fc.record({
  topology: fc.constantFrom<Given['topology']>('half-wave', 'centre-tap', 'bridge'),
  lineHertz: fc.constantFrom(50, 60),
  peak: fc.double({ min: 5, max: 60, noNaN: true }),
  sourceOhms: fc.double({ min: 0.1, max: 5, noNaN: true }),
  farads: fc.double({ min: 100e-6, max: 10e-3, noNaN: true }),
  esrOhms: fc.double({ min: 0, max: 0.5, noNaN: true }),
  ohms: fc.double({ min: 10, max: 2000, noNaN: true }),
});
function circuitOf({ peak, farads, ohms, ...rest }: Given): RectifierCircuit {
  return {
    ...rest,
    sourcePeakVolts: [peak],
    diode: SILICON_DIODE,
    capacitanceFarads: farads,
    load: { kind: 'resistor', ohms },
  };
}

const RUNS = { numRuns: 60 };

describe('a rectifier', () => {
  it('never gives more ripple with more capacitance', () => {
    fc.assert(
      fc.property(circuits, fc.double({ min: 1.1, max: 5, noNaN: true }), (given, more) => {
        const small = simulateRectifier(circuitOf(given));
        const large = simulateRectifier(circuitOf({ ...given, farads: given.farads * more }));
        expect(large.rippleVolts).toBeLessThanOrEqual(small.rippleVolts * (1 + 1e-6));
      }),
      RUNS,
    );
  });

  it('spends what its windings give in the load, the diodes and the resistances', () => {
    fc.assert(
      fc.property(circuits, (given) => {
        const { sourceWatts, loadWatts, lossWatts } = simulateRectifier(circuitOf(given));
        expect(Math.abs((loadWatts + lossWatts) / sourceWatts - 1)).toBeLessThan(1e-3);
      }),
      RUNS,
    );
  });

  it('does not know which of two halves is the first', () => {
    fc.assert(
      fc.property(circuits, fc.double({ min: 0.8, max: 1, noNaN: true }), (given, lower) => {
        const circuit = { ...circuitOf(given), topology: 'centre-tap' } as const;
        const one = simulateRectifier({ ...circuit, sourcePeakVolts: [given.peak, given.peak * lower] });
        const other = simulateRectifier({ ...circuit, sourcePeakVolts: [given.peak * lower, given.peak] });
        expect(one.meanVolts).toBeCloseTo(other.meanVolts, 5);
        expect(one.rippleVolts).toBeCloseTo(other.rippleVolts, 5);
      }),
      RUNS,
    );
  });

  it('with diodes that drop nothing scales with its voltage', () => {
    fc.assert(
      fc.property(circuits, fc.double({ min: 0.1, max: 10, noNaN: true }), (given, scale) => {
        const circuit = { ...circuitOf(given), diode: IDEAL };
        const one = simulateRectifier(circuit);
        const other = simulateRectifier({ ...circuit, sourcePeakVolts: [given.peak * scale] });
        expect(other.meanVolts / one.meanVolts).toBeCloseTo(scale, 4);
        expect(other.rippleVolts / one.rippleVolts).toBeCloseTo(scale, 4);
      }),
      RUNS,
    );
  });

  it('gives a ripple at the line frequency half-wave and at twice it full-wave', () => {
    expect(simulateRectifier(circuitOf({ ...GIVEN, topology: 'half-wave' })).rippleHertz).toBe(50);
    expect(simulateRectifier(circuitOf({ ...GIVEN, topology: 'bridge' })).rippleHertz).toBe(100);
  });

  it('gives nothing where its only path is open', () => {
    const found = simulateRectifier({ ...circuitOf({ ...GIVEN, topology: 'half-wave' }), openDiode: true });
    expect(found.meanVolts).toBeCloseTo(0, 9);
  });

  it.each([
    ['lineHertz', { lineHertz: 0 }],
    ['sourceOhms', { sourceOhms: Number.NaN }],
    ['capacitanceFarads', { capacitanceFarads: -1 }],
    ['esrOhms', { esrOhms: Infinity }],
    ['load.ohms', { load: { kind: 'resistor', ohms: 0 } as const }],
    ['sourcePeakVolts', { sourcePeakVolts: [17, 16] as const, topology: 'bridge' as const }],
  ])('refuses a %s it cannot use, by name', (name, wrong) => {
    expect(() => simulateRectifier({ ...circuitOf({ ...GIVEN, topology: 'bridge' }), ...wrong })).toThrow(RangeError);
    expect(() => simulateRectifier({ ...circuitOf({ ...GIVEN, topology: 'bridge' }), ...wrong })).toThrow(name);
  });
});

describe('what a part ought to give', () => {
  const part: RectifierModel = {
    topology: 'bridge',
    lineHertz: 50,
    ratedAmperes: 0.5,
    secondaryPeakVolts: 18.2,
    sourceOhms: 2.6,
    diodeDropVolts: null,
    filterFarads: 1500e-6,
    filterTolerance: 0.2,
    filterEsrOhms: null,
  };

  it('has the nominal values inside the bands', () => {
    const bands = expectedBands(part);
    expect(bands).not.toBeNull();
    for (const [band, value] of [
      [bands?.ripple, bands?.nominal.rippleVolts],
      [bands?.loaded, bands?.nominal.loadedVolts],
      [bands?.noLoad, bands?.nominal.noLoadVolts],
    ] as const) {
      expect(value).toBeGreaterThan(band?.low ?? Infinity);
      expect(value).toBeLessThan(band?.high ?? -Infinity);
    }
  });

  it('spreads about as the capacitor does', () => {
    const { ripple } = expectedBands(part) ?? { ripple: { low: 0, high: 0 } };
    expect(ripple.high / ripple.low).toBeGreaterThan(1.5);
    expect(ripple.high / ripple.low).toBeLessThan(2);
  });

  it('without load stands near the peak less the diodes', () => {
    const bands = expectedBands({ ...part, diodeDropVolts: 0.7 });
    expect(bands?.nominal.noLoadVolts).toBeCloseTo(18.2 - 1.4, 1);
  });

  it.each([
    ['a switch-mode supply', { topology: 'switch-mode' }, ['topology']],
    ['an unknown winding', { secondaryPeakVolts: null, sourceOhms: null }, ['secondaryPeakVolts', 'sourceOhms']],
    ['an unknown capacitor', { filterFarads: null }, ['filterFarads']],
  ])('is not known of %s, which says what is missing', (_what, change, missing) => {
    expect(expectedBands({ ...part, ...change })).toBeNull();
    expect(missingForModel({ ...part, ...change })).toEqual(missing);
  });
});
