import { PercentPipe } from '@angular/common';
import {
  ChangeDetectionStrategy,
  Component,
  computed,
  effect,
  inject,
  input,
  numberAttribute,
  signal,
} from '@angular/core';
import { toSignal } from '@angular/core/rxjs-interop';
import { ReactiveFormsModule } from '@angular/forms';
import { MatCheckbox } from '@angular/material/checkbox';
import { MatFormFieldModule } from '@angular/material/form-field';
import { MatInput } from '@angular/material/input';
import { MatSelectModule } from '@angular/material/select';
import { MatSnackBar } from '@angular/material/snack-bar';
import { Router } from '@angular/router';
import {
  AS_FOUND,
  AS_FOUND_TITLES,
  calibrationBody,
  readInstrumentHistory,
  recordCalibration,
} from '#shared/contract/calibrations';
import { type Instrument, readInstrument } from '#shared/contract/instruments';
import { ApiClient, endpointResource, type Reply } from '../../data/api';
import { RecordSave } from '../../data/record-save';
import { PageTitle } from '../../page-title';
import { BackLink } from '../../shell/back-link';
import { type HoldsTyping } from '../../shell/leave-guard';
import { FormFoot } from '../../ui/form-foot';
import { Loaded } from '../../ui/page-state/loaded';
import { PageState } from '../../ui/page-state/page-state';
import { MessageNote } from '../../ui/states/message-note';
import { FieldErrorPipe } from '../../ui/values/field-error-pipe';
import { CertificatePicker } from '../calibration/certificate-picker';
import { CertificateUpload } from '../calibration/certificate-upload';
import { CalibrationFields } from './calibration-fields';
import { PointsField } from './points-field';

/** Records a calibration with its points and its certificate; then shows the instrument, or the review that was opened. */
@Component({
  selector: 'qr-record-calibration-page',
  imports: [
    BackLink,
    CertificatePicker,
    FieldErrorPipe,
    FormFoot,
    Loaded,
    MatCheckbox,
    MatFormFieldModule,
    MatInput,
    MatSelectModule,
    MessageNote,
    PageState,
    PercentPipe,
    PointsField,
    ReactiveFormsModule,
  ],
  templateUrl: './record-calibration-page.html',
  styleUrl: './record-calibration-page.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class RecordCalibrationPage implements HoldsTyping {
  private readonly api = inject(ApiClient);
  private readonly router = inject(Router);
  private readonly snackBar = inject(MatSnackBar);
  private readonly title = inject(PageTitle);

  readonly id = input.required({ transform: numberAttribute });

  protected readonly instrument = endpointResource(readInstrument, () => ({ params: { id: this.id() } }));
  private readonly history = endpointResource(readInstrumentHistory, () => ({ params: { id: this.id() } }));
  protected readonly fields = new CalibrationFields();
  protected readonly controls = this.fields.group.controls;
  protected readonly saving = new RecordSave();
  protected readonly upload = new CertificateUpload();
  protected readonly file = signal<File | null>(null);
  protected readonly results = AS_FOUND.map((result) => ({ result, title: AS_FOUND_TITLES[result] }));
  private readonly asFound = toSignal(this.controls.asFound.valueChanges);
  protected readonly isOut = computed(() => this.asFound() === 'out-of-tolerance');
  protected readonly usualUnit = computed(() =>
    this.instrument.hasValue() ? (this.instrument.value().ranges[0]?.unit ?? 'V') : 'V',
  );
  private isRecorded = false;

  constructor() {
    effect(() => {
      if (this.instrument.hasValue()) this.title.show(this.instrument.value().assetNumber);
    });
    this.fields.begin(today(), undefined);
    effect(() => {
      const [before] = this.history.hasValue() ? this.history.value().calibrations : [];
      if (before && !this.fields.group.dirty) this.fields.begin(today(), before);
    });
  }

  hasUnsaved(): boolean {
    return !this.isRecorded && this.fields.group.dirty;
  }

  protected save(instrument: Instrument): void {
    const { id, version } = instrument;
    this.saving.submit(this.fields.group, {
      schema: calibrationBody,
      value: this.fields.group.getRawValue(),
      call: (body) => this.api.call(recordCalibration, { params: { id }, body, version }),
      saved: (reply) => this.attach(reply),
      overtaken: () =>
        this.saving.run(this.api.call(readInstrument, { params: { id } }), (now) => {
          this.instrument.set(now);
          this.saving.said.set([`${now.assetNumber} was changed meanwhile. What you typed stays; record it again.`]);
        }),
    });
  }

  private attach(reply: Reply<typeof recordCalibration>): void {
    this.isRecorded = true;
    const file = this.file();
    const { assetNumber, id } = reply.instrument;
    if (file === null) {
      this.leave(reply, `Calibration of ${assetNumber} recorded`);
      return;
    }
    const of = { instrumentId: id, calibrationId: reply.calibrationId };
    this.upload.send(of, file, {
      attached: () => this.leave(reply, `Calibration of ${assetNumber} recorded with its certificate`),
      refused: (sentence) => this.leave(reply, `Recorded, but the certificate is not attached: ${sentence}`),
    });
  }

  private leave({ instrument, reviewId }: Reply<typeof recordCalibration>, said: string): void {
    this.snackBar.open(said);
    const address = reviewId === null ? ['/instruments', instrument.id] : ['/reviews', reviewId];
    void this.router.navigate(address, { replaceUrl: true });
  }
}

function today(): string {
  return new Date().toISOString().slice(0, 10);
}
