import { HttpClient } from '@angular/common/http';
import { inject, Injectable, signal } from '@angular/core';
import { readFront } from '#shared/contract/site';

/** Whether the server answers, as the last calls showed. */
@Injectable({ providedIn: 'root' })
export class Connection {
  private readonly lost = signal<Date | null>(null);

  /** Since when the server has not answered; null while it does. */
  readonly lostSince = this.lost.asReadonly();
  /** Readings that wait on this machine for the server to come back. */
  readonly waitingReadings = signal(0);

  answered(): void {
    this.lost.set(null);
  }

  unanswered(): void {
    this.lost.update((since) => since ?? new Date());
  }
}

/** Asks the server for a sign of life; what it answers is noted on the way. */
@Injectable({ providedIn: 'root' })
export class ConnectionCheck {
  private readonly http = inject(HttpClient);

  tryNow(): void {
    // A failure needs no more than its note in Connection.
    this.http.get(readFront.path).subscribe({ error: () => undefined });
  }
}
