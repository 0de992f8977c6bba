import { ChangeDetectionStrategy, Component, computed, effect, inject, input, output } from '@angular/core';
import { toSignal } from '@angular/core/rxjs-interop';
import { ReactiveFormsModule } from '@angular/forms';
import { MatCheckbox } from '@angular/material/checkbox';
import { MatFormFieldModule } from '@angular/material/form-field';
import { MatInput } from '@angular/material/input';
import { MatSelectModule } from '@angular/material/select';
import { listParts } from '#shared/contract/parts';
import { addRack, changeRack, type Rack, rackBody, readRack } from '#shared/contract/racks';
import { ApiClient, endpointResource } from '../../data/api';
import { RecordForm } from '../../data/record-form';
import { ConflictNote } from '../../ui/conflict-note';
import { FormFoot } from '../../ui/form-foot';
import { FieldErrorPipe } from '../../ui/values/field-error-pipe';
import { ColumnsField } from './columns-field';
import { RackFields } from './rack-fields';

/** Adds a rack, or changes the one it is given. */
@Component({
  selector: 'qr-rack-form',
  imports: [
    ColumnsField,
    ConflictNote,
    FieldErrorPipe,
    FormFoot,
    MatCheckbox,
    MatFormFieldModule,
    MatInput,
    MatSelectModule,
    ReactiveFormsModule,
  ],
  templateUrl: './rack-form.html',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class RackForm {
  private readonly api = inject(ApiClient);

  readonly rack = input<Rack | null>(null);
  readonly saved = output<Rack>();

  protected readonly form = new RecordForm(new RackFields(), () =>
    this.api.call(readRack, { params: { id: this.rack()?.id ?? 0 } }),
  );
  protected readonly controls = this.form.fields.group.controls;
  private readonly parts = endpointResource(listParts, () => ({}));
  /** Parts in use, and those the rack is bound to already. */
  protected readonly offered = computed(() => {
    const bound = this.rack()?.parts ?? [];
    if (!this.parts.hasValue()) return bound;
    const taken = new Set(bound.map(({ id }) => id));
    return this.parts.value().items.filter(({ id, active }) => active || taken.has(id));
  });
  private readonly chosen = toSignal(this.controls.partIds.valueChanges, { initialValue: [] });
  /** The chosen parts by their numbers. */
  protected readonly bound = computed(() => {
    const chosen = new Set(this.chosen());
    const numbers = this.offered().flatMap(({ id, number }) => (chosen.has(id) ? [number] : []));
    return numbers.join(', ');
  });
  private shown: number | undefined;

  constructor() {
    effect(() => {
      const rack = this.rack();
      // A token that is issued or revoked edits nothing here: what was typed stays.
      if (rack !== null && rack.version !== this.shown) this.form.take(rack);
      this.shown = rack?.version;
    });
    effect(() => {
      this.form.fields.partNumbers = new Map(this.offered().map(({ id, number }) => [id, number]));
    });
  }

  hasUnsaved(): boolean {
    return this.form.hasUnsaved();
  }

  protected save(): void {
    const rack = this.rack();
    this.form.submit(
      rackBody,
      this.form.fields.value(),
      (body, version) =>
        rack === null
          ? this.api.call(addRack, { body })
          : this.api.call(changeRack, { params: { id: rack.id }, body, version }),
      (saved) => this.saved.emit(saved),
    );
  }
}
