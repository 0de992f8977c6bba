import { DestroyRef, inject, Injectable, signal } from '@angular/core';
import { counts, type Counts, lotChange, readCounts } from '#shared/contract/counts';
import { type Observable, Subject } from 'rxjs';
import { ApiClient } from './api';
import { SharedStream } from './shared-stream';

/** Counts older than this after a lost connection are shown as old. */
const STALE_AFTER = 30_000;

/**
 * How many lots stand at each station, and which lots change, pushed by the server. One connection serves all tabs of a
 * browser.
 */
@Injectable()
export class LiveCounts {
  private readonly api = inject(ApiClient);
  private readonly destroyed = inject(DestroyRef);
  private readonly latest = signal<Counts | null>(null);
  private readonly stale = signal<Date | null>(null);
  private readonly changed = new Subject<number | null>();
  /** Whether the stream was away since the last counts came by it. */
  private hasGap = false;
  private patience: ReturnType<typeof setTimeout> | undefined;

  readonly counts = this.latest.asReadonly();
  /** When the shown counts were true, once they are too old to trust; null while they are fresh. */
  readonly staleSince = this.stale.asReadonly();
  /** Ids of lots as they are changed by anybody; null when the stream is back after a gap and any lot may have changed. */
  readonly lotChanges: Observable<number | null> = this.changed.asObservable();

  /** Begins to follow the counts; for people who may read them. */
  follow(): void {
    const stream = new SharedStream('/api/events', ['counts', 'lot'], {
      message: (event, text) => (event === 'lot' ? this.takeLot(text) : this.take(text)),
      lost: () => this.miss(),
      before: () => this.load(),
    });
    this.destroyed.onDestroy(() => {
      stream.close();
      clearTimeout(this.patience);
    });
  }

  /** Reads the counts once: the start, and after each loss, when the call also renews a session that has run out. */
  private load(): Promise<void> {
    return new Promise((resolve) => {
      this.api.call(readCounts, {}).subscribe({
        next: (now) => {
          this.show(now);
          resolve();
        },
        error: () => {
          this.lose();
          resolve();
        },
      });
    });
  }

  private take(text: string): void {
    const read = counts.safeParse(parsed(text));
    if (!read.success) return;
    this.show(read.data);
    if (this.hasGap) this.changed.next(null);
    this.hasGap = false;
  }

  private takeLot(text: string): void {
    const read = lotChange.safeParse(parsed(text));
    if (read.success) this.changed.next(read.data.lotId);
  }

  private miss(): void {
    this.hasGap = true;
    this.lose();
  }

  private show(now: Counts): void {
    clearTimeout(this.patience);
    this.patience = undefined;
    this.stale.set(null);
    this.latest.set(now);
  }

  private lose(): void {
    this.patience ??= setTimeout(() => {
      const shown = this.latest();
      if (shown !== null) this.stale.set(new Date(shown.at));
    }, STALE_AFTER);
  }
}

function parsed(text: string): unknown {
  try {
    return JSON.parse(text);
  } catch {
    return undefined;
  }
}
