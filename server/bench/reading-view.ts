import { type Reading } from '#shared/contract/bench';
import { type ReadingRow } from '#server/judging/lot-judging';

/** A reading as the contract shows it. */
export function readingView(row: ReadingRow, unit: number, characteristicKey: string, takenBy: string | null): Reading {
  return {
    id: row.id,
    unit,
    characteristicKey,
    value: row.value,
    pass: row.pass,
    entry: row.entry,
    instrumentId: row.instrumentId,
    note: row.note,
    repeat: row.repeatReason === null ? null : { reason: row.repeatReason, note: row.repeatNote ?? '' },
    attempt: row.attempt,
    withdrawn: row.withdrawnAt !== null,
    takenBy,
    takenAt: row.takenAt,
    receivedAt: row.receivedAt,
  };
}
