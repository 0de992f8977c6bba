import { type Injector } from '@angular/core';
import { WaitingShelf } from './waiting-shelf';

/** Sends what an earlier page left waiting on this device, whichever page is open now; loads the queue only for that. */
export async function resumeSending(injector: Injector): Promise<void> {
  if (injector.get(WaitingShelf).read().length === 0) return;
  const { ReadingQueue } = await import('./reading-queue');
  injector.get(ReadingQueue);
}
