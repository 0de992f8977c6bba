import { shuffled, type SeededNumbers } from './seeded-numbers';

/** The whole part of a share and what is left of it, both in whole numbers: share = whole + left ÷ lotSize. */
function shareOf(size: number, sampleSize: number, lotSize: number) {
  return { whole: Math.floor((sampleSize * size) / lotSize), left: (sampleSize * size) % lotSize };
}

/**
 * How many units of the sample each carton gives, in proportion to what it holds.
 *
 * Each carton gives the whole part of its share. The units still wanted go to cartons by lot, in proportion to what is
 * left of their shares: the cartons are put in a random order, their remainders laid end to end on a line, and every
 * stretch of one lot size on it, from a random start, takes the carton it falls in. So no carton gives more than one
 * unit above or below its share, and every unit of the lot is equally likely to be drawn. Giving the rest to the largest
 * remainders instead would never open the last, smaller cartons of a lot with more cartons than sample units.
 *
 * @param sizes units in each carton
 * @param sampleSize units wanted, at most what the cartons hold together
 */
export function cartonShares(sizes: readonly number[], sampleSize: number, numbers: SeededNumbers): number[] {
  const lotSize = sizes.reduce((sum, size) => sum + size, 0);
  const shares = sizes.map((size) => shareOf(size, sampleSize, lotSize));
  const given = shares.map(({ whole }) => whole);
  const order = shuffled([...shares.entries()], numbers);
  let toNextMark = numbers(0, lotSize - 1);
  for (const [carton, { whole, left }] of order) {
    if (toNextMark < left) {
      given[carton] = whole + 1;
      toNextMark += lotSize;
    }
    toNextMark -= left;
  }
  return given;
}
