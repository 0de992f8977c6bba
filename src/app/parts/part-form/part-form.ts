import { ChangeDetectionStrategy, Component, computed, effect, inject, input, output } from '@angular/core';
import { toSignal } from '@angular/core/rxjs-interop';
import { ReactiveFormsModule } from '@angular/forms';
import { MatCheckbox } from '@angular/material/checkbox';
import { MatFormFieldModule } from '@angular/material/form-field';
import { MatInput } from '@angular/material/input';
import { MatSelectModule } from '@angular/material/select';
import { addPart, changePart, FORM_TITLES, FORMS, type Part, partBody, readPart } from '#shared/contract/parts';
import { ApiClient } from '../../data/api';
import { RecordForm } from '../../data/record-form';
import { ConflictNote } from '../../ui/conflict-note';
import { FormFoot } from '../../ui/form-foot';
import { FieldErrorPipe } from '../../ui/values/field-error-pipe';
import { ElectricalFields } from './electrical-fields';
import { PartFields } from './part-fields';

/** Adds a part, or changes the one it is given. */
@Component({
  selector: 'qr-part-form',
  imports: [
    ConflictNote,
    ElectricalFields,
    FieldErrorPipe,
    FormFoot,
    MatCheckbox,
    MatFormFieldModule,
    MatInput,
    MatSelectModule,
    ReactiveFormsModule,
  ],
  templateUrl: './part-form.html',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class PartForm {
  private readonly api = inject(ApiClient);

  readonly part = input<Part | null>(null);
  readonly saved = output<Part>();

  protected readonly forms = FORMS.map((form) => ({ form, title: FORM_TITLES[form] }));
  protected readonly form = new RecordForm(new PartFields(), () =>
    this.api.call(readPart, { params: { id: this.part()?.id ?? 0 } }),
  );
  protected readonly controls = this.form.fields.group.controls;

  private readonly topology = toSignal(this.controls.model.controls.topology.valueChanges, {
    initialValue: this.controls.model.controls.topology.value,
  });
  protected readonly rectifies = computed(() => this.topology() !== 'switch-mode');

  constructor() {
    effect(() => {
      const part = this.part();
      if (part !== null) this.form.take(part);
    });
  }

  hasUnsaved(): boolean {
    return this.form.hasUnsaved();
  }

  protected save(): void {
    const part = this.part();
    this.form.submit(
      partBody,
      this.form.fields.value(),
      (body, version) =>
        part === null
          ? this.api.call(addPart, { body })
          : this.api.call(changePart, { params: { id: part.id }, body, version }),
      (saved) => this.saved.emit(saved),
    );
  }
}
