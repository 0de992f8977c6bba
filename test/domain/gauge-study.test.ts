import { averageAndRange } from '#shared/statistics/gauge-study/average-and-range';
import { SPREADS, type SpreadAnalysis, type StudyReadings } from '#shared/statistics/gauge-study/gauge-study';
import { leadingTable } from '#shared/statistics/gauge-study/leading-table';
import { gaugeStudyResults } from '#shared/statistics/gauge-study/study-results';
import { StudyUneven } from '#shared/statistics/gauge-study/study-shape';
import { manyRangesFactor, oneRangeFactor, RangeFactorNotKnown } from '#shared/statistics/gauge-study/range-factors';
import { smallnessOf } from '#shared/statistics/gauge-study/study-smallness';
import { fitnessOf, studyVerdict } from '#shared/statistics/gauge-study/study-verdict';
import { varianceWithInteraction } from '#shared/statistics/gauge-study/variance-table';
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';

/** Studies of two to six parts, two to four persons and trials, whose readings do differ. */
const studies = fc
  .tuple(fc.integer({ min: 2, max: 6 }), fc.integer({ min: 2, max: 4 }), fc.integer({ min: 2, max: 4 }))
  .chain(([parts, persons, trials]) => {
    const reading = fc.integer({ min: -1000, max: 1000 }).map((thousandths) => thousandths / 1000);
    const cell = fc.array(reading, { minLength: trials, maxLength: trials });
    const row = fc.array(cell, { minLength: persons, maxLength: persons });
    return fc.array(row, { minLength: parts, maxLength: parts });
  });

function changed(study: StudyReadings, change: (reading: number) => number): StudyReadings {
  return study.map((rows) => rows.map((cell) => cell.map(change)));
}

/** Standard deviations in the order of a report. */
function sigmas({ shares }: SpreadAnalysis): number[] {
  return shares.map(({ sigma }) => sigma);
}

/** All standard deviations that a study yields, by both methods. */
function allSigmas(study: StudyReadings): number[] {
  const { varianceWithInteraction: kept, variancePooled: pooled, averageRange } = gaugeStudyResults(study, null);
  return [...sigmas(kept.analysis), ...sigmas(pooled.analysis), ...sigmas(averageRange.analysis)];
}

/** A variance near 0 is a difference of mean squares, so its root is known to the root of their rounding only. */
function expectAlike(found: readonly number[], expected: readonly number[], scale = 1): void {
  found.forEach((sigma, index) => {
    expect(Math.abs(sigma ** 2 - (expected[index] ?? Number.NaN) ** 2)).toBeLessThan(1e-9 * scale ** 2);
  });
}

describe('a gauge study', () => {
  it('does not change when the same is added to every reading', () => {
    fc.assert(
      fc.property(studies, fc.integer({ min: -50, max: 50 }), (study, shift) => {
        expectAlike(allSigmas(changed(study, (reading) => reading + shift)), allSigmas(study));
      }),
    );
  });

  it('scales with its readings', () => {
    fc.assert(
      fc.property(studies, fc.integer({ min: 1, max: 1000 }), (study, scale) => {
        const scaled = allSigmas(changed(study, (reading) => reading * scale));
        expectAlike(
          scaled,
          allSigmas(study).map((sigma) => sigma * scale),
          scale,
        );
      }),
    );
  });

  it('is the same in whatever order the persons, parts and trials stand', () => {
    fc.assert(
      fc.property(studies, (study) => {
        const turned = study.toReversed().map((rows) => rows.toReversed().map((cell) => cell.toReversed()));
        expectAlike(allSigmas(turned), allSigmas(study));
      }),
    );
  });

  it('splits the whole spread and no more', () => {
    fc.assert(
      fc.property(studies, (study) => {
        const { lines, analysis } = varianceWithInteraction(study, null);
        const sum = lines.filter(({ source }) => source !== 'total').map((line) => line.sumOfSquares);
        const total = lines.find(({ source }) => source === 'total')?.sumOfSquares ?? 0;
        expect(sum.reduce((before, one) => before + one, 0)).toBeCloseTo(total, 8);
        const shares = Object.fromEntries(analysis.shares.map(({ spread, ofVariance }) => [spread, ofVariance ?? 0]));
        if (total > 0) expect((shares['gauge'] ?? 0) + (shares['parts'] ?? 0)).toBeCloseTo(1, 12);
      }),
    );
  });

  it('of readings all alike has no spread, and says nothing rather than dividing by it', () => {
    const alike = [0.1, 0.1, 0.1].map(() => [0.1, 0.1].map(() => [0.1, 0.1]));
    const results = gaugeStudyResults(alike, 1);
    for (const { analysis } of [results.varianceWithInteraction, results.variancePooled, results.averageRange]) {
      expect(analysis.shares.every(({ sigma, ofVariation }) => sigma === 0 && ofVariation === null)).toBe(true);
      expect(analysis.categories).toBeNull();
      expect(studyVerdict(analysis).overall).toBeNull();
    }
    expect(results.varianceWithInteraction.lines.every(({ f, p }) => f === null && p === null)).toBe(true);
  });

  it('finds a perfect gauge to have no spread of its own', () => {
    const perfect = [1, 2, 3].map((part) => [part, part].map((reading) => [reading, reading]));
    const { analysis } = leadingTable(gaugeStudyResults(perfect, 2));
    expect(analysis.categories).toBeNull();
    expect(studyVerdict(analysis)).toEqual({
      ofVariation: 'acceptable',
      ofTolerance: 'acceptable',
      enoughCategories: true,
      overall: 'acceptable',
    });
  });

  it('keeps an interaction that chance does not explain', () => {
    // Person two reads odd parts high and even parts low; the trials agree.
    const crossed = [0, 1, 2, 3, 4, 5].map((part) => [
      [part, part + 0.01],
      [part + (part % 2 === 0 ? 1 : -1), part + (part % 2 === 0 ? 1.01 : -0.99)],
    ]);
    const results = gaugeStudyResults(crossed, null);
    expect(results.pooled).toBe(false);
    expect(leadingTable(results).analysis.shares.map(({ spread }) => spread)).toEqual(SPREADS);
    const interaction = leadingTable(results).analysis.shares.find(({ spread }) => spread === 'interaction');
    expect(interaction?.sigma).toBeGreaterThan(0.5);
  });

  it('takes six standard deviations of the tolerance', () => {
    const { shares } = averageAndRange(
      [
        [
          [0, 1],
          [0, 1],
        ],
        [
          [4, 5],
          [4, 5],
        ],
      ],
      12,
    ).analysis;
    const repeatability = shares.find(({ spread }) => spread === 'repeatability');
    expect(repeatability?.ofTolerance).toBeCloseTo((6 * 0.8862) / 12, 12);
  });

  it('needs two of everything and as many readings in every cell', () => {
    expect(() =>
      gaugeStudyResults(
        [
          [
            [1, 2],
            [1, 2],
          ],
        ],
        null,
      ),
    ).toThrow(StudyUneven);
    expect(() =>
      gaugeStudyResults(
        [
          [[1, 2], [1]],
          [
            [1, 2],
            [1, 2],
          ],
        ],
        null,
      ),
    ).toThrow(StudyUneven);
  });
});

