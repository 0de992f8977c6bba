import { uniformInt } from 'pure-rand/distribution/uniformInt';
import { xoroshiro128plus } from 'pure-rand/generator/xoroshiro128plus';

/** The largest seed a draw takes; the smallest is 0. */
export const LARGEST_SEED = 0xffff_ffff;

/** Outputs dropped at the start, because neighbouring seeds begin with neighbouring numbers. */
const DROPPED = 16;

/** Whole numbers from a recorded seed: each call gives one from `lowest` to `highest`, both included, all equally likely. */
export type SeededNumbers = (lowest: number, highest: number) => number;

/**
 * A sequence of whole numbers that the seed alone decides, so that a draw can be repeated years later.
 *
 * Generator: xoroshiro128+ of the package pure-rand, its first 16 outputs dropped; ranges by its uniformInt.
 *
 * @throws {RangeError} for a seed that is not a whole number from 0 to 4294967295
 */
export function seededNumbers(seed: number): SeededNumbers {
  if (!Number.isInteger(seed) || seed < 0 || seed > LARGEST_SEED) {
    throw new RangeError(`seed must be a whole number from 0 to ${LARGEST_SEED}, not ${seed}.`);
  }
  const generator = xoroshiro128plus(seed);
  for (let dropped = 0; dropped < DROPPED; dropped += 1) generator.next();
  return (lowest, highest) => uniformInt(generator, lowest, highest);
}

/**
 * The items in an order that the numbers decide, every order equally likely; the given array stays as it is.
 *
 * Source: Fisher-Yates shuffle in Durstenfeld's form, from the last place down.
 */
export function shuffled<Item>(items: readonly Item[], numbers: SeededNumbers): Item[] {
  const order = [...items];
  for (let last = order.length - 1; last > 0; last -= 1) {
    const at = numbers(0, last);
    [order[last], order[at]] = [order[at] as Item, order[last] as Item];
  }
  return order;
}
