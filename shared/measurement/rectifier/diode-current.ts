import { type Diode } from './rectifier-circuit';

/** Current through a conducting path and how it grows with the voltage across it (siemens). */
export interface PathCurrent {
  amperes: number;
  slope: number;
}

const STEPS = 30;
const CLOSE = 1e-13;

/**
 * Solves w + ln w = l for w > 0 (the Lambert W function of e^l, in a form that cannot overflow) by Newton's method.
 */
function lambertOfExponential(l: number): number {
  let w = l > 1 ? l - Math.log(l) : Math.exp(l - Math.exp(Math.min(l, 0)));
  if (l < -15) return Math.exp(l);
  for (let step = 0; step < STEPS; step += 1) {
    const change = ((w + Math.log(w) - l) * w) / (1 + w);
    w = Math.max(w - change, w / 10);
    if (Math.abs(change) <= CLOSE * w) return w;
  }
  return w;
}

/**
 * Current of `count` diodes in series with a resistance, at a voltage across all of it.
 *
 * Exponential: u = i r + n a ln(1 + i / Is), solved exactly by the Lambert W function (A. Jain, A. Kapoor, Solar Energy
 * Materials and Solar Cells 81 (2004) 269, for the same equation; from memory). Drop: i = (u - n Vd) / r above the drop.
 *
 * @param ohms winding and diodes together
 */
export function pathCurrent(volts: number, diode: Diode, count: number, ohms: number): PathCurrent {
  if (diode.kind === 'drop') {
    const over = volts - count * diode.dropVolts;
    return over > 0 ? { amperes: over / ohms, slope: 1 / ohms } : { amperes: 0, slope: 0 };
  }
  const { saturationAmperes, idealityVolts } = diode;
  const scale = count * idealityVolts;
  if (volts <= 0) {
    const share = Math.exp(volts / scale);
    return { amperes: saturationAmperes * (share - 1), slope: (saturationAmperes / scale) * share };
  }
  const drop = saturationAmperes * ohms;
  const w = lambertOfExponential(Math.log(drop / scale) + (volts + drop) / scale);
  const amperes = (scale / ohms) * w - saturationAmperes;
  return { amperes, slope: 1 / (ohms + scale / (amperes + saturationAmperes)) };
}
