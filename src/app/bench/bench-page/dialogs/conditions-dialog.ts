import { ChangeDetectionStrategy, Component, inject } from '@angular/core';
import { FormControl, FormGroup, ReactiveFormsModule } from '@angular/forms';
import { MatButton } from '@angular/material/button';
import { MAT_DIALOG_DATA, MatDialogModule, MatDialogRef } from '@angular/material/dialog';
import { MatFormFieldModule } from '@angular/material/form-field';
import { MatInput } from '@angular/material/input';
import { lotConditions, type LotConditions } from '#shared/contract/conditions';
import { RecordSave } from '../../../data/record-save';
import { formFieldDefaults } from '../../../ui/material-defaults';
import { QuantityField } from '../../../ui/quantity-field/quantity-field';
import { MessageNote } from '../../../ui/states/message-note';
import { FieldErrorPipe } from '../../../ui/values/field-error-pipe';
import { MomentPipe } from '../../../ui/values/moment-pipe';
import { type ConditionNotes } from '../condition-notes';
import { type WarmUp } from '../warm-up';

/** What the dialog works with: it lives outside of the bench's own injector. */
export interface ConditionsQuestion {
  readonly lotNumber: string;
  readonly notes: ConditionNotes;
  readonly warmUp: WarmUp;
  /** When and by whom the conditions were noted last; null before anybody did. */
  readonly noted: { readonly notedAt: string; readonly notedBy: string } | null;
}

/** What the lot is measured under: room, mains, load, bandwidth, warm-up. Printed with the readings. */
@Component({
  selector: 'qr-conditions-dialog',
  imports: [
    FieldErrorPipe,
    MatButton,
    MatDialogModule,
    MatFormFieldModule,
    MatInput,
    MessageNote,
    MomentPipe,
    QuantityField,
    ReactiveFormsModule,
  ],
  templateUrl: './conditions-dialog.html',
  styleUrl: './conditions-dialog.scss',
  providers: [formFieldDefaults],
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ConditionsDialog {
  private readonly dialog = inject<MatDialogRef<ConditionsDialog>>(MatDialogRef);
  protected readonly question = inject<ConditionsQuestion>(MAT_DIALOG_DATA);
  private readonly before = this.question.notes.current();

  protected readonly saving = new RecordSave();
  protected readonly starting = new RecordSave();
  protected readonly form = new FormGroup({
    ambientCelsius: new FormControl(this.before.ambientCelsius),
    mainsVolts: new FormControl(this.before.mainsVolts),
    mainsHertz: new FormControl(this.before.mainsHertz),
    load: new FormControl(this.before.load, { nonNullable: true }),
    bandwidth: new FormControl(this.before.bandwidth, { nonNullable: true }),
    note: new FormControl(this.before.note, { nonNullable: true }),
  });

  protected save(): void {
    this.saving.submit(this.form, {
      schema: lotConditions,
      value: { ...this.form.getRawValue(), warmUpStartedAt: this.question.notes.current().warmUpStartedAt },
      call: (conditions: LotConditions) => this.question.notes.note(conditions),
      saved: () => this.dialog.close(),
    });
  }

  protected startWarmUp(): void {
    this.starting.run(this.question.notes.startWarmUp(), () => undefined);
  }
}
