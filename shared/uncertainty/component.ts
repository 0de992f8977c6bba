/**
 * One component of a measurement uncertainty, in the unit of the quantity it belongs to.
 * Source: JCGM 100:2008 (GUM), 4.3 and 5; EA-4/02.
 */
export interface Component {
  /**
   * The identity of what it comes from, as an instrument range: components of equal origin are wholly correlated and are
   * added before squaring. Null for one that is independent of all others, as the resolution of one reading.
   */
  origin: string | null;
  /** What it is, in words. */
  name: string;
  distribution: 'rectangular' | 'normal';
  /** Half of the width of a rectangular one; null for a normal one. */
  halfWidth: number | null;
  standardUncertainty: number;
  /**
   * The part of the standard uncertainty that grows with the value, as a gain error does, with the sign of the value; the rest
   * is the same whatever is read, as a zero error is. It tells what cancels between readings of one origin.
   */
  proportional: number;
  /** Infinity where it was not found from repeated readings. */
  degreesOfFreedom: number;
}

/** A component with how much a result changes with it; the sign tells what cancels. */
export interface WeightedComponent {
  component: Component;
  sensitivity: number;
  /** The input of the formula it belongs to; none where the result is the reading itself. */
  input?: string;
}

function demandWidth(name: string, value: number): void {
  if (!(Number.isFinite(value) && value >= 0)) throw new RangeError(`${name} must be a number of at least 0.`);
}

/**
 * A component of which only the bounds are known: u = a / √3.
 *
 * @param proportional the part of the half-width that grows with the value, with its sign
 * @throws {RangeError} for a half-width that is negative or not finite, or less than its proportional part
 */
export function rectangular(
  name: string,
  halfWidth: number,
  origin: string | null = null,
  proportional = 0,
): Component {
  demandWidth('halfWidth', halfWidth);
  if (!(Math.abs(proportional) <= halfWidth)) throw new RangeError('proportional must not be more than halfWidth.');
  return {
    origin,
    name,
    distribution: 'rectangular',
    halfWidth,
    standardUncertainty: halfWidth / Math.sqrt(3),
    proportional: proportional / Math.sqrt(3),
    degreesOfFreedom: Infinity,
  };
}

/**
 * A component stated as a standard uncertainty, or found as one from repeated readings (type A).
 *
 * @throws {RangeError} for an uncertainty that is negative or not finite, or degrees of freedom below 1
 */
export function normal(
  name: string,
  standardUncertainty: number,
  { origin = null, degreesOfFreedom = Infinity }: { origin?: string | null; degreesOfFreedom?: number } = {},
): Component {
  demandWidth('standardUncertainty', standardUncertainty);
  if (!(degreesOfFreedom >= 1)) throw new RangeError('degreesOfFreedom must be at least 1.');
  return {
    origin,
    name,
    distribution: 'normal',
    halfWidth: null,
    standardUncertainty,
    proportional: 0,
    degreesOfFreedom,
  };
}

/** Components that enter their quantity as they are. */
export function unweighted(components: readonly Component[]): WeightedComponent[] {
  return components.map((component) => ({ component, sensitivity: 1 }));
}
