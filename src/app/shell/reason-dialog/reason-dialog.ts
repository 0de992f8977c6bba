import { ChangeDetectionStrategy, Component, inject } from '@angular/core';
import { FormControl, FormGroup, ReactiveFormsModule } from '@angular/forms';
import { MatButton } from '@angular/material/button';
import { MAT_DIALOG_DATA, MatDialogModule, MatDialogRef } from '@angular/material/dialog';
import { MatFormFieldModule } from '@angular/material/form-field';
import { MatInput } from '@angular/material/input';
import { type Observable } from 'rxjs';
import * as z from 'zod';
import { reason } from '#shared/contract/fields';
import { RecordSave } from '../../data/record-save';
import { formFieldDefaults } from '../../ui/material-defaults';
import { MessageNote } from '../../ui/states/message-note';
import { FieldErrorPipe } from '../../ui/values/field-error-pipe';

/** A step that needs a reason on record. */
export interface ReasonedStep {
  /** A question: "Cancel lot L-26-0412?" */
  readonly title: string;
  readonly text: readonly string[];
  /** The verb of the step: "Cancel lot". */
  readonly confirm: string;
  /** What the button that leaves says; "Cancel" where the step itself does not. */
  readonly leave?: string;
  readonly destructive?: boolean;
  take(reason: string): Observable<unknown>;
}

const schema = z.object({ reason });

/** Asks for the reason and takes the step; what the server refuses is said here. Closes with whether the step was taken. */
@Component({
  selector: 'qr-reason-dialog',
  imports: [FieldErrorPipe, MatButton, MatDialogModule, MatFormFieldModule, MatInput, MessageNote, ReactiveFormsModule],
  providers: [formFieldDefaults],
  templateUrl: './reason-dialog.html',
  styles: `
    mat-form-field {
      margin-top: 12px;
    }
    qr-message-note {
      margin-top: 12px;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ReasonDialog {
  private readonly dialog = inject<MatDialogRef<ReasonDialog, boolean>>(MatDialogRef);

  protected readonly step = inject<ReasonedStep>(MAT_DIALOG_DATA);
  protected readonly saving = new RecordSave();
  protected readonly form = new FormGroup({ reason: new FormControl('', { nonNullable: true }) });

  protected take(): void {
    this.saving.submit(this.form, {
      schema,
      value: this.form.getRawValue(),
      call: (body) => this.step.take(body.reason),
      saved: () => this.dialog.close(true),
    });
  }
}
