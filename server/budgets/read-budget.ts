import { type Db } from '#db/open-database';
import { expectedOf } from '#server/bench/expected-of';
import { namesOf } from '#server/bench/bench-names';
import { countingReadings, rulesOf, unitOf, type LotRules, type UnitRows } from '#server/judging/lot-judging';
import { readingComponents } from '#server/judging/reading-components';
import { findLot } from '#server/lots/lot-rows';
import { Conflict, NotFound } from '#server/problems';
import { type Budget } from '#shared/contract/budgets';
import { expectedNominal } from '#shared/plan/expected-band';
import { judgedCharacteristic } from '#shared/plan/judged-characteristic';
import { type ComputedCharacteristic, type LimitedCharacteristic } from '#shared/plan/plan-content';
import { type Component, unweighted, type WeightedComponent } from '#shared/uncertainty/component';
import { computedUncertainty } from '#shared/verdict/computed-uncertainty';
import { computedValue } from '#shared/verdict/computed-value';
import { budgetReading, type BudgetSource } from './budget-readings';
import { budgetResult } from './budget-result';

/** Which budget is asked for; the reading that counts unless another one is named. */
export interface AskedBudget {
  lotId: number;
  unit: number;
  key: string;
  readingId: string | undefined;
}

/** What a budget is made of: the value, its components, and the readings behind it. */
interface Found {
  value: number | null;
  components: readonly WeightedComponent[] | undefined;
  sources: BudgetSource[];
  unknown: string;
}

const NO_RANGE =
  'The instrument has no range with an accuracy specification for this reading, so its uncertainty is not known.';

function limitedOf({ characteristics }: LotRules, key: string): LimitedCharacteristic {
  const content = characteristics.find((one) => one.content.key === key)?.content;
  if (!content) throw new NotFound('This characteristic');
  if (content.kind === 'attribute')
    throw new Conflict('no-uncertainty', `${content.name} is judged by eye and has no uncertainty.`);
  return content;
}

/** The reading that is named, or the one that counts. @throws {NotFound} */
function rowOf(rules: LotRules, rows: UnitRows, key: string, readingId: string | undefined) {
  const id = rules.characteristics.find((one) => one.content.key === key)?.id ?? 0;
  const row =
    readingId === undefined
      ? countingReadings(rows.readings).get(id)
      : rows.readings.find((one) => one.id === readingId && one.characteristicId === id);
  if (!row || row.value === null) throw new NotFound('This reading');
  return { row, value: row.value };
}

function ofReading(db: Db, rules: LotRules, rows: UnitRows, { key, readingId }: AskedBudget): Found {
  const characteristic = limitedOf(rules, key);
  const { row, value } = rowOf(rules, rows, key, readingId);
  const own = readingComponents(db, row, characteristic);
  return {
    value,
    components: own && unweighted(own),
    sources: [{ input: null, row, value, characteristic }],
    unknown: own ? '' : NO_RANGE,
  };
}

function ofComputed(db: Db, rules: LotRules, rows: UnitRows, computed: ComputedCharacteristic): Found {
  const counting = countingReadings(rows.readings);
  const values = new Map<string, number>();
  const budgets = new Map<string, readonly Component[]>();
  const sources: BudgetSource[] = [];
  for (const [input, source] of Object.entries(computed.formula.inputs)) {
    const found = rules.characteristics.find(({ content }) => content.key === source);
    const row = found && counting.get(found.id);
    if (!row || row.value === null) continue;
    sources.push({ input, row, value: row.value, characteristic: found.content });
    values.set(source, row.value);
    const own = readingComponents(db, row, found.content);
    if (own) budgets.set(source, own);
  }
  const judged = judgedCharacteristic(computed);
  const result = computedValue(judged, values);
  if (result.state !== 'value') {
    const unknown =
      result.state === 'missing'
        ? 'A reading that it is computed from is missing.'
        : 'The formula has no value for these readings.';
    return { value: null, components: undefined, sources, unknown };
  }
  const propagated = computedUncertainty(judged, values, budgets);
  return { value: result.value, components: propagated?.components, sources, unknown: propagated ? '' : NO_RANGE };
}

/**
 * The uncertainty budget of a reading of a lot, or of what is computed from its unit's readings, line by line.
 *
 * @throws {NotFound} for a lot, unit, characteristic or reading that is not there
 * @throws {Conflict} before the draw, and for a characteristic that is judged by eye
 */
export function readBudget(db: Db, asked: AskedBudget): Budget {
  const { lot, part } = findLot(db, asked.lotId);
  if (lot.revisionId === null) throw new Conflict('not-drawn', `The sample of lot ${lot.number} is not drawn yet.`);
  const rules = rulesOf(db, lot);
  const rows = unitOf(db, lot.id, asked.unit);
  if (!rows) throw new NotFound('This unit');
  const characteristic = limitedOf(rules, asked.key);
  const { value, components, sources, unknown } =
    characteristic.kind === 'computed'
      ? ofComputed(db, rules, rows, characteristic)
      : ofReading(db, rules, rows, asked);
  const names = namesOf(db);
  return {
    lot: { id: lot.id, number: lot.number, part: part.number },
    unit: asked.unit,
    characteristic,
    decisionRule: rules.revision.decisionRule,
    coverageFactor: rules.revision.coverageFactor,
    value,
    readings: sources.map((source) => budgetReading(db, names, source)),
    result:
      value === null || components === undefined
        ? null
        : budgetResult(value, components, characteristic, {
            revision: rules.revision,
            nominal: expectedNominal(characteristic, expectedOf(db, lot.partId)),
          }),
    unknown,
  };
}
