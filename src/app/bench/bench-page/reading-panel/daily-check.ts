import { ChangeDetectionStrategy, Component, computed, inject, input, linkedSignal, output } from '@angular/core';
import { FormControl, FormGroup, ReactiveFormsModule, Validators } from '@angular/forms';
import { MatButton } from '@angular/material/button';
import * as z from 'zod';
import { type InstrumentCheck, recordCheck } from '#shared/contract/calibrations';
import { type Instrument } from '#shared/contract/instruments';
import { formatQuantity } from '#shared/quantities/format-quantity';
import { ApiClient } from '../../../data/api';
import { RecordSave } from '../../../data/record-save';
import { formFieldDefaults } from '../../../ui/material-defaults';
import { QuantityField } from '../../../ui/quantity-field/quantity-field';
import { MessageNote } from '../../../ui/states/message-note';
import { BenchSheet } from '../../sheet/bench-sheet';

const schema = z.object({ observed: z.number() });

/** The check of an instrument against its reference before its first reading of the day, where the site asks for one. */
@Component({
  selector: 'qr-daily-check',
  imports: [MatButton, MessageNote, QuantityField, ReactiveFormsModule],
  templateUrl: './daily-check.html',
  styleUrl: './daily-check.scss',
  providers: [formFieldDefaults],
  host: { role: 'group', 'aria-label': 'Check of the day' },
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class DailyCheck {
  private readonly api = inject(ApiClient);
  private readonly sheet = inject(BenchSheet);

  readonly instrument = input.required<Instrument>();
  readonly passed = output();

  private readonly instrumentId = computed(() => this.instrument().id);
  protected readonly saving = new RecordSave();
  protected readonly form = new FormGroup({
    observed: new FormControl<number | null>(null, { validators: Validators.required }),
  });
  /** A check that failed; another instrument begins anew. */
  protected readonly failed = linkedSignal<unknown, InstrumentCheck | null>({
    source: this.instrumentId,
    computation: () => null,
  });
  protected readonly reference = computed(() => {
    const reference = this.instrument().dailyReference;
    if (reference === null) return null;
    const text = (value: number) => formatQuantity(value, reference.unit, { significant: 6 });
    return {
      ...reference,
      wanted: `${text(reference.value)} ± ${formatQuantity(reference.tolerance, reference.unit)}`,
    };
  });
  protected readonly showed = computed(() => {
    const [failed, reference] = [this.failed(), this.reference()];
    return failed === null || reference === null
      ? ''
      : formatQuantity(failed.observed, reference.unit, { significant: 6 });
  });

  protected record(event: Event): void {
    event.preventDefault();
    const { id } = this.instrument();
    this.saving.submit(this.form, {
      schema,
      value: this.form.getRawValue(),
      call: (body) => this.api.call(recordCheck, { params: { id }, body }),
      saved: (check) => this.take(check),
    });
  }

  private take(check: InstrumentCheck): void {
    this.failed.set(check.passed ? null : check);
    const dailyCheck = check.passed ? 'passed' : 'failed';
    this.sheet.takeInstrument(this.instrument().id, { dailyCheck, usable: check.passed });
    if (check.passed) this.passed.emit();
  }
}
