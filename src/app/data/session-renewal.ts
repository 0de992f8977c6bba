import { HttpBackend, HttpClient } from '@angular/common/http';
import { inject, Injectable } from '@angular/core';
import { catchError, defer, finalize, from, type Observable, shareReplay, throwError } from 'rxjs';
import { refreshSession } from '#shared/contract/session';
import { problemOf } from './api-problem';

const LOCK = 'quietrail.session';

/**
 * Renews the session when its short-lived part has run out. Calls that fail together wait for one renewal. Tabs take turns,
 * because each renewal uses up the token before it and a token that is used twice ends the session.
 */
@Injectable({ providedIn: 'root' })
export class SessionRenewal {
  private readonly http = new HttpClient(inject(HttpBackend));
  private running: Observable<unknown> | undefined;

  /** Asks the person to sign in again where they are; set by the session, which knows who is signed in. */
  signInAgain: (() => Observable<unknown>) | undefined;

  /** Completes when calls may be tried again; fails when the session is over. */
  renew(): Observable<unknown> {
    this.running ??= defer(() => this.renewOnce()).pipe(
      finalize(() => (this.running = undefined)),
      shareReplay({ bufferSize: 1, refCount: false }),
    );
    return this.running;
  }

  private renewOnce(): Observable<unknown> {
    return from(inTurn(() => this.post())).pipe(
      catchError((thrown: unknown) => {
        const problem = problemOf(thrown);
        const over = problem.status === 401 || problem.status === 403;
        return over && this.signInAgain !== undefined ? this.signInAgain() : throwError(() => problem);
      }),
    );
  }

  private post(): Promise<unknown> {
    return new Promise((resolve, reject) => {
      this.http.request(refreshSession.method, refreshSession.path).subscribe({ next: resolve, error: reject });
    });
  }
}

/** Runs one renewal at a time in all tabs of this browser, where the browser can do that. */
function inTurn(renew: () => Promise<unknown>): Promise<unknown> {
  return 'locks' in navigator ? navigator.locks.request(LOCK, renew) : renew();
}
