import { type TypedReading } from '#db/demo/bench-work';
import { type Db } from '#db/open-database';
import { record } from '#server/audit/record';
import { type EntryValue } from '#server/bench/entry-value';
import { insertReading } from '#server/bench/insert-reading';
import { type ReadingFacts } from '#server/bench/reading-facts';
import { type Caller } from '#server/caller';
import { randomUUID } from 'node:crypto';

/** A typed reading with what it is worth and where it belongs. */
export interface ReadingToKeep extends ReadingFacts {
  typed: TypedReading;
  worth: EntryValue;
  attempt: number;
  unitId: number;
  characteristicId: number;
  instrumentId: number | null;
}

/** Keeps readings with the rows and audit entries that the bench would have made of each. */
export function keepTyped(db: Db, lotId: number, caller: Caller, kept: readonly ReadingToKeep[]): void {
  for (const { typed, worth, ...facts } of kept) {
    const id = randomUUID();
    const at = typed.at.toISOString();
    insertReading(db, {
      id,
      lotId,
      ...facts,
      ...worth,
      entry: typed.entry,
      note: typed.note,
      repeatReason: typed.repeat?.reason ?? null,
      repeatNote: typed.repeat?.note ?? null,
      takenById: caller.id,
      rackImportId: null,
      rackId: null,
      waveformId: null,
      question: null,
      takenAt: at,
      receivedAt: at,
    });
    record(db, {
      at: typed.at,
      person: caller,
      action: 'kept',
      subject: 'reading',
      subjectId: id,
      after: { lot: lotId, unit: typed.unit, characteristic: typed.key, ...worth, attempt: facts.attempt },
    });
  }
}
