import { DestroyRef, inject, Injectable, signal } from '@angular/core';
import { counts, type Counts, readCounts } from '#shared/contract/counts';
import { ApiClient } from './api';
import { SharedStream } from './shared-stream';

/** Counts older than this after a lost connection are shown as old. */
const STALE_AFTER = 30_000;

/** How many lots stand at each station, pushed by the server. One connection serves all tabs of a browser. */
@Injectable()
export class LiveCounts {
  private readonly api = inject(ApiClient);
  private readonly destroyed = inject(DestroyRef);
  private readonly latest = signal<Counts | null>(null);
  private readonly stale = signal<Date | null>(null);
  private patience: ReturnType<typeof setTimeout> | undefined;

  readonly counts = this.latest.asReadonly();
  /** When the shown counts were true, once they are too old to trust; null while they are fresh. */
  readonly staleSince = this.stale.asReadonly();

  /** Begins to follow the counts; for people who may read them. */
  follow(): void {
    const stream = new SharedStream('/api/events', 'counts', {
      message: (text) => this.take(text),
      lost: () => this.lose(),
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
    if (read.success) this.show(read.data);
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
