import { computed, inject, Injectable, linkedSignal, signal, untracked } from '@angular/core';
import { takeUntilDestroyed } from '@angular/core/rxjs-interop';
import { Subject } from 'rxjs';
import { type Bench, type ReadingBody } from '#shared/contract/bench';
import { judgedCharacteristic } from '#shared/plan/judged-characteristic';
import { judgeGroups } from '#shared/verdict/judge-groups';
import { judgeLot } from '#shared/verdict/judge-lot';
import { judgeUnit } from '#shared/verdict/judge-unit';
import { judgingRules } from '#shared/verdict/judging-rules';
import { type LotVerdict, type UnitVerdict } from '#shared/verdict/sample-verdict';
import { Session } from '../../session/session';
import { type UnitState } from '../../ui/tally/tally-shapes';
import { type BenchAct } from '../waiting/bench-act';
import { ReadingQueue, type Settled } from '../waiting/reading-queue';
import { keptReading, type ReadingValue } from './bench-reading';
import { openRecords, withAct } from './open-records';
import { judgedReadings, type UnitRecord, withoutReading, withReading } from './unit-record';

/** The sample of one lot as it is being measured: its units, their readings and the verdicts of both. */
@Injectable()
export class BenchSheet {
  private readonly queue = inject(ReadingQueue);
  private readonly session = inject(Session);
  private readonly source = signal<Bench | null>(null);
  private readonly staleness = new Subject<void>();
  /** What was settled while a newer state of the lot is on its way, as that state may be from before; null at other times. */
  private meanwhile: Settled[] | null = [];
  /** Readings kept here, the last one at the end. */
  private readonly trail = signal<readonly { unit: number; id: string }[]>([]);

  readonly bench = computed(() => {
    const bench = this.source();
    if (bench === null) throw new Error('No lot is open at the bench.');
    return bench;
  });
  readonly opened = computed(() => this.source() !== null);
  readonly rules = computed(() =>
    judgingRules(this.bench().characteristics.map(judgedCharacteristic), this.bench().sampling.groups),
  );
  private readonly known = computed(() => ({ rules: this.rules(), verdicts: new WeakMap<UnitRecord, UnitVerdict>() }));

  readonly records = linkedSignal<readonly UnitRecord[]>(() => {
    const bench = this.bench();
    const waiting = untracked(() => this.queue.entries()).filter(({ act }) => act.lotId === bench.lot.id);
    return openRecords(bench, waiting, this.takenBy());
  });
  readonly verdicts = computed(() => this.records().map((record) => this.verdictOf(record)));
  readonly groups = computed(() => judgeGroups(this.rules(), this.verdicts()));
  readonly lot = computed(() => judgeLot(this.rules(), this.verdicts(), this.groups()));
  readonly states = computed(() => this.verdicts().map(stateOf));
  readonly judgedUnits = computed(() => this.verdicts().filter(isJudged).length);
  /** Readings still to be taken; what is computed follows from them. */
  readonly missing = computed(() => {
    const computedKeys = this.bench()
      .characteristics.filter(({ kind }) => kind === 'computed')
      .map(({ key }) => key);
    const typed = this.verdicts().map(({ missing }) => missing.filter((key) => !computedKeys.includes(key)).length);
    return typed.reduce((sum, count) => sum + count, 0);
  });
  readonly undecided = computed(() => this.verdicts().filter(({ verdict }) => verdict === 'undecided').length);
  /** Emits when somebody else's work shows through, so that the lot should be read again. */
  readonly stale = this.staleness.asObservable();

  constructor() {
    this.queue.settled.pipe(takeUntilDestroyed()).subscribe((settled) => this.settle(settled));
  }

  /** Opens a lot, or the same lot in a newer state. */
  open(bench: Bench): void {
    this.source.set(bench);
    const meanwhile = this.meanwhile ?? [];
    this.meanwhile = null;
    for (const settled of meanwhile) if (settled.act.lotId === bench.lot.id) this.apply(settled);
  }

  recordOf(unit: number): UnitRecord {
    const record = this.records().find((each) => each.unit === unit);
    if (record === undefined) throw new RangeError(`unit ${unit} is not in the sample.`);
    return record;
  }

