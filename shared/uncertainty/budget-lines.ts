import { combine, type Combined, type Contribution } from './combine';
import { type Component, type WeightedComponent } from './component';

/** What a component's width is divided by, as a number and as it is written. */
export interface Divisor {
  value: number;
  text: string;
}

/** One line of a budget as it is laid out for an auditor. Values in the SI base unit of the input, shares as fractions. */
export interface BudgetLine {
  /** Number of the line, from 1. */
  line: number;
  source: string;
  /** The input of the formula it belongs to; null where the result is the reading itself. */
  input: string | null;
  distribution: Component['distribution'];
  /** Half of the width of a rectangular one; null for a normal one. */
  halfWidth: number | null;
  divisor: Divisor;
  standardUncertainty: number;
  /** With its sign. */
  sensitivity: number;
  /** |c u|, in the unit of the result. */
  contribution: number;
  degreesOfFreedom: number;
  /** What its origin contributes to u_c²; on the first line of an origin only, so that the shares add to 1. */
  share: number | null;
  /** The other lines of the same origin. */
  sharedWith: number[];
  /** What becomes of an error that lines share, in words; null where nothing is shared. */
  note: string | null;
}

/** A budget laid out, with what its lines combine to. */
export interface Budget {
  lines: BudgetLine[];
  combined: Combined;
}

const DIVISORS: Record<Component['distribution'], Divisor> = {
  rectangular: { value: Math.sqrt(3), text: '√3' },
  normal: { value: 1, text: '1' },
};

/** What is left of a shared error below this share of its lines' sum cancels, above the second one it adds. */
const CANCELS = 0.01;
const ADDS = 0.99;

function contributionOf({ component, sensitivity }: WeightedComponent): number {
  return Math.abs(sensitivity * component.standardUncertainty);
}

function listed(lines: readonly number[]): string {
  const last = lines.at(-1) ?? '';
  return lines.length < 2 ? `line ${last}` : `lines ${lines.slice(0, -1).join(', ')} and ${last}`;
}

function sharingNote({ members, standardUncertainty }: Contribution, others: readonly number[]): string | null {
  if (others.length === 0) return null;
  const total = members.reduce((sum, one) => sum + contributionOf(one), 0);
  const left = total === 0 ? 0 : standardUncertainty / total;
  const outcome = left < CANCELS ? 'cancels' : left > ADDS ? 'adds' : 'cancels in part';
  return `The same error as in ${listed(others)}: it ${outcome}.`;
}

function shareOf({ standardUncertainty }: Contribution, combined: Combined): number {
  return combined.standardUncertainty === 0 ? 0 : (standardUncertainty / combined.standardUncertainty) ** 2;
}

/**
 * Lays a budget out line by line, in the order of its components, and combines it.
 *
 * Source: the columns of an uncertainty budget of EA-4/02 (quantity, standard uncertainty, distribution, sensitivity,
 * contribution), from memory; the share and the note are the product's own.
 *
 * @param components of a reading (`unweighted`) or of what is computed from readings (`propagate`)
 */
export function budgetLines(components: readonly WeightedComponent[]): Budget {
  const combined = combine(components);
  const contributions = new Map(combined.contributions.flatMap((one) => one.members.map((member) => [member, one])));
  const numbers = new Map(components.map((one, index) => [one, index + 1]));
  const lines = components.map((one, index): BudgetLine => {
    const whole = contributions.get(one) ?? { members: [one], standardUncertainty: 0, degreesOfFreedom: Infinity };
    const { component, sensitivity, input = null } = one;
    const { name, distribution, halfWidth, standardUncertainty, degreesOfFreedom } = component;
    const sharedWith = whole.members.filter((other) => other !== one).map((other) => numbers.get(other) ?? 0);
    return {
      line: index + 1,
      source: name,
      input,
      distribution,
      halfWidth,
      divisor: DIVISORS[distribution],
      standardUncertainty,
      sensitivity,
      contribution: contributionOf(one),
      degreesOfFreedom,
      share: whole.members[0] === one ? shareOf(whole, combined) : null,
      sharedWith,
      note: sharingNote(whole, sharedWith),
    };
  });
  return { lines, combined };
}
