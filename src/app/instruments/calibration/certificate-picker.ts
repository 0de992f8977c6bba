import { ChangeDetectionStrategy, Component, input, output } from '@angular/core';
import { attachCalibrationFile } from '#shared/contract/calibrations';
import { FileDrop } from '../../ui/file-drop';

/** Takes the certificate of a calibration by choosing or by dropping: a PDF or a picture. */
@Component({
  selector: 'qr-certificate-picker',
  imports: [FileDrop],
  template: `
    <qr-file-drop
      label="Certificate of the calibration"
      prompt="Drop the certificate here: PDF, PNG or JPEG"
      accept=".pdf,.png,.jpg,.jpeg,application/pdf,image/png,image/jpeg"
      [name]="name()"
      [most]="most"
      (picked)="picked.emit($event)"
    />
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class CertificatePicker {
  /** Name of the file picked before. */
  readonly name = input('');
  readonly picked = output<File>();

  protected readonly most = attachCalibrationFile.upload ?? 0;
}
