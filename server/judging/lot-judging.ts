import { type Db } from '#db/open-database';
import { preparedOnce } from '#db/prepared-once';
import { sampleUnits } from '#db/schema/lots';
import { planRevisions } from '#db/schema/plans';
import { readings } from '#db/schema/readings';
import { characteristicsOf, groupsOf } from '#server/lots/lot-sampling-queries';
import { type LotRow } from '#server/lots/lot-rows';
import { type Characteristic, type Revision } from '#shared/contract/plans';
import { judgedCharacteristic } from '#shared/plan/judged-characteristic';
import { type Component } from '#shared/uncertainty/component';
import { countingReading } from '#shared/verdict/counting-reading';
import { judgingRules, type JudgingRules } from '#shared/verdict/judging-rules';
import { type UnitReadings } from '#shared/verdict/sample-verdict';
import { and, asc, eq, sql } from 'drizzle-orm';
import { readingComponents } from './reading-components';

export type ReadingRow = typeof readings.$inferSelect;

export type RevisionRules = Pick<Revision, 'decisionRule' | 'coverageFactor' | 'warmUpMinutes'>;

/** What judges a drawn lot: its characteristics with their row ids, and the rules made of them and of its groups. */
export interface LotRules {
  characteristics: { id: number; content: Characteristic }[];
  keyOf: ReadonlyMap<number, string>;
  rules: JudgingRules;
  /** How the plan lets measurement uncertainty enter, and the warm-up it asks for. */
  revision: RevisionRules;
}

function revisionRules(db: Db, revisionId: number): RevisionRules {
  const found = db
    .select({
      decisionRule: planRevisions.decisionRule,
      coverageFactor: planRevisions.coverageFactor,
      warmUpMinutes: planRevisions.warmUpMinutes,
    })
    .from(planRevisions)
    .where(eq(planRevisions.id, revisionId))
    .get();
  if (!found) throw new Error(`There is no plan revision ${revisionId}.`);
  return found;
}

/** @throws {Error} for a lot that is not drawn */
export function rulesOf(db: Db, lot: LotRow): LotRules {
  if (lot.revisionId === null) throw new Error(`Lot ${lot.number} is not drawn.`);
  const characteristics = characteristicsOf(db, lot.revisionId);
  const revision = revisionRules(db, lot.revisionId);
  return {
    revision,
    characteristics,
    keyOf: new Map(characteristics.map(({ id, content }) => [id, content.key])),
    rules: judgingRules(
      characteristics.map(({ content }) => judgedCharacteristic(content)),
      groupsOf(db, lot.id),
      { rule: revision.decisionRule, coverageFactor: revision.coverageFactor },
    ),
  };
}

/** A unit's row with its readings in the order they were taken. */
export interface UnitRows {
  unit: typeof sampleUnits.$inferSelect;
  readings: ReadingRow[];
}

const unitsOfLot = preparedOnce((db) =>
  db
    .select()
    .from(sampleUnits)
    .where(eq(sampleUnits.lotId, sql.placeholder('lotId')))
    .orderBy(asc(sampleUnits.unit))
    .prepare(),
);

const unitOfLot = preparedOnce((db) =>
  db
    .select()
    .from(sampleUnits)
    .where(and(eq(sampleUnits.lotId, sql.placeholder('lotId')), eq(sampleUnits.unit, sql.placeholder('unit'))))
    .prepare(),
);

/** Readings are asked for by lot, whose index leads on to the unit; a join by unit would search the readings of years. */
const readingsOfLot = preparedOnce((db) =>
  db
    .select()
    .from(readings)
    .where(eq(readings.lotId, sql.placeholder('lotId')))
    .orderBy(asc(readings.attempt), asc(readings.receivedAt))
    .prepare(),
);

const readingsOfUnit = preparedOnce((db) =>
  db
    .select()
    .from(readings)
    .where(and(eq(readings.lotId, sql.placeholder('lotId')), eq(readings.unitId, sql.placeholder('unitId'))))
    .orderBy(asc(readings.attempt), asc(readings.receivedAt))
    .prepare(),
);

/** All units of a lot with their readings, in draw order. */
export function unitsOf(db: Db, lotId: number): UnitRows[] {
  const units = unitsOfLot(db).all({ lotId });
  const rows = new Map(units.map((unit) => [unit.id, { unit, readings: [] as ReadingRow[] }]));
  for (const reading of readingsOfLot(db).all({ lotId })) rows.get(reading.unitId)?.readings.push(reading);
  return [...rows.values()];
}

/** One unit of a lot with its readings; undefined when the lot has no such unit. */
export function unitOf(db: Db, lotId: number, unit: number): UnitRows | undefined {
  const found = unitOfLot(db).get({ lotId, unit });
  return found && { unit: found, readings: readingsOfUnit(db).all({ lotId, unitId: found.id }) };
}

/** The reading that counts for each characteristic of a unit, by characteristic id. */
export function countingReadings(rows: readonly ReadingRow[]): Map<number, ReadingRow> {
  const counting = new Map<number, ReadingRow>();
  for (const id of new Set(rows.map((row) => row.characteristicId))) {
    const attempts = rows.filter((row) => row.characteristicId === id);
    const counts = countingReading(attempts.map((row) => ({ row, withdrawn: row.withdrawnAt !== null })));
    if (counts) counting.set(id, counts.row);
  }
  return counting;
}

/** Budgets of the counting readings by characteristic key; the verdicts ask for them only under a rule with guard bands. */
function componentsOf(db: Db, counting: Map<number, ReadingRow>, lot: LotRules): UnitReadings['components'] {
  if (lot.revision.decisionRule === 'simple') return undefined;
  const components = new Map<string, readonly Component[]>();
  for (const [id, row] of counting) {
    const content = lot.characteristics.find((one) => one.id === id)?.content;
    const budget = content && readingComponents(db, row, content);
    if (content && budget) components.set(content.key, budget);
  }
  return components;
}

/** What the verdicts need of a unit. */
export function judgedReadings(db: Db, { unit, readings: rows }: UnitRows, lot: LotRules): UnitReadings {
  const values = new Map<string, number | boolean>();
  const counting = countingReadings(rows);
  for (const [id, row] of counting) {
    const key = lot.keyOf.get(id);
    const value = row.value ?? row.pass;
    if (key !== undefined && value !== null) values.set(key, value);
  }
  const components = componentsOf(db, counting, lot);
  return { unit: unit.unit, values, setAside: unit.setAsideReason, ruling: unit.ruling, components };
}
