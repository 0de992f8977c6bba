import { ChangeDetectionStrategy, Component, effect, inject, input, output } from '@angular/core';
import { toSignal } from '@angular/core/rxjs-interop';
import { ReactiveFormsModule } from '@angular/forms';
import { MatFormFieldModule } from '@angular/material/form-field';
import { MatInput } from '@angular/material/input';
import { MatSelectModule } from '@angular/material/select';
import {
  addGaugeStudy,
  changeGaugeStudy,
  type GaugeStudy,
  gaugeStudyBody,
  readGaugeStudy,
  STUDY_SIZE,
} from '#shared/contract/gauge-studies';
import { listInstruments } from '#shared/contract/instruments';
import { UNITS } from '#shared/contract/plans';
import { ApiClient, endpointResource } from '../../data/api';
import { RecordForm } from '../../data/record-form';
import { Confirm } from '../../ui/confirm/confirm';
import { ConflictNote } from '../../ui/conflict-note';
import { FormFoot } from '../../ui/form-foot';
import { QuantityField } from '../../ui/quantity-field/quantity-field';
import { FieldErrorPipe } from '../../ui/values/field-error-pipe';
import { StudyFields } from './study-fields';

/** Begins a gauge study, or changes what the one it is given is about. */
@Component({
  selector: 'qr-study-form',
  imports: [
    ConflictNote,
    FieldErrorPipe,
    FormFoot,
    MatFormFieldModule,
    MatInput,
    MatSelectModule,
    QuantityField,
    ReactiveFormsModule,
  ],
  templateUrl: './study-form.html',
  styleUrl: './study-form.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class StudyForm {
  private readonly api = inject(ApiClient);
  private readonly confirm = inject(Confirm);

  readonly study = input<GaugeStudy | null>(null);
  readonly saved = output<GaugeStudy>();

  protected readonly units = UNITS;
  protected readonly decimals = [0, 1, 2, 3, 4, 5, 6];
  protected readonly size = STUDY_SIZE;
  protected readonly trials = Array.from({ length: STUDY_SIZE.trials.most - 1 }, (_, nth) => nth + 2);
  protected readonly instruments = endpointResource(listInstruments, () => ({}));
  protected readonly form = new RecordForm(new StudyFields(), () =>
    this.api.call(readGaugeStudy, { params: { id: this.study()?.id ?? 0 } }),
  );
  protected readonly controls = this.form.fields.group.controls;
  protected readonly unit = toSignal(this.controls.unit.valueChanges, { initialValue: this.controls.unit.value });

  constructor() {
    effect(() => {
      const study = this.study();
      if (study !== null) this.form.take(study);
    });
  }

  hasUnsaved(): boolean {
    return this.form.hasUnsaved();
  }

  protected keepMine(theirs: GaugeStudy): void {
    this.form.fields.readingsOf(theirs);
    this.form.keepMine();
  }

  /** A smaller study has no place for some of its readings: whoever makes it smaller says that they may go. */
  protected save(): void {
    const lost = this.form.fields.lost();
    if (lost <= 0) {
      this.send();
      return;
    }
    this.confirm
      .ask({
        title: 'Remove readings?',
        text: [`${String(lost)} of the readings belong to what is no longer in the study. They go with this change.`],
        confirm: 'Remove and save',
        destructive: true,
      })
      .subscribe((confirmed) => {
        if (confirmed) this.send();
      });
  }

  private send(): void {
    const study = this.study();
    this.form.submit(
      gaugeStudyBody,
      this.form.fields.value(),
      (body, version) =>
        study === null
          ? this.api.call(addGaugeStudy, { body })
          : this.api.call(changeGaugeStudy, { params: { id: study.id }, body, version }),
      (saved) => this.saved.emit(saved),
    );
  }
}
