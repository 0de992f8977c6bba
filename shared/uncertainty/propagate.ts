import { combine } from './combine';
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

/** The step of a derivative, as a share of the input's uncertainty and at least of its value. */
const STEP_OF_UNCERTAINTY = 1e-2;
const STEP_OF_VALUE = 1e-7;
/** At a corner, as of |V1 − V2| where both are equal, the slopes of the two sides differ by more than this share. */
const CORNER = 0.1;

/**
 * ∂f/∂x by central differences; at a corner of the formula the steeper side, so that the uncertainty is not underrated.
 */
function sensitivity(f: (x: number) => number, value: number, standardUncertainty: number): number {
  const step = Math.max(standardUncertainty * STEP_OF_UNCERTAINTY, Math.abs(value) * STEP_OF_VALUE, Number.MIN_VALUE);
  const [before, at, after] = [f(value - step), f(value), f(value + step)];
  const [left, right] = [(at - before) / step, (after - at) / step];
  const steeper = Math.abs(left) > Math.abs(right) ? left : right;
  const central = (after - before) / (2 * step);
  return Math.abs(left - right) > CORNER * Math.abs(steeper) ? steeper : central;
}

/**
 * First-order propagation of uncertainty through a formula. Components of the inputs keep the identity of their origin, so
 * that an error which two readings of one range share cancels in their ratio and adds in their sum.
 *
 * Source: JCGM 100:2008, 5.1.2 and 5.1.4 (numerical sensitivities).
 *
 * @param compute takes the inputs by name, in SI base units
 * @throws {RangeError} what the formula throws
 */
export function propagate(
  compute: (inputs: Readonly<Record<string, number>>) => number,
  inputs: ReadonlyMap<string, UncertainInput>,
): Propagated {
  const values = Object.fromEntries([...inputs].map(([name, { value }]) => [name, value]));
  const sensitivities = new Map<string, number>();
  const components: WeightedComponent[] = [];
  for (const [name, { value, components: own }] of inputs) {
    const u = combine(unweighted(own)).standardUncertainty;
    const slope = u === 0 ? 0 : sensitivity((x) => compute({ ...values, [name]: x }), value, u);
    sensitivities.set(name, slope);
    components.push(...own.map((component) => ({ component, sensitivity: slope })));
  }
  return { value: compute(values), components, sensitivities };
}
