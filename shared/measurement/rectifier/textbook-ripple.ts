import { demandFinite } from '../reading-not-finite';
import { diodesInPath, type RectifierCircuit } from './rectifier-circuit';
import { type RectifierResult } from './simulate-rectifier';

/** The drop that the textbooks take for a silicon diode, in volts (common practice, no source). */
export const TEXTBOOK_DROP = 0.7;

/** What is given to the closed forms; SI base units. */
export interface LinearDischarge {
  amperes: number;
  /** Frequency of the ripple: that of the line half-wave, twice it full-wave. */
  rippleHertz: number;
  farads: number;
}

function positive(name: string, value: number): void {
  if (!(Number.isFinite(value) && value > 0)) throw new RangeError(`${name} must be a number above 0.`);
}

/**
 * Ripple of a capacitor that discharges evenly between instant charges, in volts peak to peak.
 *
 *     Vpp = I / (f_r C)
 *
 * Source: A. P. Malvino, D. Bates, Electronic Principles, 7th ed., ch. 4; T. L. Floyd, Electronic Devices, ch. 2.
 *
 * @throws {RangeError} naming an argument that is not above 0
 */
export function textbookRipple({ amperes, rippleHertz, farads }: LinearDischarge): number {
  positive('amperes', amperes);
  positive('rippleHertz', rippleHertz);
  positive('farads', farads);
  return amperes / (rippleHertz * farads);
}

/**
 * Root mean square of a sawtooth out of its height; an approximation of the ripple's.
 *
 *     Vrms = Vpp / (2 √3)
 *
 * @throws {RangeError} for a height that is negative or not finite
 */
export function sawtoothRms(peakToPeakVolts: number): number {
  demandFinite({ peakToPeakVolts });
  if (peakToPeakVolts < 0) throw new RangeError('peakToPeakVolts must not be negative.');
  return peakToPeakVolts / (2 * Math.sqrt(3));
}

/**
 * Ripple factor (rms over mean) of a capacitor filter.
 *
 *     r = 1 / (4 √3 f R C) full-wave      r = 1 / (2 √3 f R C) half-wave      f: line frequency
 *
 * Source: J. Millman, C. C. Halkias, Integrated Electronics, ch. 4 (from memory).
 *
 * @throws {RangeError} naming an argument that is not above 0
 */
export function textbookRippleFactor(given: {
  lineHertz: number;
  ohms: number;
  farads: number;
  fullWave: boolean;
}): number {
  const { lineHertz, ohms, farads, fullWave } = given;
  positive('lineHertz', lineHertz);
  positive('ohms', ohms);
  positive('farads', farads);
  return 1 / ((fullWave ? 4 : 2) * Math.sqrt(3) * lineHertz * ohms * farads);
}

/** Ripple factor without a filter: √((π/2)² − 1) half-wave, √(π²/8 − 1) full-wave. Source: as above. */
export const UNFILTERED_RIPPLE_FACTOR = {
  halfWave: Math.sqrt((Math.PI / 2) ** 2 - 1),
  fullWave: Math.sqrt(Math.PI ** 2 / 8 - 1),
} as const;

/** What the closed forms say of a circuit beside what it does, and by how much they are off. */
export interface TextbookComparison {
  peakVolts: number;
  meanVolts: number;
  rippleVolts: number;
  rippleRmsVolts: number;
  /** Signed, as fractions of the simulated value. */
  error: { peak: number; mean: number; ripple: number; rippleRms: number };
  /** Why, in a sentence. */
  reason: string;
}

function conductsOncePerCycle({ topology, openDiode = false }: RectifierCircuit): boolean {
  return topology === 'half-wave' || openDiode;
}

/** Mean and ripple that agree with each other: Vdc = Vp − Vpp/2 with Vpp = I/(f_r C). */
function selfConsistent({ load, capacitanceFarads }: RectifierCircuit, peak: number, rippleHertz: number) {
  if (load.kind === 'resistor') {
    const mean = peak / (1 + 1 / (2 * rippleHertz * load.ohms * capacitanceFarads));
    return { mean, ripple: mean / (rippleHertz * load.ohms * capacitanceFarads) };
  }
  const ripple = load.amperes / (rippleHertz * capacitanceFarads);
  return { mean: peak - ripple / 2, ripple };
}

function reasonFor({ sourcePeakVolts }: RectifierCircuit, error: number): string {
  const [first, second = first] = sourcePeakVolts;
  if (first !== second && error < 0)
    return 'Too low: the formula takes two equal pulses a cycle, and the lower half hardly charges the capacitor.';
  return error > 0
    ? 'Too high: the formula charges in an instant from a source without resistance; real conduction takes part of each cycle, and the source’s resistance lowers the peak.'
    : 'Too low: the formula leaves out the resistance of the capacitor, across which the charging pulses drop.';
}

/**
 * The textbook's closed forms for a circuit, with a drop of 0.7 V for each diode, beside what the simulation gives.
 *
 * @param simulated what {@link simulateRectifier} gives for the same circuit
 */
export function textbookComparison(circuit: RectifierCircuit, simulated: RectifierResult): TextbookComparison {
  const peakVolts = Math.max(...circuit.sourcePeakVolts) - diodesInPath(circuit) * TEXTBOOK_DROP;
  const rippleHertz = circuit.lineHertz * (conductsOncePerCycle(circuit) ? 1 : 2);
  const { mean, ripple } = selfConsistent(circuit, peakVolts, rippleHertz);
  const rippleRmsVolts = sawtoothRms(ripple);
  const error = {
    peak: peakVolts / simulated.peakVolts - 1,
    mean: mean / simulated.meanVolts - 1,
    ripple: ripple / simulated.rippleVolts - 1,
    rippleRms: rippleRmsVolts / simulated.rippleRmsVolts - 1,
  };
  const reason = reasonFor(circuit, error.ripple);
  return { peakVolts, meanVolts: mean, rippleVolts: ripple, rippleRmsVolts, error, reason };
}
