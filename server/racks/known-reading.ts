import { type Db } from '#db/open-database';
import { preparedOnce } from '#db/prepared-once';
import { sampleUnits } from '#db/schema/lots';
import { instruments } from '#db/schema/instruments';
import { readings } from '#db/schema/readings';
import { takenAt } from '#server/bench/taken-at';
import { findRange } from '#server/instruments/instrument-ranges';
import { type LotRules } from '#server/judging/lot-judging';
import { type LotRow } from '#server/lots/lot-rows';
import { type RackReading } from '#shared/contract/racks';
import { eq, sql } from 'drizzle-orm';

const keptReading = preparedOnce((db) =>
  db
    .select({ row: readings, unit: sampleUnits.unit, instrument: instruments.assetNumber })
    .from(readings)
    .innerJoin(sampleUnits, eq(sampleUnits.id, readings.unitId))
    .leftJoin(instruments, eq(instruments.id, readings.instrumentId))
    .where(eq(readings.id, sql.placeholder('id')))
    .prepare(),
);

/** Whether a reading was sent before: not, with the same content, or with another one. */
export function knownReading(
  db: Db,
  lot: LotRow,
  rules: LotRules,
  id: string,
  sent: RackReading,
): 'new' | 'same' | 'other' {
  const kept = keptReading(db).get({ id });
  if (!kept) return 'new';
  const { row, unit, instrument } = kept;
  const isSame =
    unit === sent.unit &&
    rules.keyOf.get(row.characteristicId) === sent.characteristicKey &&
    row.value === (sent.value ?? null) &&
    row.pass === (sent.pass ?? null) &&
    instrument === sent.instrument &&
    row.takenAt === takenAt(sent.takenAt, lot.drawnAt, new Date(row.receivedAt)) &&
    (sent.rangeName === undefined || (row.rangeId !== null && findRange(db, row.rangeId)?.name === sent.rangeName));
  return isSame ? 'same' : 'other';
}
