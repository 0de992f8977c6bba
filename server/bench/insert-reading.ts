import { type Db } from '#db/open-database';
import { preparedOnce } from '#db/prepared-once';
import { readings } from '#db/schema/readings';
import { type ReadingRow } from '#server/judging/lot-judging';
import { sql } from 'drizzle-orm';

/** A reading that is kept for the first time. */
export type FreshReading = Omit<ReadingRow, 'withdrawnAt' | 'withdrawnById'>;

const bound = sql.placeholder;

const insertion = preparedOnce((db) =>
  db
    .insert(readings)
    .values({
      id: bound('id'),
      lotId: bound('lotId'),
      unitId: bound('unitId'),
      characteristicId: bound('characteristicId'),
      attempt: bound('attempt'),
      value: bound('value'),
      pass: sql`${bound('pass')}`,
      entry: sql`${bound('entry')}`,
      instrumentId: bound('instrumentId'),
      note: bound('note'),
      repeatReason: bound('repeatReason'),
      repeatNote: bound('repeatNote'),
      takenById: bound('takenById'),
      rackImportId: bound('rackImportId'),
      rackId: bound('rackId'),
      rangeId: bound('rangeId'),
      expandedUncertainty: bound('expandedUncertainty'),
      waveformId: bound('waveformId'),
      question: sql`${bound('question')}`,
      takenAt: bound('takenAt'),
      receivedAt: bound('receivedAt'),
    })
    .prepare(),
);

/** Writes a reading; what is returned is its row. */
export function insertReading(db: Db, fresh: FreshReading): ReadingRow {
  insertion(db).run({
    ...fresh,
    pass: fresh.pass === null ? null : Number(fresh.pass),
    entry: fresh.entry === null ? null : JSON.stringify(fresh.entry),
    question: fresh.question === null ? null : JSON.stringify(fresh.question),
  });
  return { ...fresh, withdrawnAt: null, withdrawnById: null };
}
