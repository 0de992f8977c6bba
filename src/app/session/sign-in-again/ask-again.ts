import { type Injector } from '@angular/core';
import { MatDialog } from '@angular/material/dialog';
import { type Observable } from 'rxjs';
import { type Me } from '#shared/contract/session';
import { SignInAgain } from './sign-in-again';

/** Opens the dialog that asks for the password again; yields the person, or nothing when they gave up. */
export function askAgain(injector: Injector, me: Me): Observable<Me | undefined> {
  return injector
    .get(MatDialog)
    .open<SignInAgain, Me, Me>(SignInAgain, { data: me, disableClose: true, width: '400px' })
    .afterClosed();
}
