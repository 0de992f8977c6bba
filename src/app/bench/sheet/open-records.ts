import { type Bench } from '#shared/contract/bench';
import { type BenchAct, type WaitingAct } from '../waiting/bench-act';
import { keptReading, waitingReading } from './bench-reading';
import { type UnitRecord, withReading, withWithdrawn } from './unit-record';

/** The records of a lot as the server has them, with what is still on its way laid over. */
export function openRecords(bench: Bench, waiting: readonly WaitingAct[], takenBy: string): UnitRecord[] {
  const records = new Map(bench.units.map((unit) => [unit.unit, { ...unit, readings: [] } as UnitRecord]));
  for (const reading of bench.readings) {
    const record = records.get(reading.unit);
    if (record) records.set(reading.unit, withReading(record, keptReading(reading)));
  }
  for (const { act, refusal } of waiting) {
    const record = records.get(act.unit);
    if (record) records.set(act.unit, withAct(record, act, bench, { takenBy, refusal }));
  }
  return [...records.values()];
}

/** Who did an act, and the server's sentence when it was refused. */
interface ActState {
  readonly takenBy: string;
  readonly refusal: string | null;
}

/** The record once an act is done on its unit. A refused act changes nothing but that its reading is shown as refused. */
export function withAct(record: UnitRecord, act: BenchAct, bench: Bench, how: ActState): UnitRecord {
  const { refusal } = how;
  if (act.kind === 'withdrawal') return refusal === null ? withWithdrawn(record, act.readingId) : record;
  if (act.kind === 'set-aside') return refusal === null ? { ...record, setAside: act.reason } : record;
  const { body, id } = act;
  const characteristic = bench.characteristics.find(({ key }) => key === body.characteristicKey);
  const known = record.readings.some((reading) => reading.id === id && reading.state === 'kept');
  if (characteristic === undefined || known) return record;
  return withReading(record, waitingReading(id, body, characteristic, how));
}
