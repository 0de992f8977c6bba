import { type Bench, type Reading } from '#shared/contract/bench';
import { type WaitingAct } from '../waiting/bench-act';
import { type BenchReading, keptReading } from './bench-reading';
import { byUnit } from './by-unit';
import { withAct } from './open-records';
import { type UnitRecord, withReading } from './unit-record';

/** What happened at a lot since it was last asked about, as the contract tells it. */
export interface BenchChanges {
  readonly readings: readonly Reading[];
  readonly units: Bench['units'];
}

/** A reading that somebody else, or a rack, took meanwhile. */
export interface Arrival {
  readonly unit: number;
  readonly reading: BenchReading;
}

/**
 * The records with what others did laid in. A record that nothing happened to stays the same object, so that nothing of it is
 * judged or drawn again; what waits here for the server is laid over.
 */
export function mergedRecords(
  records: readonly UnitRecord[],
  changes: BenchChanges,
  waiting: { readonly acts: readonly WaitingAct[]; readonly bench: Bench; readonly takenBy: string },
): { records: UnitRecord[]; arrivals: Arrival[] } {
  const arrivals: Arrival[] = [];
  const readingsOf = byUnit(changes.readings);
  const said = new Map(changes.units.map((each) => [each.unit, each]));
  const merged = records.map((record) => {
    let now = saidOf(record, said.get(record.unit), waiting);
    for (const reading of readingsOf.get(record.unit) ?? []) {
      if (!record.readings.some(({ id }) => id === reading.id) && !reading.withdrawn)
        arrivals.push({ unit: record.unit, reading: keptReading(reading) });
      now = withNewer(now, reading);
    }
    return now;
  });
  return { records: merged, arrivals };
}

/** The reading as the server has it now; one taken back here stays so, as the server may not have heard of it yet. */
function withNewer(record: UnitRecord, reading: Reading): UnitRecord {
  const known = record.readings.find(({ id }) => id === reading.id);
  const newer = keptReading({ ...reading, withdrawn: reading.withdrawn || known?.withdrawn === true });
  return known !== undefined && isSame(known, newer) ? record : withReading(record, newer);
}

/** What can change of a kept reading: whether it counts, and the answer to its question. */
function isSame(known: BenchReading, newer: BenchReading): boolean {
  return (
    known.state === newer.state &&
    known.withdrawn === newer.withdrawn &&
    known.question?.given.answer === newer.question?.given.answer
  );
}

/** Set aside and ruled on as the server has it, with what is said here and not sent yet. Only such units are told. */
function saidOf(
  record: UnitRecord,
  told: Bench['units'][number] | undefined,
  { acts, bench, takenBy }: { acts: readonly WaitingAct[]; bench: Bench; takenBy: string },
): UnitRecord {
  const setAside = told?.setAside ?? null;
  const ruling = told?.ruling ?? null;
  const same = record.setAside === setAside && record.ruling?.at === ruling?.at;
  if (same) return record;
  const own = acts.filter(({ act, refusal }) => act.unit === record.unit && act.kind === 'set-aside' && !refusal);
  return own.reduce<UnitRecord>((now, { act }) => withAct(now, act, bench, { takenBy, refusal: null }), {
    ...record,
    setAside,
    ruling,
  });
}
