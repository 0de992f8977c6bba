import { type Reading } from '#shared/contract/bench';
import { type ReadingRow } from '#server/judging/lot-judging';
import { type BenchNames } from './bench-names';

/** A reading as the contract shows it. */
export function readingView(row: ReadingRow, unit: number, characteristicKey: string, names: BenchNames): Reading {
  return {
    id: row.id,
    unit,
    characteristicKey,
    value: row.value,
    pass: row.pass,
    entry: row.entry,
    instrumentId: row.instrumentId,
    rangeId: row.rangeId,
    expandedUncertainty: row.expandedUncertainty,
    waveformId: row.waveformId,
    question: row.question,
    note: row.note,
    repeat: row.repeatReason === null ? null : { reason: row.repeatReason, note: row.repeatNote ?? '' },
    attempt: row.attempt,
    withdrawn: row.withdrawnAt !== null,
    takenBy: row.takenById === null ? null : (names.people.get(row.takenById) ?? null),
    rack: row.rackId === null ? null : (names.racks.get(row.rackId) ?? null),
    takenAt: row.takenAt,
    receivedAt: row.receivedAt,
  };
}
