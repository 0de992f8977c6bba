import { ChangeDetectionStrategy, Component, inject } from '@angular/core';
import { FormControl, FormGroup, ReactiveFormsModule } from '@angular/forms';
import { MatButton } from '@angular/material/button';
import { MAT_DIALOG_DATA, MatDialogModule, MatDialogRef } from '@angular/material/dialog';
import { MatFormFieldModule } from '@angular/material/form-field';
import { MatInput } from '@angular/material/input';
import { type Assessment, decideLot, holdLot } from '#shared/contract/decision';
import { ApiClient } from '../../data/api';
import { type ApiProblem, problemOf } from '../../data/api-problem';
import { RecordSave } from '../../data/record-save';
import { MessageNote } from '../../ui/states/message-note';
import { PasswordField } from '../../ui/password-field';
import { FieldErrorPipe } from '../../ui/values/field-error-pipe';
import { catchError, throwError } from 'rxjs';
import { signingWords } from './signing-words';

/** What is to be signed, and with which stamp. */
export interface Signing {
  readonly kind: 'release' | 'reject' | 'hold';
  readonly assessment: Assessment;
  readonly stamp: string | null;
}

const VERBS = { release: 'Release lot', reject: 'Reject lot', hold: 'Hold lot' } as const;

/** Problems after which the shown assessment is no longer what would be signed. */
const OVERTAKEN: readonly string[] = ['verdict-changed', 'lot-not-submitted'];

/**
 * States the numbers, the consequence and the stamp, and asks for the password. Closes with `signed`, or with `overtaken`
 * when the lot has changed since it was shown.
 */
@Component({
  selector: 'qr-sign-dialog',
  imports: [
    FieldErrorPipe,
    MatButton,
    MatDialogModule,
    MatFormFieldModule,
    MatInput,
    MessageNote,
    PasswordField,
    ReactiveFormsModule,
  ],
  templateUrl: './sign-dialog.html',
  styleUrl: './sign-dialog.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class SignDialog {
  private readonly api = inject(ApiClient);
  private readonly dialog = inject<MatDialogRef<SignDialog, 'signed' | 'overtaken'>>(MatDialogRef);

  protected readonly signing = inject<Signing>(MAT_DIALOG_DATA);
  protected readonly verb = VERBS[this.signing.kind];
  protected readonly lot = this.signing.assessment.lot;
  protected readonly consequence = signingWords(this.signing.assessment)[this.signing.kind];
  protected readonly saving = new RecordSave();
  protected overtaken = false;

  protected readonly form = new FormGroup({
    reason: new FormControl('', { nonNullable: true }),
    note: new FormControl('', { nonNullable: true }),
    password: new FormControl('', { nonNullable: true }),
  });

  protected sign(): void {
    const saved = () => this.dialog.close('signed');
    const value = this.form.getRawValue();
    const { id, version } = this.lot;
    const sent = { params: { id }, version };
    if (this.signing.kind === 'hold') {
      const call = (body: { password: string; reason: string }) =>
        this.watched(this.api.call(holdLot, { ...sent, body }));
      this.saving.submit(this.form, { schema: holdLot.body, value, call, saved });
      return;
    }
    const verdict = this.signing.kind === 'release' ? 'accepted' : 'rejected';
    this.saving.submit(this.form, {
      schema: decideLot.body,
      value: { ...value, verdict },
      call: (body) => this.watched(this.api.call(decideLot, { ...sent, body })),
      saved,
    });
  }

  /** After a lost race nothing can be signed here: the person looks at the lot as it is now. */
  private watched(call: ReturnType<ApiClient['call']>) {
    return call.pipe(
      catchError((thrown: unknown) => {
        const problem: ApiProblem = problemOf(thrown);
        this.overtaken = problem.status === 412 || OVERTAKEN.includes(problem.code);
        return throwError(() => problem);
      }),
    );
  }
}
