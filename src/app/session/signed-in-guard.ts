import { inject } from '@angular/core';
import { type CanMatchFn, RedirectCommand, Router } from '@angular/router';
import { catchError, map, of } from 'rxjs';
import { Session } from './session';

/**
 * Lets signed-in people pass; others sign in first and then come back to the address they wanted. So do those of whom the
 * server could not say who they are: the sign-in page tells whether it can be reached.
 */
export const signedInGuard: CanMatchFn = () => {
  const router = inject(Router);
  const wanted = router.currentNavigation()?.extractedUrl.toString() ?? '/';
  return inject(Session)
    .restore()
    .pipe(
      catchError(() => of(null)),
      map((me) => {
        if (me !== null) return true;
        const queryParams = wanted === '/' ? {} : { back: wanted };
        return new RedirectCommand(router.createUrlTree(['/sign-in'], { queryParams }), { replaceUrl: true });
      }),
    );
};
