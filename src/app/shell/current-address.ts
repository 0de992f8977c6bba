import { inject, type Signal } from '@angular/core';
import { toSignal } from '@angular/core/rxjs-interop';
import { NavigationEnd, Router } from '@angular/router';
import { filter, map } from 'rxjs';

/** The first part of the address that is shown, without the slash: "arrivals". */
export function currentArea(): Signal<string> {
  const router = inject(Router);
  const area = (url: string) => /^\/([^/?#]*)/.exec(url)?.[1] ?? '';
  const arrived = router.events.pipe(
    filter((event) => event instanceof NavigationEnd),
    map((event) => area(event.urlAfterRedirects)),
  );
  return toSignal(arrived, { initialValue: area(router.url) });
}
