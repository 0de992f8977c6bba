import { ChangeDetectionStrategy, Component, inject } from '@angular/core';
import { FormControl, ReactiveFormsModule, Validators } from '@angular/forms';
import { MatButton } from '@angular/material/button';
import { MAT_DIALOG_DATA, MatDialogModule, MatDialogRef } from '@angular/material/dialog';
import { MatFormFieldModule } from '@angular/material/form-field';
import { MatInput } from '@angular/material/input';

/** A step that goes on record with a reason: what it is, and what follows from it. */
export interface ReasonedStep {
  readonly title: string;
  readonly text: readonly string[];
  /** The verb of the step. */
  readonly confirm: string;
}

/** A few words at least. */
const LEAST = 3;
const MOST = 500;

/** The dialog behind `AskReason`. */
@Component({
  selector: 'qr-reason-dialog',
  imports: [MatButton, MatDialogModule, MatFormFieldModule, MatInput, ReactiveFormsModule],
  template: `
    <h2 mat-dialog-title>{{ step.title }}</h2>
    <form (ngSubmit)="give()">
      <mat-dialog-content>
        @for (sentence of step.text; track $index) {
          <p>{{ sentence }}</p>
        }
        <mat-form-field>
          <mat-label>Reason</mat-label>
          <textarea matInput rows="3" [formControl]="reason" cdkFocusInitial></textarea>
          <mat-error>Say why in a few words, at most {{ most }} characters.</mat-error>
        </mat-form-field>
      </mat-dialog-content>
      <mat-dialog-actions>
        <button type="button" matButton mat-dialog-close>Cancel</button>
        <button type="submit" matButton="filled">{{ step.confirm }}</button>
      </mat-dialog-actions>
    </form>
  `,
  styles: `
    mat-form-field {
      margin-top: 12px;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ReasonDialog {
  private readonly dialog = inject<MatDialogRef<ReasonDialog, string>>(MatDialogRef);

  protected readonly step = inject<ReasonedStep>(MAT_DIALOG_DATA);
  protected readonly most = MOST;
  protected readonly reason = new FormControl('', {
    nonNullable: true,
    validators: [Validators.required, Validators.minLength(LEAST), Validators.maxLength(MOST)],
  });

  protected give(): void {
    this.reason.markAsTouched();
    if (this.reason.valid) this.dialog.close(this.reason.value.trim());
  }
}
