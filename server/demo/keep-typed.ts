import { type TypedReading } from '#db/demo/bench-work';
import { type Db } from '#db/open-database';
import { readings } from '#db/schema/readings';
import { recordAll } from '#server/audit/record-all';
import { type EntryValue } from '#server/bench/entry-value';
import { type Caller } from '#server/caller';
import { randomUUID } from 'node:crypto';

/** SQLite takes a limited number of values in one statement. */
const ROWS_AT_ONCE = 500;

/** A typed reading with what it is worth and where it belongs. */
export interface ReadingToKeep {
  typed: TypedReading;
  worth: EntryValue;
  attempt: number;
  unitId: number;
  characteristicId: number;
  instrumentId: number | null;
}

function rowOf({ typed, worth, ...place }: ReadingToKeep, lotId: number, caller: Caller) {
  const at = typed.at.toISOString();
  return {
    id: randomUUID(),
    lotId,
    ...place,
    ...worth,
    entry: typed.entry,
    note: typed.note,
    repeatReason: typed.repeat?.reason ?? null,
    repeatNote: typed.repeat?.note ?? null,
    takenById: caller.id,
    takenAt: at,
    receivedAt: at,
  };
}

/** Keeps many readings with the rows and audit entries that the bench would have made of each, in few statements. */
export function keepTyped(db: Db, lotId: number, caller: Caller, kept: readonly ReadingToKeep[]): void {
  const rows = kept.map((one) => rowOf(one, lotId, caller));
  for (let from = 0; from < rows.length; from += ROWS_AT_ONCE)
    db.insert(readings)
      .values(rows.slice(from, from + ROWS_AT_ONCE))
      .run();
  recordAll(
    db,
    kept.map(({ typed, worth, attempt }, index) => ({
      at: typed.at,
      person: caller,
      action: 'kept',
      subject: 'reading',
      subjectId: rows[index]?.id ?? '',
      after: { lot: lotId, unit: typed.unit, characteristic: typed.key, ...worth, attempt },
    })),
  );
}
