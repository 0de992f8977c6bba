import { Injectable } from '@angular/core';
import { type WaitingAct, waitingActOf } from './bench-act';

const PREFIX = 'quietrail.waiting.';

/** Keeps waiting acts on this device, one entry each, so that a reload or a crash loses none and tabs do not overwrite. */
@Injectable({ providedIn: 'root' })
export class WaitingShelf {
  /** All acts written down and not yet acknowledged, in the order they were done. */
  read(): WaitingAct[] {
    const keys = this.attempt(() => Object.keys(localStorage), []).filter((key) => key.startsWith(PREFIX));
    const acts = keys.map((key) => this.attempt(() => waitingActOf(JSON.parse(localStorage.getItem(key) ?? '')), null));
    return acts.filter((act) => act !== null).sort((one, other) => one.order - other.order);
  }

  /** Whether the act is written down; false where the browser keeps nothing or is full. */
  write(waiting: WaitingAct): boolean {
    return this.attempt(() => {
      localStorage.setItem(PREFIX + waiting.act.id, JSON.stringify(waiting));
      return true;
    }, false);
  }

  remove(id: string): void {
    this.attempt(() => localStorage.removeItem(PREFIX + id), undefined);
  }

  /** Storage may be switched off or full; reading it then throws. */
  private attempt<T>(work: () => T, otherwise: T): T {
    try {
      return work();
    } catch {
      return otherwise;
    }
  }
}
