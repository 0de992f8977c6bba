import { SILICON_DIODE, type Diode, type RectifierCircuit } from './rectifier-circuit';
import { NoSteadyState, simulateRectifier, type RectifierResult } from './simulate-rectifier';

/** What a part is electrically, as far as its rectifier needs it; SI base units, ratios as fractions, null for unknown. */
export interface RectifierModel {
  topology: string;
  lineHertz: number;
  ratedAmperes: number;
  secondaryPeakVolts: number | null;
  sourceOhms: number | null;
  diodeDropVolts: number | null;
  filterFarads: number | null;
  filterTolerance: number | null;
  filterEsrOhms: number | null;
}

/** Lowest and highest, in volts. */
export interface Band {
  low: number;
  high: number;
}

/** What a sound unit of the part ought to give; volts, ripple peak to peak. */
export interface RectifierBands {
  ripple: Band;
  /** Mean at the rated current. */
  loaded: Band;
  /** Mean with nothing but an instrument connected. */
  noLoad: Band;
  nominal: { rippleVolts: number; loadedVolts: number; noLoadVolts: number };
}

/** Usual tolerance of an aluminium electrolytic capacitor, where the part states none (common practice, no source). */
export const USUAL_CAPACITOR_TOLERANCE = 0.2;
/** How far the mains may be from its rated voltage (EN 50160, IEC 60038: ±10 %; from memory). */
export const LINE_TOLERANCE = 0.1;
/** How far a bench's load is from the rated current, its setting and its leads together (common practice, no source). */
export const LOAD_TOLERANCE = 0.05;
/** What an instrument on the output draws: a multimeter has about 10 MΩ (common practice, no source). */
export const INSTRUMENT_OHMS = 10e6;

type Topology = RectifierCircuit['topology'];
const TOPOLOGIES: readonly Topology[] = ['half-wave', 'centre-tap', 'bridge'];

/** Why a part's rectifier cannot be computed: what is not known of it. Empty where it can. */
export function missingForModel(
  model: RectifierModel,
): ('topology' | 'secondaryPeakVolts' | 'sourceOhms' | 'filterFarads')[] {
  if (!TOPOLOGIES.some((one) => one === model.topology)) return ['topology'];
  return (['secondaryPeakVolts', 'sourceOhms', 'filterFarads'] as const).filter((name) => model[name] === null);
}

/** A stated drop holds for all currents of a small supply; without one a silicon diode is taken. */
function diodeOf({ diodeDropVolts }: RectifierModel): Diode {
  return diodeDropVolts === null ? SILICON_DIODE : { kind: 'drop', dropVolts: diodeDropVolts, onOhms: 0.05 };
}

/**
 * The circuit of a part at its rated current, which a bench's electronic load draws whatever the voltage; null where the
 * part is no rectifier with a capacitor, or too little is known of it.
 */
export function circuitOf(model: RectifierModel): RectifierCircuit | null {
  const topology = TOPOLOGIES.find((one) => one === model.topology);
  const { secondaryPeakVolts, sourceOhms, filterFarads } = model;
  if (!topology || secondaryPeakVolts === null || sourceOhms === null || filterFarads === null) return null;
  return {
    topology,
    lineHertz: model.lineHertz,
    sourcePeakVolts: [secondaryPeakVolts],
    sourceOhms,
    diode: diodeOf(model),
    capacitanceFarads: filterFarads,
    esrOhms: model.filterEsrOhms ?? 0,
    load: { kind: 'current', amperes: model.ratedAmperes },
  };
}

function at(circuit: RectifierCircuit, line: number, capacitor: number, load: number): RectifierCircuit {
  const [peak] = circuit.sourcePeakVolts;
  const amperes = circuit.load.kind === 'current' ? circuit.load.amperes * load : 0;
  return {
    ...circuit,
    sourcePeakVolts: [peak * line],
    capacitanceFarads: circuit.capacitanceFarads * capacitor,
    load: { kind: 'current', amperes },
  };
}

function bandOf(results: readonly RectifierResult[], value: (result: RectifierResult) => number): Band {
  const values = results.map(value);
  return { low: Math.min(...values), high: Math.max(...values) };
}

function around(tolerance: number): readonly number[] {
  return tolerance === 0 ? [1] : [1 - tolerance, 1 + tolerance];
}

/**
 * The lowest and highest ripple and voltage that sound units of a part give over its tolerance corners: capacitor, line
 * voltage and load. The halves of a centre tap are taken as equal.
 *
 * Computed when a part is saved (some hundred milliseconds), never while somebody types.
 *
 * @returns null where the part has no rectifier model, or its values have no steady state
 * @throws {RangeError} for a value outside the model's domain, naming it
 */
export function expectedBands(model: RectifierModel): RectifierBands | null {
  const circuit = circuitOf(model);
  if (!circuit) return null;
  const tolerance = model.filterTolerance ?? USUAL_CAPACITOR_TOLERANCE;
  try {
    const corners = around(LINE_TOLERANCE).flatMap((line) =>
      around(tolerance).flatMap((capacitor) =>
        around(LOAD_TOLERANCE).map((load) => simulateRectifier(at(circuit, line, capacitor, load))),
      ),
    );
    const unloaded = (line: number) =>
      simulateRectifier({ ...at(circuit, line, 1, 1), load: { kind: 'resistor', ohms: INSTRUMENT_OHMS } });
    const nominal = simulateRectifier(circuit);
    const mean = ({ meanVolts }: RectifierResult) => meanVolts;
    return {
      ripple: bandOf(corners, ({ rippleVolts }) => rippleVolts),
      loaded: bandOf(corners, mean),
      noLoad: bandOf(around(LINE_TOLERANCE).map(unloaded), mean),
      nominal: {
        rippleVolts: nominal.rippleVolts,
        loadedVolts: nominal.meanVolts,
        noLoadVolts: unloaded(1).meanVolts,
      },
    };
  } catch (error) {
    if (error instanceof NoSteadyState) return null;
    throw error;
  }
}
