import { type Bench } from '#shared/contract/bench';
import { type BenchAct, type WaitingAct } from '../waiting/bench-act';
import { keptReading, type OnItsWay, type Refusal, waitingReading } from './bench-reading';
import { type UnitRecord, withChanged, withReading, withWithdrawn } from './unit-record';

/** The records of a lot as the server has them, with what is still on its way laid over. */
export function openRecords(bench: Bench, waiting: readonly WaitingAct[], takenBy: string): UnitRecord[] {
  const records = new Map(bench.units.map((unit) => [unit.unit, { ...unit, readings: [] } as UnitRecord]));
  for (const reading of bench.readings) {
    const record = records.get(reading.unit);
    if (record) records.set(reading.unit, { ...record, readings: [...record.readings, keptReading(reading)] });
  }
  for (const each of waiting) {
    const record = records.get(each.act.unit);
    if (record) records.set(each.act.unit, withAct(record, each.act, bench, { takenBy, refusal: refusalOf(each) }));
  }
  return [...records.values()];
}

/** The refusal of an act that waits no longer; null while it waits. */
export function refusalOf({ refusal, code = '' }: Pick<WaitingAct, 'refusal' | 'code'>): Refusal | null {
  return refusal === null ? null : { code, message: refusal };
}

/** Who did an act, and the server's refusal where it refused. */
type ActState = Pick<OnItsWay, 'refusal'> & { readonly takenBy: string };

/** The record once an act is done on its unit. A refused act changes nothing but that its reading is shown as refused. */
export function withAct(record: UnitRecord, act: BenchAct, bench: Bench, how: ActState): UnitRecord {
  if (act.kind === 'reading') return withTakenReading(record, act, bench, how);
  if (how.refusal !== null) return record;
  if (act.kind === 'withdrawal') return withWithdrawn(record, act.readingId);
  if (act.kind === 'set-aside') return { ...record, setAside: act.reason };
  return withChanged(record, act.readingId, (reading) => {
    if (reading.question === null) return reading;
    const given = { answer: 'confirmed', ...act.answer } as const;
    return { ...reading, question: { ...reading.question, given, answeredBy: how.takenBy } };
  });
}

function withTakenReading(
  record: UnitRecord,
  { id, body, measured }: Extract<BenchAct, { kind: 'reading' }>,
  bench: Bench,
  how: ActState,
): UnitRecord {
  const characteristic = bench.characteristics.find(({ key }) => key === body.characteristicKey);
  const known = record.readings.some((reading) => reading.id === id && reading.state === 'kept');
  if (characteristic === undefined || known) return record;
  return withReading(record, waitingReading(id, body, characteristic, bench, { ...how, measured }));
}
