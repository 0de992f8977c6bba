import { ChangeDetectionStrategy, Component, computed, inject } from '@angular/core';
import { toSignal } from '@angular/core/rxjs-interop';
import { FormControl, FormGroup, ReactiveFormsModule, Validators } from '@angular/forms';
import { MatButton } from '@angular/material/button';
import { MAT_DIALOG_DATA, MatDialogModule, MatDialogRef } from '@angular/material/dialog';
import { MatFormFieldModule } from '@angular/material/form-field';
import { MatInput } from '@angular/material/input';
import { type Observable } from 'rxjs';
import { ruleOnUnit } from '#shared/contract/bench';
import { RecordSave } from '../../../data/record-save';
import { formFieldDefaults } from '../../../ui/material-defaults';
import { Segmented } from '../../../ui/segmented';
import { MessageNote } from '../../../ui/states/message-note';
import { FieldErrorPipe } from '../../../ui/values/field-error-pipe';

export type Ruling = 'conforming' | 'nonconforming';

/** The unit that is ruled on, why it is undecided, and the ruling that stands. */
export interface RulingQuestion {
  readonly unit: number;
  readonly doubt: string;
  readonly standing: Ruling | null;
  rule(ruling: Ruling | null, reason: string): Observable<unknown>;
}

type Choice = Ruling | 'take-back';

/** Quality's ruling on an undecided unit, with its reason; a ruling that stands can be taken back. */
@Component({
  selector: 'qr-ruling-dialog',
  imports: [
    FieldErrorPipe,
    MatButton,
    MatDialogModule,
    MatFormFieldModule,
    MatInput,
    MessageNote,
    ReactiveFormsModule,
    Segmented,
  ],
  templateUrl: './ruling-dialog.html',
  styleUrl: './ruling-dialog.scss',
  providers: [formFieldDefaults],
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class RulingDialog {
  private readonly dialog = inject<MatDialogRef<RulingDialog, boolean>>(MatDialogRef);
  protected readonly question = inject<RulingQuestion>(MAT_DIALOG_DATA);

  protected readonly saving = new RecordSave();
  protected readonly form = new FormGroup({
    ruling: new FormControl<Choice | null>(this.question.standing === null ? null : 'take-back', Validators.required),
    reason: new FormControl('', { nonNullable: true }),
  });
  protected readonly choices: readonly { value: Choice; label: string }[] =
    this.question.standing === null
      ? [
          { value: 'conforming', label: 'Conforming' },
          { value: 'nonconforming', label: 'Nonconforming' },
        ]
      : [{ value: 'take-back', label: `Take back: ${this.question.standing}` }];
  private readonly chosen = toSignal(this.form.controls.ruling.valueChanges, {
    initialValue: this.form.controls.ruling.value,
  });
  protected readonly choice = computed(() => this.chosen() ?? '');

  protected take(): void {
    const { ruling } = this.form.getRawValue();
    this.saving.submit(this.form, {
      schema: ruleOnUnit.body,
      value: { ruling: ruling === 'take-back' ? null : ruling, reason: this.form.getRawValue().reason },
      call: (body) => this.question.rule(body.ruling, body.reason),
      saved: () => this.dialog.close(true),
    });
  }
}
