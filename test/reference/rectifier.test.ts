import { type RectifierCircuit, SILICON_DIODE } from '#shared/measurement/rectifier/rectifier-circuit';
import { simulateRectifier } from '#shared/measurement/rectifier/simulate-rectifier';
import {
  textbookComparison,
  textbookRipple,
  textbookRippleFactor,
  sawtoothRms,
  UNFILTERED_RIPPLE_FACTOR,
} from '#shared/measurement/rectifier/textbook-ripple';
import { describe, expect, it } from 'vitest';
import theory from './data/h-rectifier-theory.json' with { type: 'json' };
import { RIPPLE_CASES, type RippleCase, topologyOf } from './ripple-cases';

/** Mean within 0.5 %, ripple within 2 % is asked for; the steps of 17 µs leave a hundredth of that. */
const CLOSE = 0.0005;

function circuitOf(given: RippleCase): RectifierCircuit {
  const [first = 0, second] = given.Vpk;
  const topology = topologyOf(given);
  return {
    topology,
    lineHertz: given.line_hz,
    sourcePeakVolts: topology === 'centre-tap' ? [first, second ?? first] : [first],
    sourceOhms: given.Rs,
    diode: SILICON_DIODE,
    capacitanceFarads: given.C,
    esrOhms: given.ESR,
    load: { kind: 'resistor', ohms: given.R },
    openDiode: given.fault !== null,
  };
}

const share = (value: number, reference: number) => Math.abs(value / reference - 1);

// Source: transient simulations by ngspice 39.3, six netlists (data/ripple/index.json); recomputed there.
describe('the rectifier, beside an independent circuit simulator', () => {
  it.each(RIPPLE_CASES.map((one) => [one.id, one] as const))(
    '%s: mean, peak, valley and ripple agree',
    (_id, given) => {
      const found = simulateRectifier(circuitOf(given));
      expect(share(found.meanVolts, given.Vdc)).toBeLessThan(CLOSE);
      expect(share(found.peakVolts, given.Vpeak)).toBeLessThan(CLOSE);
      expect(share(found.valleyVolts, given.Vmin)).toBeLessThan(CLOSE);
      expect(share(found.rippleVolts, given.Vpp)).toBeLessThan(CLOSE);
      expect(share(found.rippleRmsVolts, given.Vrms_ripple)).toBeLessThan(CLOSE);
      expect(found.rippleHertz).toBe(given.ripple_hz);
      expect(found.peaksPerCycle).toBe(given.peaks_per_cycle);
      if (given.alternate_peak_difference === null) expect(found.alternatePeakVolts).toBeNull();
      else expect(found.alternatePeakVolts).toBeCloseTo(given.alternate_peak_difference, 4);
    },
  );

  it.each(RIPPLE_CASES.map((one) => [one.id, one] as const))(
    '%s: the textbook is off by as much as was found there',
    (_id, given) => {
      const circuit = circuitOf(given);
      const { error, reason } = textbookComparison(circuit, simulateRectifier(circuit));
      expect(error.peak * 100).toBeCloseTo(given.textbook_error_pct.v_peak, 1);
      expect(error.mean * 100).toBeCloseTo(given.textbook_error_pct.v_dc_self_consistent, 1);
      expect(error.ripple * 100).toBeCloseTo(given.textbook_error_pct.v_pp_self_consistent, 0);
      expect(error.rippleRms * 100).toBeCloseTo(given.textbook_error_pct.v_rms_self_consistent, 0);
      expect(reason).toMatch(error.ripple > 0 ? /^Too high/ : /lower half hardly charges/);
    },
  );
});

// Source: curves of the kind in O. H. Schade, Analysis of Rectifier Operation, Proc. IRE 31 (1943) 341-361; the values are
// recomputed for ideal diodes by piecewise-exact integration (data/h-rectifier-theory.json), the figures themselves not read.
describe('a rectifier with ideal diodes', () => {
  const rows = theory.schade_type_table.table.flatMap(({ mode, Rs_over_R, points }) =>
    points.map((point) => ({ mode, rs: Rs_over_R, point })),
  );
  // The valley is a corner in time, which steps of 17 µs miss by less than a thousandth of the peak.
  it.each(rows)('$mode wave, Rs/R $rs, wRC $point.0', ({ mode, rs, point }) => {
    const [wRC = 0, mean = 0, rmsPercent = 0, peakToPeak = 0] = point;
    const ohms = 100;
    const found = simulateRectifier({
      topology: mode === 'full' ? 'centre-tap' : 'half-wave',
      lineHertz: 50,
      sourcePeakVolts: [1],
      sourceOhms: rs * ohms,
      diode: { kind: 'drop', dropVolts: 0, onOhms: 0 },
      capacitanceFarads: wRC / (2 * Math.PI * 50 * ohms),
      esrOhms: 0,
      load: { kind: 'resistor', ohms },
    });
    expect(found.meanVolts).toBeCloseTo(mean, 3);
    expect(Math.abs(found.rippleVolts - peakToPeak)).toBeLessThan(0.001);
    expect(Math.abs((100 * found.rippleRmsVolts) / found.meanVolts - rmsPercent)).toBeLessThan(
      0.02 + rmsPercent * 0.001,
    );
  });
});

describe('the textbook forms', () => {
  // Source: A. P. Malvino, D. Bates, Electronic Principles, 7th ed., Examples 4-6 to 4-9; recomputed equal to the answers.
  it.each(theory.examples.filter(({ id }) => ['H-1', 'H-2', 'H-3', 'H-4'].includes(id)))('$id $source', (example) => {
    const { f = 0, R = 0, C = 0 } = example.inputs as { f?: number; R?: number; C?: number };
    const { Vp = 0, Vpp = 0 } = example.recomputed as { Vp?: number; Vpp?: number };
    const rippleHertz = example.id === 'H-1' ? f : 2 * f;
    expect(textbookRipple({ amperes: Vp / R, rippleHertz, farads: C })).toBeCloseTo(Vpp, 5);
  });

  // Source: R. Boylestad, L. Nashelsky, Electronic Devices and Circuit Theory, ch. 15, Example 15.3/15.4 (from memory).
  it('full wave, 60 Hz, 50 mA, 100 µF: 1.2 V rms', () => {
    const ripple = textbookRipple({ amperes: 0.05, rippleHertz: 120, farads: 100e-6 });
    expect(sawtoothRms(ripple)).toBeCloseTo(1.202813, 6);
  });

  // Source: T. L. Floyd, Electronic Devices, filtered bridge example (from memory); recomputed.
  it('bridge, 15.6 V, 220 ohm, 1000 µF: 0.591 V peak to peak', () => {
    expect(textbookRipple({ amperes: 15.57056 / 220, rippleHertz: 120, farads: 1e-3 })).toBeCloseTo(0.589794, 5);
  });

  it('the ripple factor of a capacitor filter, full and half wave', () => {
    const given = { lineHertz: 50, ohms: 100, farads: 1e-3 };
    expect(textbookRippleFactor({ ...given, fullWave: true })).toBeCloseTo(0.0288675, 7);
    expect(textbookRippleFactor({ ...given, fullWave: false })).toBeCloseTo(0.057735, 6);
  });

  it('the ripple factor without a filter', () => {
    expect(UNFILTERED_RIPPLE_FACTOR.halfWave).toBeCloseTo(theory.unfiltered.half_wave.ripple_factor, 6);
    expect(UNFILTERED_RIPPLE_FACTOR.fullWave).toBeCloseTo(theory.unfiltered.bridge.ripple_factor, 6);
  });
});
