import { ChangeDetectionStrategy, Component, computed, inject, signal } from '@angular/core';
import { toSignal } from '@angular/core/rxjs-interop';
import { ReactiveFormsModule } from '@angular/forms';
import { MatButton } from '@angular/material/button';
import { MAT_DIALOG_DATA, MatDialogModule, MatDialogRef } from '@angular/material/dialog';
import { MatFormFieldModule } from '@angular/material/form-field';
import { MatInput } from '@angular/material/input';
import { MatSelectModule } from '@angular/material/select';
import { map } from 'rxjs';
import { type Instrument, rangeBody, RANGE_UNITS } from '#shared/contract/instruments';
import { accuracyText } from '#shared/uncertainty/accuracy-text';
import { RecordSave } from '../../data/record-save';
import { formFieldDefaults } from '../../ui/material-defaults';
import { QuantityField } from '../../ui/quantity-field/quantity-field';
import { Segmented } from '../../ui/segmented';
import { MessageNote } from '../../ui/states/message-note';
import { FieldErrorPipe } from '../../ui/values/field-error-pipe';
import { ChangeRanges } from './change-ranges';
import { RangeFields } from './range-fields';

/** Adds a range with its accuracy specification. Closes with the instrument as it then is. */
@Component({
  selector: 'qr-range-dialog',
  imports: [
    FieldErrorPipe,
    MatButton,
    MatDialogModule,
    MatFormFieldModule,
    MatInput,
    MatSelectModule,
    MessageNote,
    QuantityField,
    ReactiveFormsModule,
    Segmented,
  ],
  providers: [formFieldDefaults],
  templateUrl: './range-dialog.html',
  styleUrl: './range-dialog.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class RangeDialog {
  private readonly dialog = inject<MatDialogRef<RangeDialog, Instrument>>(MatDialogRef);
  private readonly changes = new ChangeRanges();

  protected readonly instrument = inject<Instrument>(MAT_DIALOG_DATA);
  protected readonly saving = new RecordSave();
  protected readonly fields = new RangeFields(this.instrument.kind);
  protected readonly controls = this.fields.group.controls;
  protected readonly units = RANGE_UNITS;
  protected readonly forms = [
    { value: 'digital' as const, label: 'Digits' },
    { value: 'graticule' as const, label: 'Graticule of a screen' },
  ];

  protected readonly form = signal(this.controls.form.value);
  private readonly typed = toSignal(this.fields.group.events.pipe(map(() => this.fields.group.getRawValue())), {
    initialValue: this.fields.group.getRawValue(),
  });
  protected readonly unit = computed(() => this.typed().unit);
  protected readonly hasCurrent = computed(() => ['V', 'A'].includes(this.typed().unit));
  /** What was typed, as a maker's data sheet would say it. */
  protected readonly accuracy = computed(() => {
    this.typed();
    const range = this.fields.whole();
    return range === null ? '' : accuracyText({ ...range, id: 0 });
  });

  protected choose(form: 'digital' | 'graticule'): void {
    this.form.set(form);
    this.controls.form.setValue(form);
  }

  protected add(): void {
    this.saving.submit(this.fields.group, {
      schema: rangeBody,
      value: this.fields.value(),
      call: (range) => this.changes.add(this.instrument.id, range),
      saved: (instrument) => this.dialog.close(instrument),
    });
  }
}
