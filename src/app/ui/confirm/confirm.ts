import { inject, Injectable } from '@angular/core';
import { MatDialog } from '@angular/material/dialog';
import { map, type Observable } from 'rxjs';
import { ConfirmDialog, type Confirmation } from './confirm-dialog';

/** Asks before a step with consequences. Completes with whether the person confirmed it. */
@Injectable({ providedIn: 'root' })
export class Confirm {
  private readonly dialog = inject(MatDialog);

  ask(confirmation: Confirmation): Observable<boolean> {
    return this.dialog
      .open<ConfirmDialog, Confirmation, boolean>(ConfirmDialog, { data: confirmation, autoFocus: '.cancel' })
      .afterClosed()
      .pipe(map((confirmed) => confirmed === true));
  }
}
