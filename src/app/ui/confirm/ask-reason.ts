import { inject, Injectable } from '@angular/core';
import { MatDialog } from '@angular/material/dialog';
import { filter, type Observable } from 'rxjs';
import { ReasonDialog, type ReasonedStep } from './reason-dialog';

/** Asks for the reason of a step that goes on record. Emits the reason, or nothing when the person cancels. */
@Injectable({ providedIn: 'root' })
export class AskReason {
  private readonly dialog = inject(MatDialog);

  ask(step: ReasonedStep): Observable<string> {
    return this.dialog
      .open<ReasonDialog, ReasonedStep, string>(ReasonDialog, { data: step })
      .afterClosed()
      .pipe(filter((reason): reason is string => reason !== undefined && reason !== ''));
  }
}
