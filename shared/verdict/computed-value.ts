import { FORMULAS } from '../measurement/formula';
import { demandFinite } from '../measurement/reading-not-finite';
import { LARGEST_VALUE } from '../quantities/largest-value';
import { type JudgedCharacteristic } from './sample-verdict';

/** The readings of one unit by characteristic key. */
type Values = ReadonlyMap<string, number | boolean>;

/** A computed characteristic on one unit: its value, an input that is missing, or readings its formula has no value for. */
export type ComputedValue = { state: 'value'; value: number } | { state: 'missing' } | { state: 'no value' };

/**
 * Computes a characteristic from the readings of its unit.
 *
 * Readings may lie outside a formula's domain without being wrong: a dead output gives 0 V under load, and a regulation
 * against 0 V does not exist, and one against next to nothing is beyond all measure. That is "no value", not an error.
 *
 * @param characteristic one of kind "computed", its inputs in SI base units
 * @throws {RangeError} where the characteristic has no formula or binds no key to a formula input
 * @throws {ReadingNotFinite} for a reading that is NaN or infinite
 */
export function computedValue(characteristic: JudgedCharacteristic, values: Values): ComputedValue {
  const { inputs, compute, sources, constants } = boundFormula(characteristic);
  const given: Record<string, number> = { ...constants };
  for (const [index, { name }] of inputs.entries()) {
    const value = values.get(sources[index] ?? '');
    if (typeof value !== 'number') return { state: 'missing' };
    given[name] = value;
  }
  demandFinite(given);
  return withinDomain(() => compute(given));
}

/**
 * The formula with the characteristic that each of its inputs takes, in the order of the inputs, and its constants.
 *
 * @throws {RangeError} where the characteristic has no formula or binds no key to a formula input
 */
export function boundFormula({ formula, key }: JudgedCharacteristic) {
  if (formula === null) throw new RangeError(`characteristics: ${key} is computed and needs a formula.`);
  const { inputs, compute } = FORMULAS[formula.key];
  const sources = inputs.map(({ name }) => {
    const source = formula.inputs[name];
    if (source === undefined) throw new RangeError(`characteristics: formula of ${key} binds nothing to ${name}.`);
    return source;
  });
  return { inputs, compute, sources, constants: formula.constants ?? {} };
}

function withinDomain(compute: () => number): ComputedValue {
  try {
    const value = compute();
    return Math.abs(value) <= LARGEST_VALUE ? { state: 'value', value } : { state: 'no value' };
  } catch (error) {
    if (error instanceof RangeError) return { state: 'no value' };
    throw error;
  }
}
