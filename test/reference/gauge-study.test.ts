import { averageAndRange } from '#shared/statistics/gauge-study/average-and-range';
import { type Spread, type SpreadAnalysis, type VarianceTable } from '#shared/statistics/gauge-study/gauge-study';
import { manyRangesFactor, oneRangeFactor } from '#shared/statistics/gauge-study/range-factors';
import { gaugeStudyResults } from '#shared/statistics/gauge-study/study-results';
import { studyMeans } from '#shared/statistics/gauge-study/study-means';
import { sumsOfSquares } from '#shared/statistics/gauge-study/sums-of-squares';
import { meanSquare } from '#shared/statistics/gauge-study/variance-line';
import { variancePooled, varianceWithInteraction } from '#shared/statistics/gauge-study/variance-table';
import { describe, expect, it } from 'vitest';
import reference from './data/d-grr.json' with { type: 'json' };

// D-1: AIAG Measurement Systems Analysis, 4th edition, chapter III section B. D-2: Montgomery, Design and Analysis of
// Experiments, Table 13.1. Sources and provenance in full in the data file. "Recomputed" there means by another program.

type Case = (typeof reference.cases)[number];

const [aiag, montgomery] = reference.cases as [Case, Case];

/** The stated values have ten significant digits. */
const digits = (value: number) => Number(value.toPrecision(10));

const LETTERS = [
  ['EV', 'repeatability'],
  ['AV', 'persons'],
  ['INT', 'interaction'],
  ['GRR', 'gauge'],
  ['PV', 'parts'],
  ['TV', 'total'],
] as const satisfies readonly (readonly [string, Spread])[];

function shareOf(analysis: SpreadAnalysis, spread: Spread) {
  return analysis.shares.find((share) => share.spread === spread);
}

/** Standard deviations and percentages by the trade's letters; a method that sees no interaction has none. */
function lettered(analysis: SpreadAnalysis): Record<string, number> {
  return Object.fromEntries(
    LETTERS.flatMap(([letters, spread]) => {
      const share = shareOf(analysis, spread);
      return [
        [letters, digits(share?.sigma ?? 0)],
        [`pct_${letters}`, digits(100 * (share?.ofVariation ?? 0))],
      ];
    }),
  );
}

/** Of the stated values those that name a spread or its percentage. */
function stated(values: Readonly<Record<string, unknown>>): Record<string, unknown> {
  const names = new Set(LETTERS.flatMap(([letters]) => [letters, `pct_${letters}`]));
  return Object.fromEntries(Object.entries(values).filter(([name]) => names.has(name)));
}

function lineOf(table: VarianceTable, source: string) {
  return table.lines.find((line) => line.source === source);
}

describe.each([
  ['D-1', aiag],
  ['D-2', montgomery],
])('%s, by average and range', (_id, { data, recomputed_average_range: answer }) => {
  const found = averageAndRange(data, null);

  it('has the mean ranges and the ranges of means', () => {
    expect(digits(found.meanRange)).toBe(answer.Rbarbar);
    expect(digits(found.rangeOfPersons)).toBe(answer.Xdiff);
    expect(digits(found.rangeOfParts)).toBe(answer.Rp);
  });

  it('has the mean of each person', () => {
    const { persons } = studyMeans(data);
    const first = data[0]?.[0]?.[0] ?? 0;
    persons.forEach((mean, person) => expect(mean + first).toBeCloseTo(answer.Xbar_each_appraiser[person] ?? 0, 9));
  });

  it('has every standard deviation, percentage and the categories', () => {
    expect(lettered(found.analysis)).toMatchObject(stated(answer));
    expect(found.analysis.categories).toBe(answer.ndc);
    expect(shareOf(found.analysis, 'persons')?.setToZero).toBe(answer.AV_squared_was_negative);
  });
});

