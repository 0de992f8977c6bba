/** A capacitor-filtered rectifier as one unit has it, in SI base units. */
export interface Rectifier {
  topology: 'half-wave' | 'centre-tap' | 'bridge';
  lineHertz: number;
  /** Peak of the secondary without load, of each half at a centre tap. */
  peakVolts: number;
  sourceOhms: number;
  diodeDropVolts: number;
  filterFarads: number;
  loadAmperes: number;
}

/** What it gives at its load. */
export interface RectifierOutput {
  /** Part of half a turn of the mains during which the diodes conduct, as an angle either side of the peak, in radians. */
  conductionAngle: number;
  meanVolts: number;
  ripplePeakToPeak: number;
}

const HALVINGS = 50;

/** Diodes in series with the load. */
function diodes({ topology }: Rectifier): number {
  return topology === 'bridge' ? 2 : 1;
}

/** Pulses of charge in one turn of the mains. */
function pulses({ topology }: Rectifier): number {
  return topology === 'half-wave' ? 1 : 2;
}

/** Mean current through diodes that conduct for `angle` either side of the peak, the output being held steady meanwhile. */
function currentAt(angle: number, rectifier: Rectifier): number {
  const { peakVolts, sourceOhms } = rectifier;
  return ((pulses(rectifier) / Math.PI) * peakVolts * (Math.sin(angle) - angle * Math.cos(angle))) / sourceOhms;
}

/** The angle at which the diodes carry just the load's current; the current grows with the angle, so halving finds it. */
function conductionAngle(rectifier: Rectifier): number {
  let low = 0;
  let high = Math.PI / 2;
  for (let step = 0; step < HALVINGS; step += 1) {
    const middle = (low + high) / 2;
    if (currentAt(middle, rectifier) < rectifier.loadAmperes) low = middle;
    else high = middle;
  }
  return (low + high) / 2;
}

/**
 * Output of a rectifier with filter capacitor at a constant load current. A model for the demo only.
 *
 *     Vpp = I (1/f_r − t_c) / C      mean = V_peak cos θ − diode drops      t_c = θ / (π f)
 *
 * The textbook's Vpp = I / (f_r C) is shortened by the conduction time t_c, during which the capacitor does not discharge;
 * θ comes from the balance of charge with the source resistance, the ripple being neglected there. Common practice, no source.
 *
 * @throws {RangeError} for a load that the source cannot carry
 */
export function rectifierOutput(rectifier: Rectifier): RectifierOutput {
  const { lineHertz, peakVolts, diodeDropVolts, filterFarads, loadAmperes } = rectifier;
  if (currentAt(Math.PI / 2, rectifier) < loadAmperes)
    throw new RangeError('loadAmperes is more than the source can carry.');
  const angle = conductionAngle(rectifier);
  const rippleHertz = lineHertz * pulses(rectifier);
  const conducting = angle / (Math.PI * lineHertz);
  return {
    conductionAngle: angle,
    meanVolts: peakVolts * Math.cos(angle) - diodes(rectifier) * diodeDropVolts,
    ripplePeakToPeak: (loadAmperes * (1 / rippleHertz - conducting)) / filterFarads,
  };
}

/** Voltage without load: the peak less the drop of diodes that carry next to nothing, about two thirds of the loaded one. */
export function noLoadVolts(rectifier: Rectifier): number {
  return rectifier.peakVolts - (diodes(rectifier) * rectifier.diodeDropVolts * 2) / 3;
}
