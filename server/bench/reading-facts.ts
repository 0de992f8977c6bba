import { type Db } from '#db/open-database';
import { Refused } from '#server/problems';
import { type PlausibilityAnswer, type PlausibilityQuestion, type ReadingEntry } from '#shared/contract/bench';
import { type ExpectedBands } from '#shared/contract/parts';
import { type Characteristic } from '#shared/contract/plans';
import { plausibility, plausibilitySentence } from '#shared/measurement/plausibility';
import { expectedBand } from '#shared/plan/expected-band';
import { expandedUncertainty } from '#shared/uncertainty/expanded-uncertainty';
import { readingBudget } from '#shared/uncertainty/reading-budget';
import { type RevisionRules } from '#server/judging/lot-judging';
import { rangeOfReading, rangesOf } from './range-of-reading';

type Measured = Extract<Characteristic, { kind: 'measured' }>;

/** A measured value with how it was read. SI base units. */
export interface MeasuredValue {
  value: number;
  entry: ReadingEntry | null;
  instrumentId: number | null;
  rangeId: number | null;
}

/** What is kept of a reading beside its value. */
export interface ReadingFacts {
  rangeId: number | null;
  expandedUncertainty: number | null;
}

/** A plan with guard bands judges by the uncertainty; a reading without one could only be guessed at. */
function holdUncertainty(rules: RevisionRules, instrumentId: number | null): void {
  if (rules.decisionRule === 'simple') return;
  const message =
    instrumentId === null
      ? 'This plan judges with guard bands: name the instrument, whose uncertainty counts.'
      : 'This plan judges with guard bands, and the instrument has no range with an accuracy for this. Quality adds one.';
  throw new Refused('uncertainty-unknown', message, [{ path: ['instrumentId'], message }]);
}

/**
 * The range a reading was taken on and its expanded uncertainty.
 *
 * @throws {Refused} for a range that cannot have shown it, or an unknown uncertainty under a rule with guard bands
 */
export function readingFacts(
  db: Db,
  rules: RevisionRules,
  characteristic: Measured,
  given: MeasuredValue,
): ReadingFacts {
  const { value, entry, instrumentId, rangeId } = given;
  const ranges = instrumentId === null ? [] : rangesOf(db, instrumentId);
  const range = rangeOfReading(ranges, rangeId, { value, entry, unit: characteristic.unit });
  if (!range) {
    holdUncertainty(rules, instrumentId);
    return { rangeId: null, expandedUncertainty: null };
  }
  const budget = readingBudget(value, entry, range, characteristic.alternatePeaks);
  return { rangeId: range.id, expandedUncertainty: expandedUncertainty(budget, rules.coverageFactor) };
}

/** The plausibility question a value raises, not yet answered; undefined where it raises none. */
export function questionOf(
  characteristic: Characteristic,
  expected: ExpectedBands | null,
  { value, entry }: Pick<MeasuredValue, 'value' | 'entry'>,
): PlausibilityQuestion | undefined {
  const band = expectedBand(characteristic, expected);
  if (band === null || characteristic.kind !== 'measured') return undefined;
  const scope = entry?.kind === 'scope' ? entry.scope : null;
  const found = plausibility(value, band, { scope });
  if (found.state !== 'question') return undefined;
  const sentence = plausibilitySentence(value, band, found, characteristic.unit);
  return { band, sentence, given: { answer: 'open' }, answeredBy: null, answeredAt: null };
}

/**
 * The question with the answer that came with the reading. A value far from what the part can give is neither taken in
 * silently nor blocked: without an answer it is refused with the question, with one it is kept and so is the answer.
 *
 * @param wasTyped what a corrected entry was worth, in SI base units
 * @throws {Refused} 422 reading-implausible, with the question as its sentence
 */
export function answeredQuestion(
  question: PlausibilityQuestion | undefined,
  answer: PlausibilityAnswer | null,
  by: { name: string; at: Date },
  ofCorrected: () => PlausibilityQuestion | undefined,
): PlausibilityQuestion | null {
  const answered = { answeredBy: by.name, answeredAt: by.at.toISOString() };
  if (question) {
    if (answer?.answer === 'confirmed') return { ...question, given: answer, ...answered };
    throw new Refused('reading-implausible', question.sentence, [{ path: ['question'], message: question.sentence }]);
  }
  const before = answer?.answer === 'corrected' ? ofCorrected() : undefined;
  return before && answer ? { ...before, given: answer, ...answered } : null;
}
