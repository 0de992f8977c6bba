import { type TypedReading } from '#db/demo/bench-work';
import { type Db } from '#db/open-database';
import { startMeasuring } from '#server/bench/keep-reading';
import { type MeasuredValue, type ReadingFacts, readingFacts } from '#server/bench/reading-facts';
import { holdInstrument } from '#server/bench/reading-instrument';
import { type Caller } from '#server/caller';
import { type Context } from '#server/context';
import { dayOf } from '#server/instruments/instrument-queries';
import { keepProgress } from '#server/judging/running-verdicts';
import { findLot } from '#server/lots/lot-rows';
import { type Characteristic } from '#shared/contract/plans';
import { type Agenda } from './agenda';
import { type ReadingToKeep, keepTyped } from './keep-typed';
import { type RunningSample } from './running-sample';

/** A value with how it was read; null for what is judged by eye. */
type FoundValue = Omit<MeasuredValue, 'value' | 'rangeId'> & { value: number | null };

interface Session {
  lotId: number;
  inspector: Caller;
  sample: RunningSample;
  work: readonly TypedReading[];
  /** Whether measuring ends as soon as the rejection is certain. */
  endsAtStop: boolean;
  /** The instrument of a kind that the inspector uses on a day. */
  instrumentFor(kind: string | null, day: string): number | null;
  /** What happens after the last reading. */
  afterwards(at: Date): void;
}

/**
 * Somebody measuring a sample. Readings are kept in runs as long as nothing else happens between them, so that all that
 * is recorded stands in the order of its moments.
 */
export class BenchSession {
  private done = 0;

  constructor(
    private readonly context: Context,
    private readonly agenda: Agenda,
    private readonly session: Session,
  ) {}

  /** Puts the next reading on the agenda, or what comes after the last. */
  goOn(): void {
    const { work, sample, endsAtStop, afterwards } = this.session;
    const next = work[this.done];
    const last = work[this.done - 1];
    // A slip may reach the rejection number for a moment; it is repeated before anybody stops.
    const ends = endsAtStop && sample.stopped && next?.repeat === null;
    if (next && !ends) this.agenda.add(next.at, () => this.measure());
    else if (last) afterwards(last.at);
  }

  private measure(): void {
    const run = this.nextRun();
    const last = run.at(-1);
    if (last) this.context.db.transaction((tx) => this.keep(tx, run, last.typed.at));
    this.goOn();
  }

  /** Readings up to the next act of somebody else, or to the one that changes whether the lot is stopped. */
  private nextRun(): ReadingToKeep[] {
    const { work, sample } = this.session;
    const run: ReadingToKeep[] = [];
    const limit = this.agenda.next();
    const wasStopped = sample.stopped;
    for (;;) {
      const typed = work[this.done];
      const isLater = run.length > 0 && typed && limit && typed.at > limit;
      if (!typed || isLater || sample.stopped !== wasStopped) return run;
      run.push(this.reading(typed));
      this.done += 1;
    }
  }

  private reading(typed: TypedReading): ReadingToKeep {
    const { sample, instrumentFor } = this.session;
    const { id, content } = sample.characteristic(typed.key);
    const kind = content.kind === 'computed' ? null : content.instrumentKind;
    const instrumentId = instrumentFor(kind, dayOf(typed.at));
    const taken = sample.take(typed);
    const facts = this.factsOf(content, { value: taken.worth.value, entry: typed.entry, instrumentId });
    return { typed, characteristicId: id, instrumentId, ...facts, ...taken };
  }

  /** The range and the uncertainty of what is measured, as the bench finds them. */
  private factsOf(content: Characteristic, { value, ...given }: FoundValue): ReadingFacts {
    if (content.kind !== 'measured' || value === null) return { rangeId: null, expandedUncertainty: null };
    const { revision } = this.session.sample.rules;
    return readingFacts(this.context.db, revision, content, { ...given, value, rangeId: null });
  }

  private keep(db: Db, run: readonly ReadingToKeep[], at: Date): void {
    const { lotId, inspector, sample } = this.session;
    const { lot } = findLot(db, lotId);
    startMeasuring(db, lot, inspector, run[0]?.typed.at ?? at);
    this.holdInstruments(db, run, dayOf(at));
    keepTyped(db, lotId, inspector, run);
    keepProgress(db, lot, sample.rules, sample.verdicts(), at);
  }

  /** The bench's own rule, asked once for each characteristic of a run. */
  private holdInstruments(db: Db, run: readonly ReadingToKeep[], day: string): void {
    const byKey = new Map(run.map(({ typed, instrumentId }) => [typed.key, instrumentId]));
    for (const [key, instrumentId] of byKey)
      holdInstrument(db, this.session.sample.characteristic(key).content, instrumentId, day);
  }
}
