import { type HttpInterceptorFn } from '@angular/common/http';
import { inject } from '@angular/core';
import { catchError, switchMap, throwError } from 'rxjs';
import { signIn } from '#shared/contract/session';
import { problemOf } from './api-problem';
import { SessionRenewal } from './session-renewal';

/** A call that is refused because the session has run out renews it and is tried once more. */
export const renewalInterceptor: HttpInterceptorFn = (request, next) => {
  const renewal = inject(SessionRenewal);
  const signsIn = request.method === signIn.method && request.url === signIn.path;
  return next(request).pipe(
    catchError((thrown: unknown) => {
      const refused = problemOf(thrown);
      const mayRenew = refused.status === 401 && !signsIn;
      if (!mayRenew) return throwError(() => refused);
      return renewal.renew().pipe(switchMap(() => next(request)));
    }),
  );
};
