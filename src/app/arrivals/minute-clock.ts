import { DestroyRef, inject, type Signal, signal } from '@angular/core';

const TICK = 30_000;

/** The time of day for waiting times that run on; ticks often enough that no shown minute is missed. */
export function minuteClock(): Signal<Date> {
  const now = signal(new Date());
  const ticking = setInterval(() => now.set(new Date()), TICK);
  inject(DestroyRef).onDestroy(() => clearInterval(ticking));
  return now.asReadonly();
}
