import { alternatePeakDifference } from './alternate-peak-difference';
import { efficiency } from './efficiency';
import { loadRegulation } from './load-regulation';
import { outputResistance } from './output-resistance';
import { rippleRatio } from './ripple-ratio';
import { transformerBalance } from './transformer-balance';

/** The keys of the formulas that a plan's computed characteristic may name. */
export const FORMULA_KEYS = [
  'load-regulation',
  'ripple-ratio',
  'transformer-balance',
  'output-resistance',
  'efficiency',
  'alternate-peak-difference',
] as const;
/** One of {@link FORMULA_KEYS}. */
export type FormulaKey = (typeof FORMULA_KEYS)[number];

/** A formula of a computed characteristic. */
export interface Formula {
  title: string;
  /** What it takes, in SI base units: the name a plan binds to a characteristic, and its title on screen. */
  inputs: readonly { name: string; title: string }[];
  /** The unit its result is shown in; the result itself is in SI base units, ratios as fractions. */
  unit: string;
  /** @throws {RangeError} for an input that is missing, not finite or outside the formula's domain */
  compute(inputs: Readonly<Record<string, number>>): number;
}

const NO_LOAD = { name: 'no_load', title: 'Voltage without load' } as const;
const LOADED = { name: 'loaded', title: 'Voltage at full load' } as const;

/** A formula whose inputs are typed by their names; one that is missing reaches `compute` as NaN and is refused there. */
function formula<Name extends string>(
  title: string,
  unit: string,
  inputs: readonly { name: Name; title: string }[],
  compute: (inputs: Record<Name, number>) => number,
): Formula {
  const pick = (given: Readonly<Record<string, number>>) =>
    Object.fromEntries(inputs.map(({ name }) => [name, given[name] ?? NaN])) as Record<Name, number>;
  return { title, inputs, unit, compute: (given) => compute(pick(given)) };
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
};
