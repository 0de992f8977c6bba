import { alternatePeakDifference } from './alternate-peak-difference';
import { averageActiveEfficiency, LOAD_POINTS } from './average-active-efficiency';
import { efficiency } from './efficiency';
import { lineRegulation } from './line-regulation';
import { loadRegulation } from './load-regulation';
import { outputResistance } from './output-resistance';
import { sawtoothRms } from './rectifier/textbook-ripple';
import { rippleFactor } from './ripple-factor';
import { rippleRatio } from './ripple-ratio';
import { timeConstant } from './time-constant';
import { transformerBalance } from './transformer-balance';

/** The keys of the formulas that a plan's computed characteristic may name. */
export const FORMULA_KEYS = [
  'load-regulation',
  'ripple-ratio',
  'transformer-balance',
  'output-resistance',
  'efficiency',
  'alternate-peak-difference',
  'load-regulation-rated',
  'line-regulation',
  'ripple-ratio-peak',
  'ripple-factor',
  'ripple-rms-estimate',
  'average-active-efficiency',
  'time-constant',
] as const;
/** One of {@link FORMULA_KEYS}. */
export type FormulaKey = (typeof FORMULA_KEYS)[number];

/** A formula of a computed characteristic. */
export interface Formula {
  title: string;
  /** What it takes, in SI base units: the name a plan binds to a characteristic, and its title on screen. */
  inputs: readonly { name: string; title: string }[];
  /** Ratings it takes beside readings, which the plan gives in SI base units. */
  constants: readonly { name: string; title: string; unit: string }[];
  /** The unit its result is shown in; the result itself is in SI base units, ratios as fractions. */
  unit: string;
  /** Takes inputs and constants by name. @throws {RangeError} for an input that is missing, not finite or outside the formula's domain */
  compute(inputs: Readonly<Record<string, number>>): number;
}

const NO_LOAD = { name: 'no_load', title: 'Voltage without load' } as const;
const RATED = { name: 'rated', title: 'Rated voltage', unit: 'V' } as const;
const LOADED = { name: 'loaded', title: 'Voltage at full load' } as const;

/** A formula whose inputs are typed by their names; one that is missing reaches `compute` as NaN and is refused there. */
function formula<Name extends string>(
  title: string,
  unit: string,
  inputs: readonly { name: Name; title: string }[],
  compute: (inputs: Record<Name, number>) => number,
): Formula {
  return ratedFormula(title, unit, { inputs, constants: [] }, compute);
}

/** A formula that takes ratings of the part beside readings. */
function ratedFormula<Name extends string, Rating extends string>(
  title: string,
  unit: string,
  {
    inputs,
    constants,
  }: {
    inputs: readonly { name: Name; title: string }[];
    constants: readonly { name: Rating; title: string; unit: string }[];
  },
  compute: (given: Record<Name | Rating, number>) => number,
): Formula {
  const names = [...inputs, ...constants].map(({ name }) => name);
  const pick = (given: Readonly<Record<string, number>>) => {
    const picked: Partial<Record<Name | Rating, number>> = {};
    for (const name of names) picked[name] = given[name] ?? NaN;
    return picked as Record<Name | Rating, number>;
  };
  return { title, inputs, constants, unit, compute: (given) => compute(pick(given)) };
}

