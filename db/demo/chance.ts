import { seededNumbers } from '#shared/sampling/seeded-numbers';

const STEPS = 2 ** 31 - 1;

/** Chance that a seed decides: the same seed plays the same quarter. */
export interface Chance {
  /** A whole number from `lowest` to `highest`, both included. */
  whole(lowest: number, highest: number): number;
  between(lowest: number, highest: number): number;
  /** Bell-shaped about `mean`, never farther from it than three `spread`s. */
  about(mean: number, spread: number): number;
  happens(probability: number): boolean;
  pick<Item>(items: readonly Item[]): Item;
}

/** Sum of twelve even numbers less six: near enough to a normal distribution for parts and readings of a demo. */
const TERMS = 12;

export function chanceOf(seed: number): Chance {
  const numbers = seededNumbers(seed);
  const even = () => numbers(0, STEPS) / STEPS;
  const bell = () =>
    Math.max(
      -3,
      Math.min(
        3,
        Array.from({ length: TERMS }, even).reduce((sum, one) => sum + one, -6),
      ),
    );
  return {
    whole: (lowest, highest) => numbers(lowest, highest),
    between: (lowest, highest) => lowest + even() * (highest - lowest),
    about: (mean, spread) => mean + bell() * spread,
    happens: (probability) => even() < probability,
    pick: (items) => {
      const picked = items[numbers(0, items.length - 1)];
      if (picked === undefined) throw new RangeError('items must hold at least one.');
      return picked;
    },
  };
}
