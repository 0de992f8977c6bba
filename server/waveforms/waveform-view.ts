import { type Db } from '#db/open-database';
import { lots, sampleUnits } from '#db/schema/lots';
import { parts } from '#db/schema/parts';
import { people } from '#db/schema/people';
import { planCharacteristics } from '#db/schema/plans';
import { racks } from '#db/schema/racks';
import { readings } from '#db/schema/readings';
import { storedFiles } from '#db/schema/stored-files';
import { waveforms } from '#db/schema/waveforms';
import { NotFound } from '#server/problems';
import { type Waveform, type WaveformHead } from '#shared/contract/waveforms';
import { and, asc, eq, isNotNull, isNull, sql } from 'drizzle-orm';
import { alias } from 'drizzle-orm/sqlite-core';

const withdrawers = alias(people, 'withdrawers');

/** What a list shows of a waveform; its record, which is large, stays where it is. */
const headColumns = {
  id: waveforms.id,
  lotId: waveforms.lotId,
  unit: sampleUnits.unit,
  characteristicKey: planCharacteristics.key,
  fileName: storedFiles.fileName,
  bytes: storedFiles.bytes,
  sha256: storedFiles.sha256,
  samples: sql<number>`json_extract(${waveforms.record}, '$.samples')`,
  values: sql<string>`json_remove(json_extract(${waveforms.record}, '$.analysis'), '$.peaks', '$.harmonics')`,
  findings: sql<string>`json_extract(${waveforms.record}, '$.findings')`,
  uploadedAt: waveforms.uploadedAt,
  uploadedBy: people.name,
  rack: racks.name,
  withdrawnAt: waveforms.withdrawnAt,
  withdrawnBy: withdrawers.name,
  withdrawReason: waveforms.withdrawReason,
};

function heads(db: Db) {
  return db
    .select(headColumns)
    .from(waveforms)
    .innerJoin(sampleUnits, eq(sampleUnits.id, waveforms.unitId))
    .innerJoin(storedFiles, eq(storedFiles.id, waveforms.fileId))
    .leftJoin(planCharacteristics, eq(planCharacteristics.id, waveforms.characteristicId))
    .leftJoin(people, eq(people.id, waveforms.uploadedById))
    .leftJoin(racks, eq(racks.id, waveforms.rackId))
    .leftJoin(withdrawers, eq(withdrawers.id, waveforms.withdrawnById));
}

type HeadRow = NonNullable<ReturnType<ReturnType<typeof heads>['get']>>;

function headView(row: HeadRow, readingIds: string[]): WaveformHead {
  const { withdrawnAt, withdrawnBy, withdrawReason, findings, values, ...head } = row;
  const withdrawn =
    withdrawnAt === null ? null : { by: withdrawnBy ?? '', at: withdrawnAt, reason: withdrawReason ?? '' };
  return {
    ...head,
    values: JSON.parse(values) as WaveformHead['values'],
    findings: JSON.parse(findings) as WaveformHead['findings'],
    withdrawn,
    readingIds,
  };
}

/** Readings that stand and were taken from waveforms, by waveform. */
function readingsByWaveform(db: Db, lotId: number): Map<string, string[]> {
  const rows = db
    .select({ id: readings.id, waveformId: readings.waveformId })
    .from(readings)
    .where(and(eq(readings.lotId, lotId), isNotNull(readings.waveformId), isNull(readings.withdrawnAt)))
    .all();
  const found = new Map<string, string[]>();
  for (const { id, waveformId } of rows)
    if (waveformId !== null) found.set(waveformId, [...(found.get(waveformId) ?? []), id]);
  return found;
}

/** The waveforms of a lot, in the order of its units and as they came; withdrawn ones too. @throws {NotFound} */
export function listWaveforms(db: Db, lotId: number): WaveformHead[] {
  if (!db.select({ id: lots.id }).from(lots).where(eq(lots.id, lotId)).get()) throw new NotFound('This lot');
  const taken = readingsByWaveform(db, lotId);
  return heads(db)
    .where(eq(waveforms.lotId, lotId))
    .orderBy(asc(sampleUnits.unit), asc(waveforms.uploadedAt))
    .all()
    .map((row) => headView(row, taken.get(row.id) ?? []));
}

export type WaveformRow = typeof waveforms.$inferSelect;

/** @throws {NotFound} */
export function findWaveformRow(db: Db, id: string): WaveformRow {
  const row = db.select().from(waveforms).where(eq(waveforms.id, id)).get();
  if (!row) throw new NotFound('This waveform');
  return row;
}

/** A waveform with what was computed and found. @throws {NotFound} */
export function findWaveform(db: Db, id: string): Waveform {
  const { record, version, lotId } = findWaveformRow(db, id);
  const head = heads(db).where(eq(waveforms.id, id)).get();
  const of = db
    .select({
      lot: { id: lots.id, number: lots.number, status: lots.status },
      part: { number: parts.number, name: parts.name, topology: parts.topology },
    })
    .from(lots)
    .innerJoin(parts, eq(parts.id, lots.partId))
    .where(eq(lots.id, lotId))
    .get();
  if (!head || !of) throw new Error(`Waveform ${id} is of no unit.`);
  const { status, ...lot } = of.lot;
  return {
    ...headView(head, readingsByWaveform(db, lotId).get(id) ?? []),
    version,
    lot: { ...lot, atBench: status === 'drawn' || status === 'measuring' },
    part: of.part,
    record,
  };
}
