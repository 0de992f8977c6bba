import { type ElectricalModel, type ExpectedBands } from '#shared/contract/parts';
import { circuitOf, missingForModel } from '#shared/measurement/rectifier/expected-bands';
import {
  NoSteadyState,
  simulateRectifier,
  type RectifierResult,
} from '#shared/measurement/rectifier/simulate-rectifier';
import { textbookComparison, type TextbookComparison } from '#shared/measurement/rectifier/textbook-ripple';
import { formatBand } from '#shared/quantities/format-band';
import { formatNumber } from '#shared/quantities/format-number';
import { formatQuantity } from '#shared/quantities/format-quantity';

/** One quantity of the output: what the model says, over its tolerances and at its nominal values, and what the textbook does. */
export interface OutputRow {
  readonly name: string;
  readonly band: string;
  readonly nominal: string;
  readonly textbook: string;
  /** How far the textbook is off the model: "+12 %". */
  readonly off: string;
}

/** What a part's rectifier ought to give, or why that cannot be said. */
export type ExpectedOutput =
  | { kind: 'unknown'; why: string }
  | {
      kind: 'known';
      rows: readonly OutputRow[];
      reason: string;
      /** One line cycle of the output, evenly spaced, in volts. */
      wave: Float64Array;
      lineHertz: number;
      ripple: string;
      rippleHertz: string;
    };

const NAMES = {
  secondaryPeakVolts: 'the secondary peak without load',
  sourceOhms: 'the source resistance',
  filterFarads: 'the filter capacitance',
} as const;

/** What a part's rectifier ought to give at its nominal values, beside the bands that were computed when it was saved. */
export function expectedOutput(model: ElectricalModel, bands: ExpectedBands | null): ExpectedOutput {
  const missing = missingForModel(model);
  const circuit = circuitOf(model);
  if (circuit === null) return { kind: 'unknown', why: whyNot(missing) };
  try {
    const simulated = simulateRectifier(circuit);
    const textbook = textbookComparison(circuit, simulated);
    return {
      kind: 'known',
      rows: rowsOf(simulated, textbook, bands),
      reason: textbook.reason,
      wave: simulated.wave,
      lineHertz: circuit.lineHertz,
      ripple: volts(simulated.rippleVolts),
      rippleHertz: formatQuantity(simulated.rippleHertz, 'Hz'),
    };
  } catch (error) {
    if (error instanceof NoSteadyState)
      return { kind: 'unknown', why: 'These values have no steady state: the circuit cannot carry its rated current.' };
    throw error;
  }
}

function whyNot(missing: ReturnType<typeof missingForModel>): string {
  if (missing.includes('topology'))
    return 'The ripple of this circuit does not follow from its mains side, so there is no model to compare readings with.';
  const names = missing.flatMap((name) => (name === 'topology' ? [] : [NAMES[name]]));
  const last = names.at(-1) ?? '';
  const listed = names.length < 2 ? last : `${names.slice(0, -1).join(', ')} and ${last}`;
  return `No model yet: give ${listed}.`;
}

const volts = (value: number) => formatQuantity(value, 'V', { significant: 3 });

function rowsOf(simulated: RectifierResult, textbook: TextbookComparison, bands: ExpectedBands | null): OutputRow[] {
  const band = (given: { low: number; high: number } | undefined) =>
    given === undefined ? '' : formatBand(given.low, given.high, 'V', { significant: 3 });
  const row = (name: string, of: string, modelled: number, textbookValue: number, error: number): OutputRow => ({
    name,
    band: of,
    nominal: volts(modelled),
    textbook: volts(textbookValue),
    off: offText(error),
  });
  const { error } = textbook;
  const noLoad = bands && {
    name: 'Voltage without load',
    band: band(bands.noLoad),
    nominal: volts(bands.nominal.noLoadVolts),
    textbook: '',
    off: '',
  };
  return [
    row('Ripple, peak to peak', band(bands?.ripple), simulated.rippleVolts, textbook.rippleVolts, error.ripple),
    row('Ripple, rms', '', simulated.rippleRmsVolts, textbook.rippleRmsVolts, error.rippleRms),
    row('Mean at rated current', band(bands?.loaded), simulated.meanVolts, textbook.meanVolts, error.mean),
    row('Peak at rated current', '', simulated.peakVolts, textbook.peakVolts, error.peak),
    ...(noLoad ? [noLoad] : []),
  ];
}

function offText(error: number): string {
  const percent = error * 100;
  const digits = Math.abs(percent) < 10 ? 1 : 0;
  const shown = formatNumber(percent, digits);
  return `${percent > 0 && !shown.startsWith('0') ? '+' : ''}${shown}\u00a0%`;
}
