import { type WeightedComponent } from './component';

/** Components of one origin, added. */
export interface Contribution {
  members: readonly WeightedComponent[];
  /** What they contribute together, |c u| for a single one. */
  standardUncertainty: number;
  degreesOfFreedom: number;
}

/** A combined standard uncertainty. */
export interface Combined {
  standardUncertainty: number;
  /** By Welch and Satterthwaite; Infinity where every component's are. */
  effectiveDegreesOfFreedom: number;
  contributions: readonly Contribution[];
}

/** One gain error and one zero error, each the same for all members; their sizes add as the terms of a specification do. */
function added(members: readonly WeightedComponent[]): number {
  let [gain, zero] = [0, 0];
  for (const { component, sensitivity } of members) {
    gain += sensitivity * component.proportional;
    zero += sensitivity * (component.standardUncertainty - Math.abs(component.proportional));
  }
  return Math.abs(gain) + Math.abs(zero);
}

function contributionOf(members: readonly WeightedComponent[]): Contribution {
  return {
    members,
    standardUncertainty: added(members),
    degreesOfFreedom: Math.min(...members.map(({ component }) => component.degreesOfFreedom)),
  };
}

function byOrigin(components: readonly WeightedComponent[]): WeightedComponent[][] {
  const shared = new Map<string, WeightedComponent[]>();
  const groups: WeightedComponent[][] = [];
  for (const one of components) {
    const { origin } = one.component;
    const known = origin === null ? undefined : shared.get(origin);
    if (known) {
      known.push(one);
      continue;
    }
    const group = [one];
    groups.push(group);
    if (origin !== null) shared.set(origin, group);
  }
  return groups;
}

/**
 * Combines components: those of one origin are wholly correlated and are added with their signs, all others in quadrature.
 * Within an origin the part that grows with the value and the part that does not are added each by itself, since the one may
 * cancel where the other adds (two readings of opposite polarity), and then one to the other without their signs.
 *
 *     u_g = |Σ c_i u_gain,i| + |Σ c_i u_zero,i|        u_c² = Σ u_g²        ν_eff = u_c⁴ / Σ (u_g⁴ / ν_g)
 *
 * Source: JCGM 100:2008, 5.1.2, 5.2.2 (correlation +1) and G.4.1 (Welch-Satterthwaite).
 */
export function combine(components: readonly WeightedComponent[]): Combined {
  const contributions = byOrigin(components).map(contributionOf);
  const variance = contributions.reduce((sum, { standardUncertainty: u }) => sum + u * u, 0);
  const weighted = contributions.reduce(
    (sum, { standardUncertainty: u, degreesOfFreedom }) =>
      sum + (degreesOfFreedom === Infinity ? 0 : u ** 4 / degreesOfFreedom),
    0,
  );
  return {
    standardUncertainty: Math.sqrt(variance),
    effectiveDegreesOfFreedom: weighted === 0 ? Infinity : variance ** 2 / weighted,
    contributions,
  };
}

/**
 * The combined standard uncertainty alone, as {@link combine} finds it: a verdict needs it for every reading of a sample, and
 * most readings share nothing.
 */
export function combinedStandardUncertainty(components: readonly WeightedComponent[]): number {
  const origins: string[] = [];
  let variance = 0;
  for (const { component, sensitivity } of components) {
    const { origin, standardUncertainty } = component;
    if (origin !== null && origins.includes(origin)) return combine(components).standardUncertainty;
    if (origin !== null) origins.push(origin);
    variance += (sensitivity * standardUncertainty) ** 2;
  }
  return Math.sqrt(variance);
}
