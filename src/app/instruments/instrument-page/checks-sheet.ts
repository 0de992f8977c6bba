import { ChangeDetectionStrategy, Component, computed, inject, input, output } from '@angular/core';
import { FormControl, FormGroup, ReactiveFormsModule } from '@angular/forms';
import { MatButton } from '@angular/material/button';
import { MatSnackBar } from '@angular/material/snack-bar';
import { type InstrumentCheck, recordCheck } from '#shared/contract/calibrations';
import { type Instrument } from '#shared/contract/instruments';
import { formatQuantity } from '#shared/quantities/format-quantity';
import { ApiClient } from '../../data/api';
import { RecordSave } from '../../data/record-save';
import { may } from '../../session/may';
import { VerdictChip } from '../../ui/marks/verdict-chip';
import { QuantityField } from '../../ui/quantity-field/quantity-field';
import { ScrollRegion } from '../../ui/scroll-region';
import { MessageNote } from '../../ui/states/message-note';
import { MomentPipe } from '../../ui/values/moment-pipe';

/** The checks of an instrument against its reference, newest first, and the field that takes today's. */
@Component({
  selector: 'qr-checks-sheet',
  imports: [MatButton, MessageNote, MomentPipe, QuantityField, ReactiveFormsModule, ScrollRegion, VerdictChip],
  templateUrl: './checks-sheet.html',
  styleUrl: './checks-sheet.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ChecksSheet {
  private readonly api = inject(ApiClient);
  private readonly snackBar = inject(MatSnackBar);

  readonly instrument = input.required<Instrument>();
  readonly checks = input.required<readonly InstrumentCheck[]>();
  readonly recorded = output<InstrumentCheck>();

  protected readonly mayCheck = may(recordCheck);
  protected readonly saving = new RecordSave();
  protected readonly form = new FormGroup({ observed: new FormControl<number | null>(null) });
  protected readonly wanted = computed(() => {
    const reference = this.instrument().dailyReference;
    if (reference === null) return '';
    const { value, unit, tolerance } = reference;
    return `${formatQuantity(value, unit, { significant: 6 })} ± ${formatQuantity(tolerance, unit)}`;
  });
  protected readonly rows = computed(() => {
    const unit = this.instrument().dailyReference?.unit ?? '';
    return this.checks().map((check) => ({
      ...check,
      shown: formatQuantity(check.observed, unit, { significant: 6 }),
      wanted: `${formatQuantity(check.reference, unit, { significant: 6 })} ± ${formatQuantity(check.tolerance, unit)}`,
    }));
  });

  protected record(): void {
    const { id, assetNumber } = this.instrument();
    this.saving.submit(this.form, {
      schema: recordCheck.body,
      value: this.form.getRawValue(),
      call: (body) => this.api.call(recordCheck, { params: { id }, body }),
      saved: (check) => {
        this.form.reset();
        this.snackBar.open(`${assetNumber} ${check.passed ? 'passed' : 'did not pass'} its check`);
        this.recorded.emit(check);
      },
    });
  }
}
