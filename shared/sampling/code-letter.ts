import { type CodeLetter, type InspectionLevel } from './scheme';

/** Largest lot of each row of the table; the last row has no bound. */
const LARGEST_LOT = [8, 15, 25, 50, 90, 150, 280, 500, 1200, 3200, 10_000, 35_000, 150_000, 500_000, Infinity];

/** The columns of the table, read downwards: one letter for each row of lot sizes. */
const LETTERS: Readonly<Record<InspectionLevel, string>> = {
  'S-1': 'AAAABBBBCCCCDDD',
  'S-2': 'AAABBBCCCDDDEEE',
  'S-3': 'AABBCCDDEEFFGGH',
  'S-4': 'AABCCDEEFGGHJJK',
  I: 'AABCCDEFGHJKLMN',
  II: 'ABCDEFGHJKLMNPQ',
  III: 'BCDEFGHJKLMNPQR',
};

/**
 * The sample size code letter for a lot.
 *
 * The table starts at lots of two; a lot of one gets letter A, and its one unit is inspected.
 * Source: MIL-STD-105E, Table I; the same in ANSI/ASQ Z1.4.
 *
 * @param lotSize units in the lot
 * @throws {RangeError} unless lotSize is a whole number of at least 1
 */
export function codeLetter(lotSize: number, level: InspectionLevel): CodeLetter {
  if (!Number.isSafeInteger(lotSize) || lotSize < 1) {
    throw new RangeError(`lotSize must be a whole number of at least 1, not ${lotSize}.`);
  }
  if (lotSize === 1) return 'A';
  const row = LARGEST_LOT.findIndex((largest) => lotSize <= largest);
  return LETTERS[level].charAt(row) as CodeLetter;
}