/** The closed set of formulas, each by its key. */
export const FORMULAS: Readonly<Record<FormulaKey, Formula>> = {
  'load-regulation': formula('Load regulation', '%', [NO_LOAD, LOADED], ({ no_load, loaded }) =>
    loadRegulation({ noLoadVolts: no_load, loadedVolts: loaded }),
  ),
  'ripple-ratio': formula(
    'Ripple ratio, peak to peak',
    '%',
    [{ name: 'ripple', title: 'Ripple, peak to peak' }, LOADED],
    ({ ripple, loaded }) => rippleRatio({ rippleVolts: ripple, loadedVolts: loaded }),
  ),
  'transformer-balance': formula(
    'Transformer balance',
    '%',
    [
      { name: 'half1', title: 'Peak of the first half-winding' },
      { name: 'half2', title: 'Peak of the second half-winding' },
    ],
    ({ half1, half2 }) => transformerBalance({ firstHalfVolts: half1, secondHalfVolts: half2 }),
  ),
  'output-resistance': formula(
    'Output resistance',
    'Ω',
    [NO_LOAD, LOADED, { name: 'load_current', title: 'Current at full load' }],
    ({ no_load, loaded, load_current }) =>
      outputResistance({ noLoadVolts: no_load, loadedVolts: loaded, loadAmperes: load_current }),
  ),
  efficiency: formula(
    'Efficiency',
    '%',
    [
      { name: 'output_power', title: 'Output power' },
      { name: 'input_power', title: 'Input power' },
    ],
    ({ output_power, input_power }) => efficiency({ outputWatts: output_power, inputWatts: input_power }),
  ),
  'alternate-peak-difference': formula(
    'Alternate-peak difference',
    'V',
    [
      { name: 'odd', title: 'Mean of the odd ripple peaks' },
      { name: 'even', title: 'Mean of the even ripple peaks' },
    ],
    ({ odd, even }) => alternatePeakDifference({ oddPeakVolts: odd, evenPeakVolts: even }),
  ),
  'load-regulation-rated': ratedFormula(
    'Load regulation against the rated voltage',
    '%',
    { inputs: [NO_LOAD, LOADED], constants: [RATED] },
    ({ no_load, loaded, rated }) => loadRegulation({ noLoadVolts: no_load, loadedVolts: loaded, ratedVolts: rated }),
  ),
  'line-regulation': ratedFormula(
    'Line regulation',
    '%',
    {
      inputs: [
        { name: 'high_line', title: 'Voltage at high line' },
        { name: 'low_line', title: 'Voltage at low line' },
      ],
      constants: [RATED],
    },
    ({ high_line, low_line, rated }) =>
      lineRegulation({ highLineVolts: high_line, lowLineVolts: low_line, ratedVolts: rated }),
  ),
  'ripple-ratio-peak': formula(
    'Ripple against the peak value',
    '%',
    [
      { name: 'ripple', title: 'Ripple, peak to peak' },
      { name: 'peak', title: 'Peak of the output' },
    ],
    ({ ripple, peak }) => rippleRatio({ rippleVolts: ripple, loadedVolts: peak }),
  ),
  'ripple-factor': formula(
    'Ripple factor, rms',
    '%',
    [{ name: 'ripple_rms', title: 'Ripple, rms' }, LOADED],
    ({ ripple_rms, loaded }) => rippleFactor({ rippleRmsVolts: ripple_rms, loadedVolts: loaded }),
  ),
  'ripple-rms-estimate': formula(
    'Ripple, rms, estimated as a sawtooth',
    'V',
    [{ name: 'ripple', title: 'Ripple, peak to peak' }],
    ({ ripple }) => sawtoothRms(ripple),
  ),
  'average-active-efficiency': formula(
    'Average active efficiency',
    '%',
    LOAD_POINTS.flatMap((percent) => [
      { name: `out_${percent}` as const, title: `Output power at ${percent} % load` },
      { name: `in_${percent}` as const, title: `Input power at ${percent} % load` },
    ]),
    (given) =>
      averageActiveEfficiency(
        LOAD_POINTS.map((percent) => ({ outputWatts: given[`out_${percent}`], inputWatts: given[`in_${percent}`] })),
      ),
  ),
  'time-constant': formula(
    'Time constant',
    's',
    [
      { name: 'resistance', title: 'Resistance' },
      { name: 'capacitance', title: 'Capacitance' },
    ],
    ({ resistance, capacitance }) => timeConstant({ ohms: resistance, farads: capacitance }),
  ),
};
