/** A diode: an exponential junction with series resistance, or a fixed drop with an on resistance. */
export type Diode =
  | { kind: 'exponential'; saturationAmperes: number; idealityVolts: number; seriesOhms: number }
  | { kind: 'drop'; dropVolts: number; onOhms: number };

/** What the output drives: a resistor, or a constant current. */
export type RectifierLoad = { kind: 'resistor'; ohms: number } | { kind: 'current'; amperes: number };

/** A transformer winding, its diodes and the filter capacitor, in SI base units. */
export interface RectifierCircuit {
  topology: 'half-wave' | 'centre-tap' | 'bridge';
  lineHertz: number;
  /** Peak of the secondary without load; of each half at a centre tap, where the halves may differ. */
  sourcePeakVolts: readonly [number] | readonly [number, number];
  /** Resistance of the winding as seen from the secondary, of each half at a centre tap. */
  sourceOhms: number;
  diode: Diode;
  capacitanceFarads: number;
  /** Equivalent series resistance of the capacitor. */
  esrOhms: number;
  load: RectifierLoad;
  /** Whether the path that conducts in the first half of the cycle is open. */
  openDiode?: boolean;
}

/**
 * A general-purpose silicon diode of about 1 A: 0.55 V at 1 mA, 0.91 V at 1 A, at 27 °C.
 * Recomputed from a generic junction model (IS 5 nA, N 1.75, RS 50 mΩ); common practice, no source.
 */
export const SILICON_DIODE: Diode = {
  kind: 'exponential',
  saturationAmperes: 5e-9,
  idealityVolts: 1.75 * 0.02586492579,
  seriesOhms: 0.05,
};

/** The least resistance of a conducting path: below it charging would be instant, which no winding allows. */
export const LEAST_PATH_OHMS = 1e-4;

function demand(holds: boolean, name: string, what: string): void {
  if (!holds) throw new RangeError(`${name} ${what}.`);
}

function positive(name: string, value: number): void {
  demand(Number.isFinite(value) && value > 0, name, 'must be a number above 0');
}

function notNegative(name: string, value: number): void {
  demand(Number.isFinite(value) && value >= 0, name, 'must be a number of at least 0');
}

function checkDiode(diode: Diode): void {
  if (diode.kind === 'drop') {
    notNegative('diode.dropVolts', diode.dropVolts);
    notNegative('diode.onOhms', diode.onOhms);
    return;
  }
  positive('diode.saturationAmperes', diode.saturationAmperes);
  positive('diode.idealityVolts', diode.idealityVolts);
  notNegative('diode.seriesOhms', diode.seriesOhms);
}

/** Diodes in series in one conducting path. */
export function diodesInPath({ topology }: RectifierCircuit): number {
  return topology === 'bridge' ? 2 : 1;
}

/** Resistance of one conducting path, winding and diodes. */
export function pathOhms(circuit: RectifierCircuit): number {
  const { diode, sourceOhms } = circuit;
  return sourceOhms + diodesInPath(circuit) * (diode.kind === 'drop' ? diode.onOhms : diode.seriesOhms);
}

/** @throws {RangeError} naming the argument that is not finite or outside the domain */
export function checkCircuit(circuit: RectifierCircuit): void {
  positive('lineHertz', circuit.lineHertz);
  circuit.sourcePeakVolts.forEach((volts, half) => positive(`sourcePeakVolts[${half}]`, volts));
  demand(
    circuit.topology === 'centre-tap' || circuit.sourcePeakVolts.length === 1,
    'sourcePeakVolts',
    'has two values at a centre tap only',
  );
  notNegative('sourceOhms', circuit.sourceOhms);
  checkDiode(circuit.diode);
  demand(
    pathOhms(circuit) >= LEAST_PATH_OHMS,
    'sourceOhms',
    `and the diodes must have ${LEAST_PATH_OHMS} ohm together`,
  );
  positive('capacitanceFarads', circuit.capacitanceFarads);
  notNegative('esrOhms', circuit.esrOhms);
  if (circuit.load.kind === 'resistor') positive('load.ohms', circuit.load.ohms);
  else notNegative('load.amperes', circuit.load.amperes);
}
