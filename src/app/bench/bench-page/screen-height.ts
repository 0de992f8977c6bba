import { BreakpointObserver } from '@angular/cdk/layout';
import { inject, type Signal } from '@angular/core';
import { toSignal } from '@angular/core/rxjs-interop';
import { map } from 'rxjs';

/** Whether the screen is lower than so many px. */
export function lowerThan(height: number): Signal<boolean> {
  const query = `(max-height: ${height - 1}px)`;
  const seen = inject(BreakpointObserver);
  const matches = seen.observe(query).pipe(map((state) => state.matches));
  return toSignal(matches, { initialValue: seen.isMatched(query) });
}
