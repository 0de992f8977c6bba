import { type SpreadAnalysis, type Spread, type VarianceSource } from '../statistics/gauge-study/gauge-study';
import { leadingTable, POOLING_CHANCE, type GaugeStudyResults } from '../statistics/gauge-study/leading-table';
import { FEW_CELLS, smallnessOf, USUAL_STUDY, type Smallness } from '../statistics/gauge-study/study-smallness';
import { gaugeShare, LEAST_CATEGORIES, studyVerdict, type GaugeFitness } from '../statistics/gauge-study/study-verdict';
import { chanceText, percentText } from './gauge-study-figures';

/** What a share of the spread is called, with the trade's letters. */
export const SPREAD_TITLES: Readonly<Record<Spread, string>> = {
  repeatability: 'Repeatability (EV)',
  persons: 'Between persons (AV)',
  interaction: 'Part with person (INT)',
  gauge: 'Gauge, all three (GRR)',
  parts: 'Between parts (PV)',
  total: 'Total (TV)',
};

/** The same where the method sees no interaction. */
export const GAUGE_WITHOUT_INTERACTION = 'Gauge, both (GRR)';

/** What a share is called in an analysis: the gauge has three shares or two. */
export function spreadTitle(spread: Spread, { shares }: SpreadAnalysis): string {
  const isSeen = shares.some((share) => share.spread === 'interaction');
  return spread === 'gauge' && !isSeen ? GAUGE_WITHOUT_INTERACTION : SPREAD_TITLES[spread];
}

/** What a line of the analysis of variance is called. */
export const SOURCE_TITLES: Readonly<Record<VarianceSource, string>> = {
  parts: 'Parts',
  persons: 'Persons',
  interaction: 'Part with person',
  repeatability: 'Repeatability',
  total: 'Total',
};

/** The verdict on a gauge in a word or two. */
export const FITNESS_TITLES: Readonly<Record<GaugeFitness, string>> = {
  acceptable: 'Acceptable',
  conditional: 'May be acceptable, depending on its use',
  'not-acceptable': 'Not acceptable',
};

const FITNESS_REASONS: Readonly<Record<GaugeFitness, string>> = {
  acceptable: 'under 10\u00a0%',
  conditional: 'from 10 to 30\u00a0%',
  'not-acceptable': 'over 30\u00a0%',
};

/** A criterion of the verdict: how it comes out, and the sentence that says why. */
export interface CriterionWords {
  criterion: 'variation' | 'tolerance' | 'categories';
  fitness: GaugeFitness;
  sentence: string;
}

function categoriesSentence(categories: number | null): string {
  if (categories === null) return 'The gauge has no spread of its own that would blur parts.';
  const apart = categories === 1 ? '1 category' : `${String(categories)} categories`;
  return `It tells ${apart} of parts apart; ${String(LEAST_CATEGORIES)} or more are asked for.`;
}

/** The verdict on an analysis, criterion by criterion; none where the readings do not differ at all. */
export function criteriaOf(analysis: SpreadAnalysis): CriterionWords[] {
  const { ofVariation, ofTolerance, enoughCategories } = studyVerdict(analysis);
  const gauge = gaugeShare(analysis);
  if (ofVariation === null || gauge === undefined) return [];
  const words: CriterionWords[] = [
    {
      criterion: 'variation',
      fitness: ofVariation,
      sentence: `The gauge takes ${percentText(gauge.ofVariation)} of the total variation: ${FITNESS_REASONS[ofVariation]}.`,
    },
  ];
  if (ofTolerance !== null)
    words.push({
      criterion: 'tolerance',
      fitness: ofTolerance,
      sentence: `Six standard deviations of it take ${percentText(gauge.ofTolerance)} of the tolerance: ${FITNESS_REASONS[ofTolerance]}.`,
    });
  const fitness = enoughCategories === true ? 'acceptable' : 'not-acceptable';
  words.push({ criterion: 'categories', fitness, sentence: categoriesSentence(analysis.categories) });
  return words;
}

/** Which analysis of variance the study goes by, and why. */
export function poolingSentence(results: GaugeStudyResults): string {
  const line = results.varianceWithInteraction.lines.find(({ source }) => source === 'interaction');
  const bound = String(POOLING_CHANCE);
  const p = line?.p ?? null;
  if (p === null)
    return 'The trials do not differ, so the interaction of part and person cannot be tested and is kept.';
  return results.pooled
    ? `The interaction of part and person is no larger than chance makes it (p\u00a0=\u00a0${chanceText(p)}, above ${bound}); it is pooled into the repeatability.`
    : `The interaction of part and person is kept (p\u00a0${p < 0.001 ? '' : '=\u00a0'}${chanceText(p)}, not above ${bound}).`;
}

/** Which variances came out negative, in a sentence; empty when none did. */
export function negativeSentence(analysis: SpreadAnalysis): string {
  const names = analysis.shares.filter((share) => share.setToZero).map(({ spread }) => SPREAD_TITLES[spread]);
  if (names.length === 0) return '';
  return `Estimated below zero and set to 0: ${names.join(', ')}.`;
}

const SMALL_WORDS: Readonly<Record<Smallness, string>> = {
  'few-parts': `Fewer than ${String(USUAL_STUDY.parts)} parts: their spread, and every share of the total variation, is a rough estimate.`,
  'few-persons': `Fewer than ${String(USUAL_STUDY.persons)} persons: the spread between them rests on one difference.`,
  'few-cells': `Not more than ${String(FEW_CELLS)} pairs of part and person: by average and range the repeatability comes out a little too large.`,
};

/** What is rough about a small study, sentence by sentence; none for a usual one. */
export function smallStudySentences(study: { parts: number; persons: number }): string[] {
  return smallnessOf(study).map((small) => SMALL_WORDS[small]);
}

/** The verdict on the whole study in a word or two. */
export function verdictTitle(results: GaugeStudyResults): string {
  const { overall } = studyVerdict(leadingTable(results).analysis);
  return overall === null ? 'No verdict: the readings do not differ' : FITNESS_TITLES[overall];
}

/** Where the bounds come from; stands under every verdict. */
export const VERDICT_SOURCE =
  'Bounds of 10 and 30\u00a0%, five categories, and pooling above p\u00a0=\u00a00.25 are conventions of the AIAG manual Measurement Systems Analysis, 4th edition; the worse share decides.';
