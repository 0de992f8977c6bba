import { type Db } from '#db/open-database';
import { type Assessment } from '#shared/contract/decision';
import { type ComputedCharacteristic } from '#shared/plan/plan-content';
import { judgedCharacteristic } from '#shared/plan/judged-characteristic';
import { combinedStandardUncertainty } from '#shared/uncertainty/combine';
import { type Component } from '#shared/uncertainty/component';
import { computedUncertainty } from '#shared/verdict/computed-uncertainty';
import { characteristicResults } from './characteristic-results';
import { countingReadings, type LotRules, type ReadingRow } from './lot-judging';
import { readingComponents } from './reading-components';
import { type JudgedLot } from './sample-judging';

type Counting = ReadonlyMap<number, ReadingRow>;

/** The largest of uncertainties of which each is known; null where one is not, or there is none. */
function largest(values: readonly (number | null)[]): number | null {
  const known = values.filter((value) => value !== null);
  return known.length === 0 || known.length < values.length ? null : Math.max(...known);
}

/** U of what is computed on one unit; undefined where a reading is missing, null where its uncertainty is not known. */
function ofComputed(
  db: Db,
  { characteristics, keyOf, revision }: LotRules,
  content: ComputedCharacteristic,
  counting: Counting,
): number | null | undefined {
  const wanted = new Set(Object.values(content.formula.inputs));
  const values = new Map<string, number>();
  const budgets = new Map<string, readonly Component[]>();
  for (const [id, row] of counting) {
    const key = keyOf.get(id) ?? '';
    const source = characteristics.find((one) => one.id === id);
    if (!wanted.has(key) || !source || row.value === null) continue;
    values.set(key, row.value);
    const own = readingComponents(db, row, source.content);
    if (own) budgets.set(key, own);
  }
  if (values.size < wanted.size) return undefined;
  if (budgets.size < wanted.size) return null;
  try {
    const propagated = computedUncertainty(judgedCharacteristic(content), values, budgets);
    return propagated ? revision.coverageFactor * combinedStandardUncertainty(propagated.components) : null;
  } catch (error) {
    // Readings for which the formula has no value have no uncertainty either.
    if (error instanceof RangeError) return undefined;
    throw error;
  }
}

/**
 * The largest U of the counting readings of a characteristic, in SI base units: what a summary of the sample may state for all
 * of them. Null where that of one reading is not known.
 */
function largestUncertainty(
  db: Db,
  { rules, units }: JudgedLot,
  { id, content }: LotRules['characteristics'][number],
): number | null {
  if (content.kind === 'attribute') return null;
  const counting = units.map(({ readings }) => countingReadings(readings));
  const found = counting.map((rows) => {
    if (content.kind === 'computed') return ofComputed(db, rules, content, rows);
    return rows.get(id)?.expandedUncertainty;
  });
  return largest(found.filter((value) => value !== undefined));
}

/** What the sample showed of each characteristic, with the largest U of its readings. */
export function uncertainResults(db: Db, judged: JudgedLot): Assessment['characteristics'] {
  const uncertainties = judged.rules.characteristics.map((one) => largestUncertainty(db, judged, one));
  return characteristicResults(judged).map((result, index) => ({
    ...result,
    expandedUncertainty: uncertainties[index] ?? null,
  }));
}