describe('the verdict on a gauge', () => {
  it('is acceptable below a tenth, may be up to three tenths, and is not above', () => {
    expect([0, 0.0999, 0.1, 0.3, 0.3001].map(fitnessOf)).toEqual([
      'acceptable',
      'acceptable',
      'conditional',
      'conditional',
      'not-acceptable',
    ]);
  });

  it('goes by the worse share where there is a tolerance', () => {
    const shares = [
      { spread: 'gauge', sigma: 1, ofVariation: 0.05, ofVariance: 0.0025, ofTolerance: 0.5, setToZero: false },
    ] as const;
    expect(studyVerdict({ shares: [...shares], categories: 4 })).toEqual({
      ofVariation: 'acceptable',
      ofTolerance: 'not-acceptable',
      enoughCategories: false,
      overall: 'not-acceptable',
    });
  });
});

describe('a small study', () => {
  it('says what of it is rough', () => {
    expect(smallnessOf({ parts: 10, persons: 3 })).toEqual([]);
    expect(smallnessOf({ parts: 5, persons: 3 })).toEqual(['few-parts', 'few-cells']);
    expect(smallnessOf({ parts: 10, persons: 2 })).toEqual(['few-persons']);
  });
});

/** The mean square of the range of m standard normal values, by the trapezium rule. */
function meanSquareRange(values: number): number {
  const step = 0.02;
  const at = Array.from({ length: 801 }, (_, index) => -8 + index * step);
  const density = at.map((x) => Math.exp((-x * x) / 2) / Math.sqrt(2 * Math.PI));
  let below = 0;
  const cumulative = density.map(
    (height, index) => (below += index === 0 ? 0 : (step * (height + (density[index - 1] ?? 0))) / 2),
  );
  const atMost = (width: number) =>
    values *
    step *
    density.reduce((sum, height, index) => {
      const upper = cumulative[Math.min(index + width, 800)] ?? 1;
      return sum + height * Math.max(0, upper - (cumulative[index] ?? 0)) ** (values - 1);
    }, 0);
  const sum = at.reduce((before, _, width) => before + 2 * width * step * (1 - atMost(width)), 0);
  return sum * step + step ** 2 / 6;
}

describe('the factor of one range', () => {
  it.each([2, 5, 11, 17, 24, 30])('of %i values is one over the root of its mean square', (values) => {
    expect(oneRangeFactor(values)).toBeCloseTo(1 / Math.sqrt(meanSquareRange(values)), 3);
  });

  it('falls with the number of values and ends where no table does', () => {
    for (let values = 3; values <= 30; values += 1)
      expect(oneRangeFactor(values)).toBeLessThan(oneRangeFactor(values - 1));
    for (let values = 3; values <= 10; values += 1)
      expect(manyRangesFactor(values)).toBeLessThan(manyRangesFactor(values - 1));
    expect(() => oneRangeFactor(31)).toThrow(RangeFactorNotKnown);
    expect(() => manyRangesFactor(11)).toThrow(RangeFactorNotKnown);
  });
});
