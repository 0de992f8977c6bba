import { type WeightedComponent } from './component';

/** Components of one origin, added. */
export interface Contribution {
  members: readonly WeightedComponent[];
  /** Σ c u over the members, with their signs. */
  signed: number;
  degreesOfFreedom: number;
}

/** A combined standard uncertainty. */
export interface Combined {
  standardUncertainty: number;
  /** By Welch and Satterthwaite; Infinity where every component's are. */
  effectiveDegreesOfFreedom: number;
  contributions: readonly Contribution[];
}

function contributionOf(members: readonly WeightedComponent[]): Contribution {
  return {
    members,
    signed: members.reduce((sum, { component, sensitivity }) => sum + sensitivity * component.standardUncertainty, 0),
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
 *
 *     u_c² = Σ over origins (Σ c_i u_i)²        ν_eff = u_c⁴ / Σ (u_g⁴ / ν_g)
 *
 * Source: JCGM 100:2008, 5.1.2, 5.2.2 (correlation +1) and G.4.1 (Welch-Satterthwaite).
 */
export function combine(components: readonly WeightedComponent[]): Combined {
  const contributions = byOrigin(components).map(contributionOf);
  const variance = contributions.reduce((sum, { signed }) => sum + signed * signed, 0);
  const weighted = contributions.reduce(
    (sum, { signed, degreesOfFreedom }) => sum + (degreesOfFreedom === Infinity ? 0 : signed ** 4 / degreesOfFreedom),
    0,
  );
  return {
    standardUncertainty: Math.sqrt(variance),
    effectiveDegreesOfFreedom: weighted === 0 ? Infinity : variance ** 2 / weighted,
    contributions,
  };
}
