import { combinedStandardUncertainty } from './combine';
import { unweighted, type Component, type WeightedComponent } from './component';

/** An input of a formula: its value and the components of its uncertainty. */
export interface UncertainInput {
  value: number;
  components: readonly Component[];
}

/** A formula's result with its components, each with its sensitivity; `sensitivities` by input name. */
export interface Propagated {
  value: number;
  components: WeightedComponent[];
  sensitivities: ReadonlyMap<string, number>;
}

/** The formula has no value on either side of its readings, so that nothing can be said of their uncertainty. */
export class NoSensitivity extends RangeError {
  override readonly name = 'NoSensitivity';
}

/** The step of a derivative, as a share of the input's uncertainty and at least of its value. */
const STEP_OF_UNCERTAINTY = 1e-2;
const STEP_OF_VALUE = 1e-7;
/** At a corner, as of |V1 − V2| where both are equal, the slopes of the two sides differ by more than this share. */
const CORNER = 0.1;

/** The slope from a value of the formula towards one side; undefined where the formula's domain ends there. */
function slope(f: (x: number) => number, at: number, value: number, step: number): number | undefined {
  try {
    const found = (f(value + step) - at) / step;
    return Number.isFinite(found) ? found : undefined;
  } catch (error) {
    if (error instanceof RangeError) return undefined;
    throw error;
  }
}

/**
 * ∂f/∂x by central differences; at a corner of the formula the steeper side, so that the uncertainty is not underrated, and at
 * the end of its domain (a ripple of 0 V) the side that it has.
 */
function sensitivity(f: (x: number) => number, at: number, value: number, standardUncertainty: number): number {
  const step = Math.max(standardUncertainty * STEP_OF_UNCERTAINTY, Math.abs(value) * STEP_OF_VALUE);
  const [left, right] = [slope(f, at, value, -step), slope(f, at, value, step)];
  const either = left ?? right;
  if (either === undefined) throw new NoSensitivity('inputs: the formula has no value beside these readings.');
  if (left === undefined || right === undefined) return either;
  const steeper = Math.abs(left) > Math.abs(right) ? left : right;
  return Math.abs(left - right) > CORNER * Math.abs(steeper) ? steeper : (left + right) / 2;
}

/**
 * First-order propagation of uncertainty through a formula. Components of the inputs keep the identity of their origin, so
 * that an error which two readings of one range share cancels in their ratio and adds in their sum.
 *
 * Source: JCGM 100:2008, 5.1.2 and 5.1.4 (numerical sensitivities).
 *
 * @param compute takes inputs and constants by name, in SI base units
 * @param constants ratings that the formula takes beside readings; they are exact
 * @throws {NoSensitivity} where the formula has no value beside the readings
 * @throws {RangeError} what the formula throws at the readings
 */
export function propagate(
  compute: (inputs: Readonly<Record<string, number>>) => number,
  inputs: ReadonlyMap<string, UncertainInput>,
  constants: Readonly<Record<string, number>> = {},
): Propagated {
  const values: Record<string, number> = { ...constants };
  for (const [name, { value }] of inputs) values[name] = value;
  const value = compute(values);
  const sensitivities = new Map<string, number>();
  const components: WeightedComponent[] = [];
  for (const [name, { value: x, components: own }] of inputs) {
    const u = combinedStandardUncertainty(unweighted(own));
    const weight = u === 0 ? 0 : sensitivity((given) => compute({ ...values, [name]: given }), value, x, u);
    sensitivities.set(name, weight);
    components.push(...own.map((component) => ({ component, sensitivity: weight, input: name })));
  }
  return { value, components, sensitivities };
}
