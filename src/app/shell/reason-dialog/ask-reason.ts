import { inject, Injectable } from '@angular/core';
import { MatDialog } from '@angular/material/dialog';
import { map, type Observable } from 'rxjs';
import { ReasonDialog, type ReasonedStep } from './reason-dialog';

/** Takes a step with its reason. Completes with whether it was taken. */
@Injectable({ providedIn: 'root' })
export class AskReason {
  private readonly dialog = inject(MatDialog);

  ask(step: ReasonedStep): Observable<boolean> {
    return this.dialog
      .open<ReasonDialog, ReasonedStep, boolean>(ReasonDialog, { data: step, autoFocus: 'textarea' })
      .afterClosed()
      .pipe(map((taken) => taken === true));
  }
}
