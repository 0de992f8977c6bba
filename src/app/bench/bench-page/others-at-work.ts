import { LiveAnnouncer } from '@angular/cdk/a11y';
import { DestroyRef, inject, Injectable, signal } from '@angular/core';
import { takeUntilDestroyed } from '@angular/core/rxjs-interop';
import { catchError, concatMap, EMPTY, filter, type Observable, tap, throttleTime, timer } from 'rxjs';
import { readBenchChanges } from '#shared/contract/bench';
import { ApiClient, type Reply } from '../../data/api';
import { LiveCounts } from '../../data/live-counts';
import { BenchCursor } from '../sheet/bench-cursor';
import { BenchSheet } from '../sheet/bench-sheet';
import { type Arrival } from '../sheet/merged-records';
import { ReadingDraft } from '../sheet/reading-draft';
import { readingWords } from '../sheet/reading-words';

/** Changes are asked for so often at most, in ms. */
const NOT_OFTENER = 1000;
/** How long a cell that somebody else has filled is marked, in ms. */
const MARKED_FOR = 2000;

/** Lays in what others, and racks, do at the same lot, and shows whose it is. Nothing is overwritten silently. */
@Injectable()
export class OthersAtWork {
  private readonly api = inject(ApiClient);
  private readonly sheet = inject(BenchSheet);
  private readonly cursor = inject(BenchCursor);
  private readonly draft = inject(ReadingDraft);
  private readonly announcer = inject(LiveAnnouncer);
  private readonly destroyed = inject(DestroyRef);
  private readonly marked = signal<ReadonlyMap<number, ReadonlyMap<string, string>>>(new Map());
  private cursorOfChanges: string | null = null;

  /** Who has just filled which cells: initials by characteristic, by unit. */
  readonly fresh = this.marked.asReadonly();

  constructor() {
    inject(LiveCounts)
      .lotChanges.pipe(
        filter((id) => this.sheet.opened() && (id === null || id === this.sheet.bench().lot.id)),
        throttleTime(NOT_OFTENER, undefined, { leading: true, trailing: true }),
        concatMap(() => this.ask()),
        takeUntilDestroyed(),
      )
      .subscribe();
  }

  /** The lot was read as a whole; changes are asked for from there on. */
  begin(cursor: string): void {
    this.cursorOfChanges = cursor;
  }

  /** An answer that fails to come is no harm: the next change asks again from the same point. */
  private ask(): Observable<unknown> {
    const { lot, cursor } = this.sheet.bench();
    const since = this.cursorOfChanges ?? cursor;
    return this.api.call(readBenchChanges, { params: { id: lot.id }, query: { since } }).pipe(
      tap((changes) => this.take(changes)),
      catchError(() => EMPTY),
    );
  }

  private take({ cursor, lot, version, conditions, readings, units }: Reply<typeof readBenchChanges>): void {
    if (lot.id !== this.sheet.bench().lot.id) return;
    this.cursorOfChanges = cursor;
    this.sheet.take({ lot, version, conditions });
    const arrivals = this.sheet.merge({ readings, units });
    this.mark(arrivals);
    const { unit, key } = this.cursor.at();
    const here = arrivals.find((each) => each.unit === unit && each.reading.characteristicKey === key);
    if (here !== undefined && this.draft.started()) this.tell(here);
  }

  /** Somebody else filled the very cell that is being typed in. */
  private tell({ reading }: Arrival): void {
    const said = `${byWhom(reading)} has just kept ${readingWords(reading, this.cursor.stop().characteristic)} here. Keeping yours asks why it is repeated.`;
    this.draft.meanwhile.set(said);
    void this.announcer.announce(said, 'assertive');
  }

  private mark(arrivals: readonly Arrival[]): void {
    if (arrivals.length === 0) return;
    const marked = new Map(this.marked());
    for (const { unit, reading } of arrivals)
      marked.set(unit, new Map(marked.get(unit)).set(reading.characteristicKey, initials(byWhom(reading))));
    this.marked.set(marked);
    timer(MARKED_FOR)
      .pipe(takeUntilDestroyed(this.destroyed))
      .subscribe(() => this.unmark(arrivals));
  }

  private unmark(arrivals: readonly Arrival[]): void {
    const marked = new Map(this.marked());
    for (const { unit } of arrivals) marked.delete(unit);
    this.marked.set(marked);
  }
}

function byWhom({ takenBy, rack }: Arrival['reading']): string {
  return takenBy ?? rack ?? 'A rack';
}

/** The first letters of the first and the last word: IS for I. Sandvær, R2 for Rack 2. */
function initials(name: string): string {
  const words = name.split(/\s+/).filter((word) => word !== '');
  const ends = words.length > 1 ? [words[0], words.at(-1)] : words;
  return ends.map((word) => word?.charAt(0).toUpperCase() ?? '').join('');
}