describe.each([
  ['D-1', aiag],
  ['D-2', montgomery],
])('%s, by analysis of variance', (_id, { data, recomputed_anova: answer }) => {
  const squares = sumsOfSquares(data);
  const kept = varianceWithInteraction(data, null);
  const pooled = variancePooled(data, null);

  it.each([
    ['parts', answer.table.part],
    ['persons', answer.table.appraiser],
    ['interaction', answer.table.interaction],
    ['repeatability', answer.table.repeatability],
  ] as const)('has the line of %s', (source, line) => {
    expect(squares[source].degrees).toBe(line.df);
    expect(digits(squares[source].sum)).toBe(line.SS);
    expect(digits(meanSquare(squares[source]))).toBe(line.MS);
  });

  it('has the total', () => {
    expect(squares.total.degrees).toBe(answer.table.total.df);
    expect(digits(squares.total.sum)).toBe(answer.table.total.SS);
  });

  it('tests the interaction against the repeatability', () => {
    const line = lineOf(kept, 'interaction');
    expect(line?.against).toBe('repeatability');
    expect(digits(line?.f ?? 0)).toBe(answer.table.interaction.F);
    expect(digits(line?.p ?? 0)).toBe(answer.table.interaction.p);
  });

  it('tests parts and persons against the interaction that is kept', () => {
    expect(lineOf(kept, 'parts')?.against).toBe('interaction');
    expect(digits(lineOf(kept, 'parts')?.f ?? 0)).toBe(answer.table.F_part_over_interaction);
    expect(digits(lineOf(kept, 'persons')?.f ?? 0)).toBe(answer.table.F_appraiser_over_interaction);
  });

  it('has the mean squares from which tables that divide by the repeatability print F', () => {
    const repeatability = meanSquare(squares.repeatability);
    expect(digits(meanSquare(squares.parts) / repeatability)).toBe(answer.table.F_part_over_error);
    expect(digits(meanSquare(squares.persons) / repeatability)).toBe(answer.table.F_appraiser_over_error);
  });

  it.each([
    ['with interaction', kept, answer.with_interaction],
    ['pooled', pooled, answer.pooled_no_interaction],
  ] as const)('has every share of the spread %s', (_how, { analysis }, shares) => {
    expect(lettered(analysis)).toMatchObject(stated(shares));
    expect(analysis.categories).toBe(shares.ndc);
    expect(digits((shareOf(analysis, 'repeatability')?.sigma ?? 0) ** 2)).toBe(shares.var_repeatability);
    expect(digits((shareOf(analysis, 'persons')?.sigma ?? 0) ** 2)).toBe(shares.var_appraiser);
    expect(digits((shareOf(analysis, 'parts')?.sigma ?? 0) ** 2)).toBe(shares.var_part);
    expect(digits(100 * (shareOf(analysis, 'gauge')?.ofVariance ?? 0))).toBe(shares.pct_contribution_GRR);
  });

  it('pools into the repeatability, and tests against that', () => {
    const line = lineOf(pooled, 'repeatability');
    expect(line?.degreesOfFreedom).toBe(answer.pooled_no_interaction.df_pooled);
    expect(digits(line?.meanSquare ?? 0)).toBe(answer.pooled_no_interaction.MS_pooled);
    expect(lineOf(pooled, 'parts')?.against).toBe('repeatability');
  });

  it('says that the negative variance of the interaction was set to 0, and goes by the pooled table', () => {
    expect(shareOf(kept.analysis, 'interaction')).toMatchObject({ sigma: 0, setToZero: true });
    expect(gaugeStudyResults(data, null).pooled).toBe(!answer.interaction_significant_at_0_25);
  });
});

