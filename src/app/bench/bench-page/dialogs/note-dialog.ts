import { ChangeDetectionStrategy, Component, inject, signal } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { MAT_DIALOG_DATA, MatDialogModule, MatDialogRef } from '@angular/material/dialog';
import { MatFormFieldModule } from '@angular/material/form-field';
import { MatInput } from '@angular/material/input';
import { formFieldDefaults } from '../../../ui/material-defaults';

/** What the note is on, and what it says so far. */
export interface NoteQuestion {
  readonly what: string;
  readonly note: string;
}

/** Takes the note that goes with the reading being typed. */
@Component({
  selector: 'qr-note-dialog',
  imports: [MatButton, MatDialogModule, MatFormFieldModule, MatInput],
  template: `
    <form (submit)="dialog.close(note().trim()); $event.preventDefault()" novalidate>
      <h2 mat-dialog-title>Note</h2>
      <mat-dialog-content>
        <p>{{ question.what }}. The note is kept with the reading.</p>
        <mat-form-field>
          <mat-label>Note</mat-label>
          <input matInput #text type="text" maxlength="300" [value]="note()" (input)="note.set(text.value)" />
        </mat-form-field>
      </mat-dialog-content>
      <mat-dialog-actions>
        <button type="button" matButton mat-dialog-close>Cancel</button>
        <button type="submit" matButton="filled">Add note</button>
      </mat-dialog-actions>
    </form>
  `,
  styles: `
    mat-form-field {
      margin-top: 12px;
    }
  `,
  providers: [formFieldDefaults],
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class NoteDialog {
  protected readonly dialog = inject<MatDialogRef<NoteDialog, string>>(MatDialogRef);
  protected readonly question = inject<NoteQuestion>(MAT_DIALOG_DATA);
  protected readonly note = signal(this.question.note);
}
