import { type Db } from '#db/open-database';
import { preparedOnce } from '#db/prepared-once';
import { sampleUnits } from '#db/schema/lots';
import { readings } from '#db/schema/readings';
import { characteristicsOf, groupsOf } from '#server/lots/lot-sampling-queries';
import { type LotRow } from '#server/lots/lot-rows';
import { type Characteristic } from '#shared/contract/plans';
import { judgedCharacteristic } from '#shared/plan/judged-characteristic';
import { countingReading } from '#shared/verdict/counting-reading';
import { judgingRules, type JudgingRules } from '#shared/verdict/judging-rules';
import { type UnitReadings } from '#shared/verdict/sample-verdict';
import { and, asc, eq, sql } from 'drizzle-orm';

export type ReadingRow = typeof readings.$inferSelect;

/** What judges a drawn lot: its characteristics with their row ids, and the rules made of them and of its groups. */
export interface LotRules {
  characteristics: { id: number; content: Characteristic }[];
  keyOf: ReadonlyMap<number, string>;
  rules: JudgingRules;
}

/** @throws {Error} for a lot that is not drawn */
export function rulesOf(db: Db, lot: LotRow): LotRules {
  if (lot.revisionId === null) throw new Error(`Lot ${lot.number} is not drawn.`);
  const characteristics = characteristicsOf(db, lot.revisionId);
  return {
    characteristics,
    keyOf: new Map(characteristics.map(({ id, content }) => [id, content.key])),
    rules: judgingRules(
      characteristics.map(({ content }) => judgedCharacteristic(content)),
      groupsOf(db, lot.id),
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

/** What the verdicts need of a unit. */
export function judgedReadings({ unit, readings: rows }: UnitRows, keyOf: ReadonlyMap<number, string>): UnitReadings {
  const values = new Map<string, number | boolean>();
  for (const [id, row] of countingReadings(rows)) {
    const key = keyOf.get(id);
    const value = row.value ?? row.pass;
    if (key !== undefined && value !== null) values.set(key, value);
  }
  return { unit: unit.unit, values, setAside: unit.setAsideReason };
}
