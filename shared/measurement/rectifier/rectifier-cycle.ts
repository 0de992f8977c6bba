import { pathCurrent, type PathCurrent } from './diode-current';
import { diodesInPath, pathOhms, type RectifierCircuit } from './rectifier-circuit';

/** One line cycle of a rectifier, from the positive-going zero of the mains; SI base units. */
export interface RectifierCycle {
  /** Output voltage at each step, the last being that of the first step of the next cycle. */
  volts: Float64Array;
  /** Voltage and current of the capacitor at the end. */
  capacitorVolts: number;
  capacitorAmperes: number;
  /** Energies over the cycle, in joules: from the windings, into the load, lost in windings and diodes, and in the ESR. */
  sourceJoules: number;
  loadJoules: number;
  pathJoules: number;
  esrJoules: number;
}

const NEWTON_STEPS = 60;
const CLOSE = 1e-12;

interface Sources {
  /** Voltage behind each conducting path at a phase of the cycle (0 to 1); an open path has none. */
  at(phase: number): readonly number[];
}

function sourcesOf({ topology, sourcePeakVolts, openDiode = false }: RectifierCircuit): Sources {
  const first = sourcePeakVolts[0];
  const second = topology === 'half-wave' ? undefined : (sourcePeakVolts[1] ?? first);
  return {
    at: (phase) => {
      const wave = Math.sin(2 * Math.PI * phase);
      const paths = openDiode ? [] : [first * wave];
      return second === undefined ? paths : [...paths, -second * wave];
    },
  };
}

/**
 * Runs one line cycle from a given state, by the trapezoidal rule, each step solved implicitly so that a stiff circuit
 * (small capacitor, small resistance) stays stable.
 *
 * @param start voltage and current of the capacitor at the beginning
 */
export function rectifierCycle(
  circuit: RectifierCircuit,
  start: { volts: number; amperes: number },
  steps: number,
): RectifierCycle {
  const { lineHertz, diode, capacitanceFarads, esrOhms, load } = circuit;
  const count = diodesInPath(circuit);
  const ohms = pathOhms(circuit);
  const sources = sourcesOf(circuit);
  const step = 1 / (lineHertz * steps);
  const half = step / (2 * capacitanceFarads);
  const loadAt = (volts: number) => (load.kind === 'resistor' ? volts / load.ohms : volts > 0 ? load.amperes : 0);
  const loadSlope = load.kind === 'resistor' ? 1 / load.ohms : 0;

  const cycle: RectifierCycle = {
    volts: new Float64Array(steps + 1),
    capacitorVolts: start.volts,
    capacitorAmperes: start.amperes,
    sourceJoules: 0,
    loadJoules: 0,
    pathJoules: 0,
    esrJoules: 0,
  };
  let output = start.volts + esrOhms * start.amperes;
  let power = powersOf(0);
  cycle.volts[0] = output;

  for (let index = 1; index <= steps; index += 1) {
    const emf = sources.at(index / steps);
    const held = cycle.capacitorVolts + half * cycle.capacitorAmperes;
    const impedance = esrOhms + half;
    output = solveOutput(emf, held, impedance, output);
    const amperes = (output - held) / impedance;
    cycle.capacitorVolts += half * (cycle.capacitorAmperes + amperes);
    cycle.capacitorAmperes = amperes;
    cycle.volts[index] = output;
    const now = powersOf(index / steps);
    cycle.sourceJoules += (step / 2) * (power.source + now.source);
    cycle.loadJoules += (step / 2) * (power.load + now.load);
    cycle.pathJoules += (step / 2) * (power.path + now.path);
    cycle.esrJoules += (step / 2) * (power.esr + now.esr);
    power = now;
  }
  return cycle;

  function powersOf(phase: number) {
    const powers = { source: 0, path: 0, load: output * loadAt(output), esr: esrOhms * cycle.capacitorAmperes ** 2 };
    for (const volts of sources.at(phase)) {
      const { amperes } = pathCurrent(volts - output, diode, count, ohms);
      powers.source += volts * amperes;
      powers.path += (volts - output) * amperes;
    }
    return powers;
  }

  /** The output at which the currents balance: they fall as it rises, so Newton's steps are kept inside a bracket. */
  function solveOutput(emf: readonly number[], held: number, impedance: number, guess: number): number {
    let low = -Infinity;
    let high = Infinity;
    let volts = guess;
    for (let turn = 0; turn < NEWTON_STEPS; turn += 1) {
      let balance = -loadAt(volts) - (volts - held) / impedance;
      let slope = -loadSlope - 1 / impedance;
      for (const one of emf) {
        const path: PathCurrent = pathCurrent(one - volts, diode, count, ohms);
        balance += path.amperes;
        slope -= path.slope;
      }
      if (balance > 0) low = volts;
      else high = volts;
      let next = volts - balance / slope;
      if (!(next > low && next < high)) next = Number.isFinite(low) && Number.isFinite(high) ? (low + high) / 2 : next;
      if (Math.abs(next - volts) <= CLOSE * (1 + Math.abs(next))) return next;
      volts = next;
    }
    return volts;
  }
}
