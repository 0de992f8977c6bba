import { describe, expect, it } from 'vitest';
import { codeLetter } from '#shared/sampling/code-letter';
import { type MasterTable } from '#shared/sampling/master-table';
import { AQLS, CODE_LETTERS, INSPECTION_LEVELS, type Severity } from '#shared/sampling/scheme';
import { singleSamplingPlan } from '#shared/sampling/single-sampling-plan';
import { NORMAL_TABLE, REDUCED_TABLE, TIGHTENED_TABLE } from '#shared/sampling/single-sampling-tables';
import letters from './data/code-letters.json' with { type: 'json' };
import normal from './data/single-normal.json' with { type: 'json' };
import reduced from './data/single-reduced.json' with { type: 'json' };
import tightened from './data/single-tightened.json' with { type: 'json' };

// Sources are named in each data file: MIL-STD-105E (10 May 1989), Tables I, II-A, II-B and II-C.

type PrintedCell = (number | string)[] | string | null;
type Printed = { n: number; cells: Record<string, PrintedCell> };
interface PrintedTable {
  table: Record<string, Printed>;
  tableResolved: Record<string, Record<string, (string | number)[] | null>>;
}

const cases: { severity: Severity; ours: MasterTable; printed: PrintedTable }[] = [
  { severity: 'normal', ours: NORMAL_TABLE, printed: normal },
  { severity: 'tightened', ours: TIGHTENED_TABLE, printed: tightened },
  { severity: 'reduced', ours: REDUCED_TABLE, printed: reduced },
];

/** A lot large enough to be given the letter at level III, and larger than any sample. */
const LOT_FOR_LETTER: Record<string, number> = Object.fromEntries(
  letters.rows.map((row) => [row.III, row.lotMax ?? 1_000_000]),
);

describe('code letters (Table I)', () => {
  const bounds = letters.rows.flatMap((row) =>
    INSPECTION_LEVELS.flatMap((level) => [
      { level, lotSize: row.lotMin, letter: row[level] },
      { level, lotSize: row.lotMax ?? 9_000_000, letter: row[level] },
    ]),
  );

  it('covers 15 lot size ranges at seven levels', () => {
    expect(bounds).toHaveLength(2 * 105);
  });

  it.each(bounds)('a lot of $lotSize at level $level has code letter $letter', ({ level, lotSize, letter }) => {
    expect(codeLetter(lotSize, level)).toBe(letter);
  });

  it('a lot of one has letter A', () => {
    expect(codeLetter(1, 'III')).toBe('A');
  });

  it.each([0, -3, 2.5, NaN, Infinity])('a lot of %s has no code letter', (lotSize) => {
    expect(() => codeLetter(lotSize, 'II')).toThrow(/lotSize/);
  });
});

describe.each(cases)('$severity inspection, single sampling', ({ severity, ours, printed }) => {
  it('has the printed rows and sample sizes', () => {
    const sizes = Object.entries(printed.table).map(([letter, row]) => [letter, row.n]);
    expect(ours.map((row) => [row.letter, row.sampleSize])).toEqual(sizes);
  });

  it('agrees with the printed table in every cell', () => {
    for (const row of ours) {
      for (const aql of AQLS) {
        const cell = row.cells.get(aql);
        const shown = typeof cell === 'object' ? [cell.acceptance, cell.rejection] : cell === 'blank' ? null : cell;
        expect(shown, `${row.letter} ${aql}`).toEqual(printed.table[row.letter]?.cells[aql]);
      }
    }
  });

  it('follows every arrow to the plan that applies', () => {
    let checked = 0;
    for (const letter of CODE_LETTERS.filter((known) => LOT_FOR_LETTER[known] !== undefined)) {
      for (const aql of AQLS) {
        const plan = planFor(letter, aql, severity);
        expect(plan, `${letter} ${aql}`).toEqual(printed.tableResolved[letter]?.[aql]);
        checked += 1;
      }
    }
    // Level III reaches every letter but A, which the next test takes.
    expect(checked).toBe(15 * 26);
  });

  it('follows every arrow of letter A', () => {
    for (const aql of AQLS) {
      const plan = singleSamplingPlan({ lotSize: 8, level: 'II', aql, severity });
      const [letter, size, acceptance, rejection] = printed.tableResolved['A']?.[aql] ?? [];
      expect([plan.planLetter, plan.acceptance, plan.rejection], `A ${aql}`).toEqual([letter, acceptance, rejection]);
      expect(plan.sampleSize, `A ${aql}`).toBe(Math.min(Number(size), 8));
      expect(plan.wholeLot, `A ${aql}`).toBe(Number(size) >= 8);
    }
  });
});

/** The plan as the reference data write it, its sample size not cut to a small lot. */
function planFor(letter: string, aql: (typeof AQLS)[number], severity: Severity) {
  const lotSize = LOT_FOR_LETTER[letter] ?? 0;
  const plan = singleSamplingPlan({ lotSize, level: 'III', aql, severity });
  expect(plan.codeLetter).toBe(letter);
  const row = cases
    .find((entry) => entry.severity === severity)
    ?.ours.find((entry) => entry.letter === plan.planLetter);
  expect(plan.sampleSize).toBe(Math.min(row?.sampleSize ?? NaN, lotSize));
  expect(plan.wholeLot).toBe((row?.sampleSize ?? NaN) >= lotSize);
  return [plan.planLetter, row?.sampleSize, plan.acceptance, plan.rejection];
}

describe('the diagonal structure of the master tables', () => {
  it('gives the same numbers along a diagonal of normal inspection from letter F to R', () => {
    const below = (row: number) => NORMAL_TABLE.slice(row)[0];
    for (let row = 5; row < 15; row += 1) {
      for (let column = 2; column < 20; column += 1) {
        const here = below(row)?.cells.get(AQLS[column] ?? '1000');
        const next = below(row + 1)?.cells.get(AQLS[column - 1] ?? '1000');
        if (typeof here === 'object') expect(next).toEqual(here);
      }
    }
  });
});
