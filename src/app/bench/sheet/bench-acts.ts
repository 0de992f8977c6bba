import { inject, Injectable, signal } from '@angular/core';
import { takeUntilDestroyed } from '@angular/core/rxjs-interop';
import { Subject } from 'rxjs';
import { type Bench, type ReadingBody } from '#shared/contract/bench';
import { type BenchAct, type Confirmation } from '../waiting/bench-act';
import { ReadingQueue, type Settled } from '../waiting/reading-queue';
import { keptReading } from './bench-reading';
import { BenchSheet } from './bench-sheet';
import { byUnit } from './by-unit';
import { withAct } from './open-records';
import { withoutReading, withReading, type UnitRecord } from './unit-record';

/** A reading that is to be kept; what a captured file gave goes with it, in SI base units. */
export interface TakenReading {
  readonly body: ReadingBody;
  readonly measured?: number | null;
}

/** What is done on the units of the lot: shown at once, brought to the server, and taken over as the server has it. */
@Injectable()
export class BenchActs {
  private readonly queue = inject(ReadingQueue);
  private readonly sheet = inject(BenchSheet);
  private readonly staleness = new Subject<void>();
  /** What was settled while a newer state of the lot is on its way, as that state may be from before; null at other times. */
  private meanwhile: Settled[] | null = [];
  /** Readings kept here, the last one at the end. */
  private readonly trail = signal<readonly { unit: number; id: string }[]>([]);

  /** Emits when the lot should be read again: something was refused, or somebody else's work shows through. */
  readonly stale = this.staleness.asObservable();

  constructor() {
    this.queue.settled.pipe(takeUntilDestroyed()).subscribe((settled) => this.settle(settled));
  }

  /** Opens a lot, or the same lot in a newer state. */
  open(bench: Bench): void {
    this.sheet.open(bench);
    const meanwhile = this.meanwhile ?? [];
    this.meanwhile = null;
    for (const settled of meanwhile) if (settled.act.lotId === bench.lot.id) this.apply(settled);
  }

  keep(reading: TakenReading): void {
    this.keepAll([reading]);
  }

  /** Keeps many readings at once, as they come out of a spreadsheet. */
  keepAll(readings: readonly TakenReading[]): void {
    const lotId = this.sheet.bench().lot.id;
    const acts = readings.map(({ body, measured = null }) => {
      const id = crypto.randomUUID();
      return { kind: 'reading', id, lotId, unit: body.unit, body, measured } as const;
    });
    this.trail.update((trail) => [...trail, ...acts.map(({ unit, id }) => ({ unit, id }))]);
    this.doAll(acts);
  }

  setAside(unit: number, reason: string | null): void {
    this.doAll([{ kind: 'set-aside', id: crypto.randomUUID(), lotId: this.sheet.bench().lot.id, unit, reason }]);
  }

  /** Confirms a reading that waits for an answer. */
  answer(unit: number, readingId: string, answer: Confirmation): void {
    const lotId = this.sheet.bench().lot.id;
    this.doAll([{ kind: 'answer', id: crypto.randomUUID(), lotId, unit, readingId, answer }]);
  }

  /** Takes the last reading kept here back; says which, or null where there is none. */
  withdrawLast(): { unit: number; key: string } | null {
    const last = this.trail().at(-1);
    const reading = last && this.sheet.recordOf(last.unit).readings.find(({ id }) => id === last.id);
    this.trail.update((trail) => trail.slice(0, -1));
    if (last === undefined) return null;
    if (reading === undefined || reading.withdrawn || reading.state === 'refused') return this.withdrawLast();
    const lotId = this.sheet.bench().lot.id;
    this.doAll([{ kind: 'withdrawal', id: crypto.randomUUID(), lotId, unit: last.unit, readingId: last.id }]);
    return { unit: last.unit, key: reading.characteristicKey };
  }

  /** Gives up a reading that the server refused. */
  discardRefused(unit: number, readingId: string): void {
    this.queue.discard(readingId);
    this.sheet.replace(new Set([unit]), (record) => withoutReading(record, readingId));
  }

  /** Sends a refused reading again with something changed about it, as an answer to the question it raised. */
  amend(readingId: string, change: Partial<ReadingBody>): void {
    const refused = this.queue.refused().find(({ act }) => act.id === readingId)?.act;
    if (refused?.kind !== 'reading') return;
    const act = { ...refused, body: { ...refused.body, ...change } };
    this.discardRefused(act.unit, readingId);
    this.doAll([act]);
  }

  private doAll(acts: readonly BenchAct[]): void {
    this.queue.addAll(acts);
    const actsOf = byUnit(acts);
    const how = { takenBy: this.sheet.takenBy(), refusal: null };
    this.sheet.replace(new Set(actsOf.keys()), (record) =>
      (actsOf.get(record.unit) ?? []).reduce((now, act) => withAct(now, act, this.sheet.bench(), how), record),
    );
  }

  private settle(settled: Settled): void {
    this.meanwhile?.push(settled);
    if (!this.sheet.opened() || settled.act.lotId !== this.sheet.bench().lot.id) return;
    this.apply(settled);
    const { outcome } = settled;
    const stopsElsewhere = outcome === 'acknowledged' && settled.kept?.stop === true && !this.sheet.lot().stop;
    if (outcome === 'refused' || stopsElsewhere) this.readAgain();
  }

  private readAgain(): void {
    this.meanwhile = [];
    this.staleness.next();
  }

  private apply(settled: Settled): void {
    this.sheet.replace(new Set([settled.act.unit]), (record) => this.applied(record, settled));
  }

  private applied(record: UnitRecord, settled: Settled): UnitRecord {
    const refusal = settled.outcome === 'refused' ? settled.refusal : null;
    if (settled.outcome === 'refused' || settled.kept === null)
      return withAct(record, settled.act, this.sheet.bench(), { takenBy: this.sheet.takenBy(), refusal });
    const kept = keptReading(settled.kept.reading);
    const withdrawn = record.readings.some(({ id, withdrawn: taken }) => id === kept.id && taken);
    return withReading(record, { ...kept, withdrawn: kept.withdrawn || withdrawn });
  }
}
