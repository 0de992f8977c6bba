import { computed, inject, Injectable, linkedSignal, signal, untracked } from '@angular/core';
import { type Bench } from '#shared/contract/bench';
import { type Instrument } from '#shared/contract/instruments';
import { judgedCharacteristic } from '#shared/plan/judged-characteristic';
import { type Component } from '#shared/uncertainty/component';
import { judgeGroups } from '#shared/verdict/judge-groups';
import { judgeLot } from '#shared/verdict/judge-lot';
import { judgeUnit } from '#shared/verdict/judge-unit';
import { judgingRules } from '#shared/verdict/judging-rules';
import { type LotVerdict, type UnitVerdict } from '#shared/verdict/sample-verdict';
import { Session } from '../../session/session';
import { type UnitState } from '../../ui/tally/tally-shapes';
import { ReadingQueue } from '../waiting/reading-queue';
import { type ReadingValue } from './bench-reading';
import { type Arrival, type BenchChanges, mergedRecords } from './merged-records';
import { openRecords } from './open-records';
import { ReadingBudgets } from './reading-budgets';
import { judgedReadings, openQuestions, type UnitRecord, withTyped } from './unit-record';

/** What of a lot changes while it is open, beside its records. */
type LotState = Pick<Bench, 'lot' | 'version' | 'conditions' | 'instruments'>;

/** What is typed, as far as a verdict needs it: the value, and its uncertainty budget where one is known. */
export interface TypedWorth {
  readonly value: ReadingValue;
  readonly budget: readonly Component[] | undefined;
}

/** The sample of one lot as it is being measured: its units, their readings and the verdicts of both. */
@Injectable()
export class BenchSheet {
  private readonly queue = inject(ReadingQueue);
  private readonly session = inject(Session);
  /** The lot as it was read; what is judged by it stands until it is read again. */
  private readonly read = signal<Bench | null>(null);
  private readonly now = linkedSignal(() => this.read());

  /** The lot as it is now. */
  readonly bench = computed(() => opened(this.now()));
  readonly opened = computed(() => this.read() !== null);
  /** The plan's characteristics; they stay the same while the lot is open, whatever else changes of it. */
  readonly characteristics = computed(() => opened(this.read()).characteristics);
  readonly rules = computed(() => {
    const { characteristics, sampling, decisionRule: rule, coverageFactor } = opened(this.read());
    return judgingRules(characteristics.map(judgedCharacteristic), sampling.groups, { rule, coverageFactor });
  });
  readonly budgets = computed(() => new ReadingBudgets(opened(this.read())));
  private readonly known = computed(() => ({ rules: this.rules(), verdicts: new WeakMap<UnitRecord, UnitVerdict>() }));

  readonly records = linkedSignal<readonly UnitRecord[]>(() => {
    const bench = opened(this.read());
    return openRecords(
      bench,
      untracked(() => this.waiting(bench)),
      this.takenBy(),
    );
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
  /** Readings of racks far from what the part can give, which nobody has confirmed or repeated yet. */
  readonly openQuestions = computed(() =>
    this.records().flatMap((record) => openQuestions(record).map((reading) => ({ unit: record.unit, reading }))),
  );

  /** Opens a lot, or the same lot in a newer state. */
  open(bench: Bench): void {
    this.read.set(bench);
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
    const verdict = judgeUnit(rules, judgedReadings(record, this.budgets()));
    verdicts.set(record, verdict);
    return verdict;
  }

  /** A unit's verdict as if more readings were kept on it. */
  verdictWith(record: UnitRecord, typed: ReadonlyMap<string, TypedWorth>): UnitVerdict {
    let readings = judgedReadings(record, this.budgets());
    for (const [key, { value, budget }] of typed) readings = withTyped(readings, key, value, budget);
    return judgeUnit(this.rules(), readings);
  }

  /** The lot's verdict as if some units' were others. */
  lotWith(others: readonly UnitVerdict[]): LotVerdict {
    const byUnit = new Map(others.map((each) => [each.unit, each]));
    const verdicts = this.verdicts().map((each) => byUnit.get(each.unit) ?? each);
    return judgeLot(this.rules(), verdicts, judgeGroups(this.rules(), verdicts));
  }

  /** Takes over what changed of the lot itself. */
  take(changed: Partial<LotState>): void {
    this.now.update((bench) => bench && { ...bench, ...changed });
  }

  /** Takes over an instrument as it is after its check. */
  takeInstrument(id: number, change: Partial<Instrument>): void {
    const instruments = this.bench().instruments.map((each) => (each.id === id ? { ...each, ...change } : each));
    this.take({ instruments });
  }

  /** Lays in what others did; what of it is new to this bench is returned. */
  merge(changes: BenchChanges): Arrival[] {
    const bench = this.bench();
    const waiting = { acts: this.waiting(bench), bench, takenBy: this.takenBy() };
    const { records, arrivals } = mergedRecords(this.records(), changes, waiting);
    if (records.some((record, index) => record !== this.records()[index])) this.records.set(records);
    return arrivals;
  }

  /** Replaces the records of some units. */
  replace(units: ReadonlySet<number>, change: (record: UnitRecord) => UnitRecord): void {
    this.records.update((records) => records.map((record) => (units.has(record.unit) ? change(record) : record)));
  }

  /** Who measures here, by name. */
  takenBy(): string {
    return untracked(() => this.session.me()?.name ?? '');
  }

  private waiting({ lot }: Bench) {
    return this.queue.entries().filter(({ act }) => act.lotId === lot.id);
  }
}

function opened(bench: Bench | null): Bench {
  if (bench === null) throw new Error('No lot is open at the bench.');
  return bench;
}

function isJudged(verdict: UnitVerdict): boolean {
  return verdict.missing.length === 0 && verdict.verdict !== 'undecided';
}

function stateOf({ verdict, worstClass }: UnitVerdict): UnitState {
  if (verdict === 'nonconforming') return worstClass;
  if (verdict === 'undecided') return 'hold';
  return verdict === 'conforming' ? 'ok' : null;
}