describe('what AIAG prints of D-1', () => {
  const published = aiag.published_anova;

  // Printed as 0.302373; from the printed EV and AV themselves it is 0.302372, which is what is found here.
  it('agrees by analysis of variance in every printed digit, GRR but for the last', () => {
    const { analysis } = variancePooled(aiag.data, null);
    const sigma = (spread: Spread) => Number(shareOf(analysis, spread)?.sigma.toFixed(6));
    const percent = (spread: Spread) => Number((100 * (shareOf(analysis, spread)?.ofVariation ?? 0)).toFixed(1));
    expect(published?.pooled.GRR).toBe(0.302373);
    expect(sigma('gauge')).toBe(0.302372);
    expect({ ...published?.pooled, GRR: sigma('gauge') }).toEqual({
      EV: sigma('repeatability'),
      AV: sigma('persons'),
      INT: 0,
      GRR: sigma('gauge'),
      PV: sigma('parts'),
      TV: Number(shareOf(analysis, 'total')?.sigma.toFixed(3)),
      pct_EV: percent('repeatability'),
      pct_AV: percent('persons'),
      pct_INT: 0,
      pct_GRR: percent('gauge'),
      pct_PV: percent('parts'),
      ndc: analysis.categories,
    });
  });

  it('agrees in the sums of squares and in F, which AIAG divides by the repeatability', () => {
    const squares = sumsOfSquares(aiag.data);
    const repeatability = meanSquare(squares.repeatability);
    expect(squares.parts.sum).toBeCloseTo(published?.part.SS ?? 0, 4);
    expect(squares.persons.sum).toBeCloseTo(published?.appraiser.SS ?? 0, 4);
    expect(squares.interaction.sum).toBeCloseTo(published?.interaction.SS ?? 0, 4);
    expect(squares.repeatability.sum).toBeCloseTo(published?.equipment.SS ?? 0, 4);
    expect(squares.total.sum).toBeCloseTo(published?.total.SS ?? 0, 4);
    expect(meanSquare(squares.parts) / repeatability).toBeCloseTo(published?.part.F ?? 0, 2);
    expect(meanSquare(squares.persons) / repeatability).toBeCloseTo(published?.appraiser.F ?? 0, 2);
    expect(meanSquare(squares.interaction) / repeatability).toBeCloseTo(published?.interaction.F ?? 0, 3);
  });

  it('agrees by average and range as far as its rounded steps allow', () => {
    // The manual goes on with R̄ = 0.3417, X̄diff = 0.4446 and Rp = 3.511, each rounded.
    const { analysis, ...ranges } = averageAndRange(aiag.data, null);
    const printed = aiag.published_average_range;
    expect(ranges.meanRange).toBeCloseTo(printed?.Rbarbar ?? 0, 4);
    expect(ranges.rangeOfPersons).toBeCloseTo(printed?.Xdiff ?? 0, 3);
    expect(ranges.rangeOfParts).toBeCloseTo(printed?.Rp ?? 0, 3);
    const values = lettered(analysis);
    for (const letters of ['EV', 'AV', 'GRR', 'PV', 'TV'] as const) {
      expect(Math.abs((values[letters] ?? 0) - (printed?.[letters] ?? 0))).toBeLessThan(1e-4);
    }
    for (const letters of ['pct_EV', 'pct_AV', 'pct_GRR', 'pct_PV'] as const) {
      expect(values[letters]).toBeCloseTo(printed?.[letters] ?? 0, 1);
    }
    expect(analysis.categories).toBe(printed?.ndc);
  });
});

describe('what Montgomery prints of D-2', () => {
  const published = montgomery.published;

  it('agrees in every sum of squares', () => {
    const squares = sumsOfSquares(montgomery.data);
    expect(squares.parts.sum).toBeCloseTo(published?.SS.part ?? 0, 3);
    expect(squares.persons.sum).toBeCloseTo(published?.SS.operator ?? 0, 3);
    expect(squares.interaction.sum).toBeCloseTo(published?.SS.interaction ?? 0, 3);
    expect(squares.repeatability.sum).toBeCloseTo(published?.SS.error ?? 0, 3);
    expect(squares.total.sum).toBeCloseTo(published?.SS.total ?? 0, 3);
  });

  it('agrees in the variance components, the negative one of which is set to 0 here', () => {
    const { analysis } = varianceWithInteraction(montgomery.data, null);
    const variance = (spread: Spread) => (shareOf(analysis, spread)?.sigma ?? 0) ** 2;
    expect(variance('parts')).toBeCloseTo(published?.var_components.part ?? 0, 4);
    expect(variance('persons')).toBeCloseTo(published?.var_components.operator ?? 0, 4);
    expect(variance('repeatability')).toBeCloseTo(published?.var_components.error ?? 0, 4);
    expect(published?.var_components.interaction).toBeLessThan(0);
    expect(variance('interaction')).toBe(0);
  });
});

describe('the factors of ranges', () => {
  it('are those of the printed form', () => {
    for (const [trials, factor] of Object.entries(reference.constants.K1))
      expect(manyRangesFactor(Number(trials))).toBe(factor);
    for (const [persons, factor] of Object.entries(reference.constants.K2))
      expect(oneRangeFactor(Number(persons))).toBe(factor);
    for (const [parts, factor] of Object.entries(reference.constants.K3))
      expect(oneRangeFactor(Number(parts))).toBe(factor);
  });

  it('follow the computed factor for twenty parts', () => {
    expect(oneRangeFactor(20)).toBe(montgomery.recomputed_average_range.K3);
  });
});
