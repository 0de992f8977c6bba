import { ChangeDetectionStrategy, Component, effect, inject, input, output } from '@angular/core';
import { ReactiveFormsModule } from '@angular/forms';
import { MatFormFieldModule } from '@angular/material/form-field';
import { MatInput } from '@angular/material/input';
import { MatSelectModule } from '@angular/material/select';
import {
  addInstrument,
  changeInstrument,
  type Instrument,
  INSTRUMENT_KIND_TITLES,
  INSTRUMENT_KINDS,
  instrumentBody,
  readInstrument,
} from '#shared/contract/instruments';
import { ApiClient } from '../../data/api';
import { RecordForm } from '../../data/record-form';
import { ConflictNote } from '../../ui/conflict-note';
import { FormFoot } from '../../ui/form-foot';
import { FieldErrorPipe } from '../../ui/values/field-error-pipe';
import { InstrumentFields, STATUS_TITLES } from './instrument-fields';

/** Adds an instrument, or changes the one it is given. */
@Component({
  selector: 'qr-instrument-form',
  imports: [ConflictNote, FieldErrorPipe, FormFoot, MatFormFieldModule, MatInput, MatSelectModule, ReactiveFormsModule],
  templateUrl: './instrument-form.html',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class InstrumentForm {
  private readonly api = inject(ApiClient);

  readonly instrument = input<Instrument | null>(null);
  readonly saved = output<Instrument>();

  protected readonly kinds = INSTRUMENT_KINDS.map((kind) => ({ kind, title: INSTRUMENT_KIND_TITLES[kind] }));
  protected readonly statusTitles = STATUS_TITLES;
  protected readonly form = new RecordForm(new InstrumentFields(), () =>
    this.api.call(readInstrument, { params: { id: this.instrument()?.id ?? 0 } }),
  );
  protected readonly controls = this.form.fields.group.controls;

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
    this.form.submit(
      instrumentBody,
      this.form.fields.group.getRawValue(),
      (body, version) =>
        instrument === null
          ? this.api.call(addInstrument, { body })
          : this.api.call(changeInstrument, { params: { id: instrument.id }, body, version }),
      (saved) => this.saved.emit(saved),
    );
  }
}
