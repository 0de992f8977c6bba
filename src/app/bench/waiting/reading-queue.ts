import { computed, effect, inject, Injectable, signal, untracked } from '@angular/core';
import { firstValueFrom, type Observable, Subject, timeout } from 'rxjs';
import { answerQuestion, keepReading, type Kept, setUnitAside, withdrawReading } from '#shared/contract/bench';
import { ApiClient } from '../../data/api';
import { type ApiProblem, problemOf } from '../../data/api-problem';
import { Connection } from '../../data/connection';
import { Session } from '../../session/session';
import { type Refusal } from '../sheet/bench-reading';
import { type BenchAct, type WaitingAct } from './bench-act';
import { failureKind, retryPause } from './retry-pause';
import { WaitingShelf } from './waiting-shelf';

/** What became of an act: acknowledged, with the server's verdict where it was a reading, or refused with its sentence. */
export type Settled =
  | { readonly act: BenchAct; readonly outcome: 'acknowledged'; readonly kept: Kept | null }
  | { readonly act: BenchAct; readonly outcome: 'refused'; readonly refusal: Refusal };

/**
 * Readings on their way to the server. Each stays on this device until it is acknowledged; they are sent one after the other,
 * again and again while the server cannot be reached, and what the server refuses stays here with its sentence.
 */
@Injectable({ providedIn: 'root' })
export class ReadingQueue {
  private readonly api = inject(ApiClient);
  private readonly shelf = inject(WaitingShelf);
  private readonly session = inject(Session);
  private readonly connection = inject(Connection);
  private readonly all = signal<readonly WaitingAct[]>(this.shelf.read());
  private readonly unstored = signal<ReadonlySet<string>>(new Set());
  private readonly settling = new Subject<Settled>();
  private sending = false;
  private failures = 0;
  private timer: ReturnType<typeof setTimeout> | undefined;

  /** Everything not yet acknowledged, in the order it was done. */
  readonly entries = this.all.asReadonly();
  readonly waiting = computed(() => this.all().filter((each) => each.refusal === null));
  readonly refused = computed(() => this.all().filter((each) => each.refusal !== null));
  /** Whether something waits that this browser could not write down, so that closing the page would lose it. */
  readonly atRisk = computed(() => this.waiting().some(({ act }) => this.unstored().has(act.id)));
  /** Whether the last act could not be brought to the server. */
  readonly failing = signal(false);
  /** When the server last acknowledged an act. */
  readonly savedAt = signal<Date | null>(null);
  readonly settled = this.settling.asObservable();

  constructor() {
    effect(() => {
      if (this.session.me() !== null) untracked(() => this.tryNow());
    });
    effect(() => {
      if (this.connection.lostSince() === null) untracked(() => this.tryNow());
    });
    effect(() => this.connection.waitingReadings.set(this.waiting().length));
  }

  /** Takes an act over; from now on it is not lost. */
  add(act: BenchAct): void {
    this.addAll([act]);
  }

  /** Takes acts over in their order. */
  addAll(acts: readonly BenchAct[]): void {
    const personId = this.session.me()?.id;
    if (personId === undefined) throw new Error('Only a person who is signed in measures.');
    const first = (this.all().at(-1)?.order ?? 0) + 1;
    this.put(...acts.map((act, index) => ({ act, personId, order: first + index, refusal: null })));
    void this.send();
  }

  /** Sends what waits at once instead of at the next turn. */
  tryNow(): void {
    this.failures = 0;
    void this.send();
  }

  /** Sends a refused act again. */
  resend(id: string): void {
    const refused = this.all().find((each) => each.act.id === id);
    if (refused === undefined) return;
    this.put({ ...refused, refusal: null });
    this.tryNow();
  }

  /** Gives up a refused act; the person has read why. */
  discard(id: string): void {
    this.shelf.remove(id);
    this.all.update((all) => all.filter((each) => each.act.id !== id));
  }

  private async send(): Promise<void> {
    if (this.sending) return;
    this.sending = true;
    clearTimeout(this.timer);
    const stumbledUnits = new Set<string>();
    for (let next = this.next(stumbledUnits); next !== undefined; next = this.next(stumbledUnits)) {
      if (!(await this.sendOne(next, stumbledUnits))) break;
    }
    this.sending = false;
    if (this.mine().length > 0) this.timer = setTimeout(() => void this.send(), retryPause(this.failures));
  }

  /** The first act of this person on a unit that the server did not stumble over; acts on one unit keep their order. */
  private next(stumbledUnits: ReadonlySet<string>): WaitingAct | undefined {
    return this.mine().find(({ act }) => !stumbledUnits.has(unitOf(act)));
  }

  private mine(): WaitingAct[] {
    const personId = this.session.me()?.id;
    return this.waiting().filter((each) => each.personId === personId);
  }

  /** Sends one act; false when there is no point in sending more just now. */
  private async sendOne(waiting: WaitingAct, stumbledUnits: Set<string>): Promise<boolean> {
    try {
      const kept = await this.call(waiting.act);
      this.acknowledge(waiting.act, kept);
      return true;
    } catch (thrown) {
      const problem = problemOf(thrown);
      const kind = failureKind(problem);
      if (kind === 'refused') {
        this.refuse(waiting, problem);
        return true;
      }
      this.failures += 1;
      this.failing.set(true);
      if (kind === 'stumbled') stumbledUnits.add(unitOf(waiting.act));
      return kind === 'stumbled';
    }
  }

  private async call(act: BenchAct): Promise<Kept | null> {
    const params = { id: act.lotId };
    switch (act.kind) {
      case 'reading':
        return answered(this.api.call(keepReading, { params: { ...params, reading: act.id }, body: act.body }));
      case 'withdrawal':
        return done(this.api.call(withdrawReading, { params: { ...params, reading: act.readingId } }));
      case 'answer':
        return done(this.api.call(answerQuestion, { params: { ...params, reading: act.readingId }, body: act.answer }));
      case 'set-aside':
        return done(
          this.api.call(setUnitAside, { params: { ...params, unit: act.unit }, body: { reason: act.reason } }),
        );
    }
  }

  private acknowledge(act: BenchAct, kept: Kept | null): void {
    this.discard(act.id);
    this.failures = 0;
    this.failing.set(false);
    this.savedAt.set(new Date());
    this.settling.next({ act, outcome: 'acknowledged', kept });
  }

  private refuse(waiting: WaitingAct, { code, message }: ApiProblem): void {
    this.failing.set(false);
    this.put({ ...waiting, refusal: message, code });
    this.settling.next({ act: waiting.act, outcome: 'refused', refusal: { code, message } });
  }

  private put(...waiting: readonly WaitingAct[]): void {
    const ids = new Set(waiting.map(({ act }) => act.id));
    const lost = waiting.filter((each) => !this.shelf.write(each)).map(({ act }) => act.id);
    this.unstored.update((known) => new Set([...known].filter((each) => !ids.has(each)).concat(lost)));
    this.all.update((all) => {
      const others = all.filter(({ act }) => !ids.has(act.id));
      return [...others, ...waiting].sort((one, other) => one.order - other.order);
    });
  }
}

/** A server that says nothing for so long is asked again, in ms; sending twice changes nothing. */
const PATIENCE = 20_000;

function answered<T>(call: Observable<T>): Promise<T> {
  return firstValueFrom(call.pipe(timeout(PATIENCE)));
}

async function done(call: Observable<unknown>): Promise<null> {
  await answered(call);
  return null;
}

function unitOf(act: BenchAct): string {
  return `${act.lotId}/${act.unit}`;
}
