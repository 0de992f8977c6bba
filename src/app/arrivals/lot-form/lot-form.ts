import { ChangeDetectionStrategy, Component, computed, effect, inject, input, output } from '@angular/core';
import { toSignal } from '@angular/core/rxjs-interop';
import { ReactiveFormsModule } from '@angular/forms';
import { MatFormFieldModule } from '@angular/material/form-field';
import { MatInput } from '@angular/material/input';
import { type MatSelect, MatSelectModule } from '@angular/material/select';
import { bookLot, correctLot, type Lot, lotBody, readLot } from '#shared/contract/lots';
import { listParts } from '#shared/contract/parts';
import { listSuppliers } from '#shared/contract/suppliers';
import { map } from 'rxjs';
import { ApiClient, endpointResource } from '../../data/api';
import { RecordForm } from '../../data/record-form';
import { ConflictNote } from '../../ui/conflict-note';
import { FormFoot } from '../../ui/form-foot';
import { MessageNote } from '../../ui/states/message-note';
import { CountPipe } from '../../ui/values/count-pipe';
import { FieldErrorPipe } from '../../ui/values/field-error-pipe';
import { countOf, LotFields } from './lot-fields';
import { SamplingPreview } from './sampling-preview';

/** Books a delivered lot in, or corrects the one it is given; the sampling it will get stands beside the fields. */
@Component({
  selector: 'qr-lot-form',
  imports: [
    ConflictNote,
    CountPipe,
    FieldErrorPipe,
    FormFoot,
    MatFormFieldModule,
    MatInput,
    MatSelectModule,
    MessageNote,
    ReactiveFormsModule,
    SamplingPreview,
  ],
  templateUrl: './lot-form.html',
  styleUrl: './lot-form.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class LotForm {
  private readonly api = inject(ApiClient);

  readonly lot = input<Lot | null>(null);
  readonly saved = output<Lot>();

  protected readonly form = new RecordForm(new LotFields(), () =>
    this.api.call(readLot, { params: { id: this.lot()?.id ?? 0 } }),
  );
  protected readonly controls = this.form.fields.group.controls;
  private readonly parts = endpointResource(listParts, () => ({}));
  private readonly suppliers = endpointResource(listSuppliers, () => ({}));

  protected readonly offeredParts = computed(() => {
    const parts = this.parts.hasValue() ? this.parts.value().items : [];
    return parts.filter((part) => part.active || part.id === this.lot()?.part.id);
  });
  protected readonly offeredSuppliers = computed(() => {
    const suppliers = this.suppliers.hasValue() ? this.suppliers.value().items : [];
    return suppliers.filter((supplier) => supplier.active || supplier.id === this.lot()?.supplier.id);
  });
  protected readonly listsFailed = computed(() => this.parts.error() ?? this.suppliers.error());

  private readonly typed = toSignal(
    this.form.fields.group.valueChanges.pipe(map(() => this.form.fields.group.getRawValue())),
    {
      initialValue: this.form.fields.group.getRawValue(),
    },
  );
  protected readonly counted = computed(() => countOf(this.typed().countedQuantity));
  protected readonly part = computed(() => this.offeredParts().find((part) => part.id === this.typed().partId));
  protected readonly difference = computed(() => {
    const stated = countOf(this.typed().statedQuantity);
    const counted = this.counted();
    return stated === null || counted === null ? 0 : counted - stated;
  });

  constructor() {
    effect(() => {
      const lot = this.lot();
      if (lot !== null) this.form.take(lot);
    });
  }

  hasUnsaved(): boolean {
    return this.form.hasUnsaved();
  }

  protected loadLists(): void {
    this.parts.reload();
    this.suppliers.reload();
  }

  protected save(first: MatSelect): void {
    const lot = this.lot();
    this.form.submit(
      lotBody,
      this.form.fields.value(),
      (body, version) =>
        lot === null
          ? this.api.call(bookLot, { body })
          : this.api.call(correctLot, { params: { id: lot.id }, body, version }),
      (saved) => {
        if (lot === null) {
          this.form.fields.next();
          first.focus();
        }
        this.saved.emit(saved);
      },
    );
  }
}
