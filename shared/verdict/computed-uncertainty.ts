import { type Component } from '../uncertainty/component';
import { NoSensitivity, propagate, type Propagated, type UncertainInput } from '../uncertainty/propagate';
import { boundFormula } from './computed-value';
import { type JudgedCharacteristic } from './sample-verdict';

/**
 * The uncertainty of a computed characteristic out of the budgets of the readings it is computed from; undefined where one
 * of them is missing or its budget is not known, and where the formula has no value beside them. Values in SI base units.
 *
 * @param characteristic one of kind "computed", with a value for these readings
 * @throws {RangeError} where the characteristic has no formula, or its formula has no value for these readings
 */
export function computedUncertainty(
  characteristic: JudgedCharacteristic,
  values: ReadonlyMap<string, number | boolean>,
  components: ReadonlyMap<string, readonly Component[]>,
): Propagated | undefined {
  const { inputs, compute, sources, constants } = boundFormula(characteristic);
  const uncertain = new Map<string, UncertainInput>();
  for (const [index, { name }] of inputs.entries()) {
    const source = sources[index] ?? '';
    const value = values.get(source);
    const own = components.get(source);
    if (typeof value !== 'number' || own === undefined) return undefined;
    uncertain.set(name, { value, components: own });
  }
  return sensible(() => propagate(compute, uncertain, constants));
}

function sensible(found: () => Propagated): Propagated | undefined {
  try {
    return found();
  } catch (error) {
    if (error instanceof NoSensitivity) return undefined;
    throw error;
  }
}
