import { ChangeDetectionStrategy, Component, effect, inject, input, output } from '@angular/core';
import { ReactiveFormsModule } from '@angular/forms';
import { MatCheckbox } from '@angular/material/checkbox';
import { MatFormFieldModule } from '@angular/material/form-field';
import { MatInput } from '@angular/material/input';
import { addSupplier, changeSupplier, readSupplier, type Supplier, supplierBody } from '#shared/contract/suppliers';
import { ApiClient } from '../../data/api';
import { RecordForm } from '../../data/record-form';
import { ConflictNote } from '../../ui/conflict-note';
import { FormFoot } from '../../ui/form-foot';
import { FieldErrorPipe } from '../../ui/values/field-error-pipe';
import { SupplierFields } from './supplier-fields';

/** Adds a supplier, or changes the one it is given. */
@Component({
  selector: 'qr-supplier-form',
  imports: [ConflictNote, FieldErrorPipe, FormFoot, MatCheckbox, MatFormFieldModule, MatInput, ReactiveFormsModule],
  templateUrl: './supplier-form.html',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class SupplierForm {
  private readonly api = inject(ApiClient);

  readonly supplier = input<Supplier | null>(null);
  readonly saved = output<Supplier>();

  protected readonly form = new RecordForm(new SupplierFields(), () =>
    this.api.call(readSupplier, { params: { id: this.supplier()?.id ?? 0 } }),
  );
  protected readonly controls = this.form.fields.group.controls;

  constructor() {
    effect(() => {
      const supplier = this.supplier();
      if (supplier !== null) this.form.take(supplier);
    });
  }

  hasUnsaved(): boolean {
    return this.form.hasUnsaved();
  }

  protected save(): void {
    const supplier = this.supplier();
    this.form.submit(
      supplierBody,
      this.form.fields.value(),
      (body, version) =>
        supplier === null
          ? this.api.call(addSupplier, { body })
          : this.api.call(changeSupplier, { params: { id: supplier.id }, body, version }),
      (saved) => this.saved.emit(saved),
    );
  }
}
