import { ChangeDetectionStrategy, Component, effect, inject, input, output } from '@angular/core';
import { toSignal } from '@angular/core/rxjs-interop';
import { ReactiveFormsModule } from '@angular/forms';
import { MatCheckbox } from '@angular/material/checkbox';
import { MatFormFieldModule } from '@angular/material/form-field';
import { MatInput } from '@angular/material/input';
import { MatSelectModule } from '@angular/material/select';
import { map, tap } from 'rxjs';
import type * as z from 'zod';
import {
  addInstrument,
  changeInstrument,
  type Instrument,
  INSTRUMENT_KIND_TITLES,
  INSTRUMENT_KINDS,
  RANGE_UNITS,
  readInstrument,
} from '#shared/contract/instruments';
import { ApiClient } from '../../data/api';
import { RecordForm } from '../../data/record-form';
import { ConflictNote } from '../../ui/conflict-note';
import { FormFoot } from '../../ui/form-foot';
import { QuantityField } from '../../ui/quantity-field/quantity-field';
import { FieldErrorPipe } from '../../ui/values/field-error-pipe';
import { InstrumentFields, STATUS_TITLES } from './instrument-fields';

/** Adds an instrument, or changes the one it is given. */
@Component({
  selector: 'qr-instrument-form',
  imports: [
    ConflictNote,
    FieldErrorPipe,
    FormFoot,
    MatCheckbox,
    MatFormFieldModule,
    MatInput,
    MatSelectModule,
    QuantityField,
    ReactiveFormsModule,
  ],
  templateUrl: './instrument-form.html',
  styleUrl: './instrument-form.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class InstrumentForm {
  private readonly api = inject(ApiClient);

  readonly instrument = input<Instrument | null>(null);
  readonly saved = output<Instrument>();

  protected readonly kinds = INSTRUMENT_KINDS.map((kind) => ({ kind, title: INSTRUMENT_KIND_TITLES[kind] }));
  protected readonly statusTitles = STATUS_TITLES;
  protected readonly units = RANGE_UNITS;
  private readonly fields = new InstrumentFields();
  protected readonly form = new RecordForm(this.fields, () =>
    this.api
      .call(readInstrument, { params: { id: this.instrument()?.id ?? 0 } })
      // Whichever values win, ranges that were added or retired meanwhile stay so.
      .pipe(tap(({ ranges }) => (this.fields.ranges = ranges))),
  );
  protected readonly controls = this.fields.group.controls;
  protected readonly reference = this.fields.reference.controls;
  protected readonly isChecked = toSignal(
    this.controls.isChecked.events.pipe(map(() => this.controls.isChecked.value)),
  );
  protected readonly referenceUnit = toSignal(this.reference.unit.events.pipe(map(() => this.reference.unit.value)), {
    initialValue: 'V' as const,
  });

  constructor() {
    effect(() => {
      const instrument = this.instrument();
      if (instrument !== null) this.form.take(instrument);
    });
  }

  hasUnsaved(): boolean {
    return this.form.hasUnsaved();
  }

  protected save(): void {
    const instrument = this.instrument();
    const saved = (stored: Instrument) => this.saved.emit(stored);
    const value = this.fields.value();
    if (instrument === null)
      this.form.submit(addInstrument.body, value, (body) => this.api.call(addInstrument, { body }), saved);
    else {
      const params = { id: instrument.id };
      const call = (body: z.output<typeof changeInstrument.body>, version: number) =>
        this.api.call(changeInstrument, { params, body, version });
      this.form.submit(changeInstrument.body, value, call, saved);
    }
  }
}
