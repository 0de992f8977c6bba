import { computed, inject, Injectable, Injector, signal } from '@angular/core';
import { Router } from '@angular/router';
import { catchError, defer, from, type Observable, of, switchMap, tap, throwError } from 'rxjs';
import { type Who } from '#shared/contract/endpoint';
import { type Role } from '#shared/contract/roles';
import { type Me, readMe, signIn, signOut } from '#shared/contract/session';
import { ApiClient, type CallInput } from '../data/api';
import { ApiProblem } from '../data/api-problem';
import { SessionRenewal } from '../data/session-renewal';

/** Who is signed in at this browser. */
@Injectable({ providedIn: 'root' })
export class Session {
  private readonly api = inject(ApiClient);
  private readonly router = inject(Router);
  private readonly injector = inject(Injector);
  private readonly person = signal<Me | null>(null);
  private readonly roles = computed(() => new Set(this.person()?.roles));

  readonly me = this.person.asReadonly();

  constructor() {
    inject(SessionRenewal).signInAgain = () => this.signInAgain();
  }

  /** Who is signed in; asks the server when this browser does not know yet. */
  restore(): Observable<Me | null> {
    return defer(() => (this.person() === null ? this.askServer() : of(this.person())));
  }

  /** Whether the person holds one of the roles. */
  holds(...roles: readonly Role[]): boolean {
    return roles.some((role) => this.roles().has(role));
  }

  /** Whether the person is among those whom the contract lets call an endpoint. */
  mayCall({ who }: { readonly who: Who }): boolean {
    if (who === 'anyone') return true;
    if (who === 'rack') return false;
    return who === 'signed-in' ? this.person() !== null : this.holds(...who);
  }

  signIn(body: CallInput<typeof signIn>['body']): Observable<Me> {
    return this.api.call(signIn, { body }).pipe(tap((me) => this.person.set(me)));
  }

  signOut(): Observable<unknown> {
    return this.api.call(signOut, {}).pipe(tap(() => this.leave()));
  }

  private askServer(): Observable<Me | null> {
    return this.api.call(readMe, {}).pipe(
      tap((me) => this.person.set(me)),
      catchError((thrown: unknown) => {
        const signedOut = thrown instanceof ApiProblem && thrown.status === 401;
        return signedOut ? of(null) : throwError(() => thrown);
      }),
    );
  }

  /**
   * The session ran out while the person was working: asks for the password over the page, so that nothing typed is lost.
   * When the person gives up, the sign-in page remembers where they were.
   */
  private signInAgain(): Observable<unknown> {
    const over = new ApiProblem({ title: 'Your session has ended.', status: 401, code: 'signed-out' }, new Date());
    const me = this.person();
    if (me === null) return throwError(() => over);
    const asked = from(import('./sign-in-again/ask-again')).pipe(
      switchMap(({ askAgain }) => askAgain(this.injector, me)),
    );
    return asked.pipe(
      switchMap((again) => {
        if (again !== undefined) return of(again);
        this.leave(this.router.url);
        return throwError(() => over);
      }),
    );
  }

  private leave(returnTo?: string): void {
    this.person.set(null);
    void this.router.navigate(['/sign-in'], { queryParams: { back: returnTo } });
  }
}
