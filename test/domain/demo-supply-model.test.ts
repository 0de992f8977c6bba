import { chanceOf } from '#db/demo/chance';
import { DEMO_PARTS } from '#db/demo/demo-parts';
import { productionOf } from '#db/demo/production';
import { type Rectifier, rectifierOutput } from '#db/demo/rectifier-output';
import { supplyUnit } from '#db/demo/supply-model';
import { describe, expect, it } from 'vitest';

/*
 * Simulated supplies: ngspice 39.3, generic silicon diode of about 0.9 V at 1 A, resistive load, settled. Mean and
 * peak-to-peak output as simulated; the model neglects the ripple while the diodes conduct, hence the width allowed.
 */
const SIMULATED: { name: string; rectifier: Rectifier; mean: number; ripple: number }[] = [
  {
    name: 'half-wave, 50 Hz, 1000 µF, 470 Ω',
    rectifier: {
      topology: 'half-wave',
      lineHertz: 50,
      peakVolts: 17,
      sourceOhms: 0.5,
      diodeDropVolts: 0.72,
      filterFarads: 0.001,
      loadAmperes: 15.70756 / 470,
    },
    mean: 15.70756,
    ripple: 0.6127511,
  },
  {
    name: 'centre tap, 60 Hz, 2200 µF, 100 Ω',
    rectifier: {
      topology: 'centre-tap',
      lineHertz: 60,
      peakVolts: 17,
      sourceOhms: 0.3,
      diodeDropVolts: 0.8,
      filterFarads: 0.0022,
      loadAmperes: 15.58816 / 100,
    },
    mean: 15.58816,
    ripple: 0.4880663,
  },
];

describe('the rectifier model of the demo', () => {
  it.each(SIMULATED)('comes near the simulated supply: $name', ({ rectifier, mean, ripple }) => {
    const output = rectifierOutput(rectifier);
    expect(Math.abs(output.meanVolts / mean - 1)).toBeLessThan(0.03);
    expect(Math.abs(output.ripplePeakToPeak / ripple - 1)).toBeLessThan(0.1);
  });

  it('gives more ripple for less capacitance, in proportion', () => {
    const [first] = SIMULATED;
    if (!first) throw new Error('No case.');
    const { rectifier } = first;
    const half = rectifierOutput({ ...rectifier, filterFarads: rectifier.filterFarads / 2 });
    expect(half.ripplePeakToPeak).toBeCloseTo(2 * rectifierOutput(rectifier).ripplePeakToPeak, 9);
  });

  it('refuses a load that the source cannot carry', () => {
    const [first] = SIMULATED;
    if (!first) throw new Error('No case.');
    expect(() => rectifierOutput({ ...first.rectifier, loadAmperes: 100 })).toThrow(RangeError);
  });
});

describe('the units of the demo', () => {
  it.each(DEMO_PARTS.map((part) => [part.body.number, part] as const))(
    'lie within the limits of %s when nothing is wrong with the delivery',
    (_number, { body, limits }) => {
      const chance = chanceOf(4711);
      const production = productionOf('none', chance);
      const units = Array.from({ length: 500 }, () => supplyUnit(body.model, production, chance));
      const within = units.filter(
        (unit) =>
          unit.noLoadVolts >= limits.noLoadVolts[0] &&
          unit.noLoadVolts <= limits.noLoadVolts[1] &&
          unit.loadedVolts >= limits.loadedVolts[0] &&
          unit.loadedVolts <= limits.loadedVolts[1] &&
          unit.rippleVolts <= limits.rippleVolts &&
          (unit.noLoadVolts - unit.loadedVolts) / unit.loadedVolts <= limits.regulation,
      );
      expect(within.length).toBeGreaterThan(0.985 * units.length);
    },
  );

  it('are the same for the same seed', () => {
    const [part] = DEMO_PARTS;
    if (!part) throw new Error('No part.');
    const one = () => {
      const chance = chanceOf(99);
      return supplyUnit(part.body.model, productionOf('low-capacitance', chance), chance);
    };
    expect(one()).toEqual(one());
  });
});