  /** A unit's verdict; a record is judged once. */
  verdictOf(record: UnitRecord): UnitVerdict {
    const { rules, verdicts } = this.known();
    const known = verdicts.get(record);
    if (known !== undefined) return known;
    const verdict = judgeUnit(rules, judgedReadings(record));
    verdicts.set(record, verdict);
    return verdict;
  }

  /** A unit's verdict as if one more reading were kept on it. */
  verdictWith(record: UnitRecord, key: string, value: ReadingValue): UnitVerdict {
    const readings = judgedReadings(record);
    return judgeUnit(this.rules(), { ...readings, values: new Map(readings.values).set(key, value) });
  }

  /** The lot's verdict as if one unit's were another. */
  lotWith(verdict: UnitVerdict): LotVerdict {
    const verdicts = this.verdicts().map((each) => (each.unit === verdict.unit ? verdict : each));
    return judgeLot(this.rules(), verdicts, judgeGroups(this.rules(), verdicts));
  }

  keep(body: ReadingBody): void {
    const id = crypto.randomUUID();
    this.trail.update((trail) => [...trail, { unit: body.unit, id }]);
    this.act({ kind: 'reading', id, lotId: this.bench().lot.id, unit: body.unit, body });
  }

  setAside(unit: number, reason: string | null): void {
    this.act({ kind: 'set-aside', id: crypto.randomUUID(), lotId: this.bench().lot.id, unit, reason });
  }

  /** Takes the last reading kept here back; says which, or null where there is none. */
  withdrawLast(): { unit: number; key: string } | null {
    const last = this.trail().at(-1);
    const reading = last && this.recordOf(last.unit).readings.find(({ id }) => id === last.id);
    this.trail.update((trail) => trail.slice(0, -1));
    if (last === undefined) return null;
    if (reading === undefined || reading.withdrawn || reading.state === 'refused') return this.withdrawLast();
    const lotId = this.bench().lot.id;
    this.act({ kind: 'withdrawal', id: crypto.randomUUID(), lotId, unit: last.unit, readingId: last.id });
    return { unit: last.unit, key: reading.characteristicKey };
  }

  /** Gives up a reading that the server refused. */
  discardRefused(unit: number, readingId: string): void {
    this.queue.discard(readingId);
    this.replace(unit, (record) => withoutReading(record, readingId));
  }

  private act(act: BenchAct): void {
    this.queue.add(act);
    this.replace(act.unit, (record) => withAct(record, act, this.bench(), { takenBy: this.takenBy(), refusal: null }));
  }

  private settle(settled: Settled): void {
    this.meanwhile?.push(settled);
    if (!this.opened() || settled.act.lotId !== this.bench().lot.id) return;
    this.apply(settled);
    const stopsElsewhere = settled.outcome === 'acknowledged' && settled.kept?.stop === true && !this.lot().stop;
    if (settled.outcome === 'refused' || stopsElsewhere) this.readAgain();
  }

  private readAgain(): void {
    this.meanwhile = [];
    this.staleness.next();
  }

  private apply(settled: Settled): void {
    const takenBy = this.takenBy();
    const refusal = settled.outcome === 'refused' ? settled.refusal : null;
    this.replace(settled.act.unit, (record) => {
      if (settled.outcome === 'refused' || settled.kept === null)
        return withAct(record, settled.act, this.bench(), { takenBy, refusal });
      const kept = keptReading(settled.kept.reading);
      const withdrawn = record.readings.some(({ id, withdrawn: taken }) => id === kept.id && taken);
      return withReading(record, { ...kept, withdrawn: kept.withdrawn || withdrawn });
    });
  }

  private takenBy(): string {
    return untracked(() => this.session.me()?.name ?? '');
  }

  private replace(unit: number, change: (record: UnitRecord) => UnitRecord): void {
    this.records.update((records) => records.map((record) => (record.unit === unit ? change(record) : record)));
  }
}

function isJudged(verdict: UnitVerdict): boolean {
  return verdict.missing.length === 0 && verdict.verdict !== 'undecided';
}

function stateOf({ verdict, worstClass }: UnitVerdict): UnitState {
  if (verdict === 'nonconforming') return worstClass;
  if (verdict === 'undecided') return 'hold';
  return verdict === 'conforming' ? 'ok' : null;
}
