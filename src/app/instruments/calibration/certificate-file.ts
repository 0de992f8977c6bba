import { PercentPipe } from '@angular/common';
import { ChangeDetectionStrategy, Component, computed, inject, input, output, signal } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { MatProgressBar } from '@angular/material/progress-bar';
import { attachCalibrationFile, type Calibration, readCalibrationFile } from '#shared/contract/calibrations';
import { readInstrument } from '#shared/contract/instruments';
import { ApiClient, hrefOf } from '../../data/api';
import { openInTab } from '../../data/file-tab';
import { may } from '../../session/may';
import { Icon } from '../../ui/marks/icon';
import { MessageNote } from '../../ui/states/message-note';
import { byteCount } from './byte-count';
import { CertificatePicker } from './certificate-picker';
import { CertificateUpload } from './certificate-upload';

/** The certificate of a calibration: to be saved where it is attached, to be attached where it is missing. */
@Component({
  selector: 'qr-certificate-file',
  imports: [CertificatePicker, Icon, MatButton, MatProgressBar, MessageNote, PercentPipe],
  template: `
    @if (calibration().file; as file) {
      <a matButton="outlined" target="_blank" [href]="address()" (click)="open($event)">
        <qr-icon name="download" [size]="18" />
        <span class="name">{{ file.fileName }}</span>
        <span class="caption size">{{ size() }}</span>
      </a>
      @if (refused()) {
        <qr-message-note look="nok">{{ refused() }}</qr-message-note>
      }
    } @else if (upload.share() !== null) {
      <p class="small" role="status">Sending the certificate, {{ upload.share() | percent }}</p>
      <mat-progress-bar mode="determinate" aria-label="Certificate sent" [value]="(upload.share() ?? 0) * 100" />
    } @else if (mayAttach() && !readOnly()) {
      @if (picking()) {
        <qr-certificate-picker (picked)="attach($event)" />
      } @else {
        <button type="button" matButton="outlined" (click)="picking.set(true)">
          <qr-icon name="attachment" [size]="18" />Attach its certificate
        </button>
      }
      @if (upload.refusal()) {
        <qr-message-note look="nok">{{ upload.refusal() }}</qr-message-note>
      }
    } @else {
      <span class="small quiet">No certificate is attached.</span>
    }
  `,
  styles: `
    :host {
      display: grid;
      gap: 6px;
      justify-items: start;
    }
    qr-certificate-picker,
    mat-progress-bar {
      width: 100%;
    }
    a {
      max-width: 100%;
      height: auto;
      min-height: var(--qr-control);
      white-space: normal;
    }
    .name {
      overflow-wrap: anywhere;
    }
    .size {
      margin-left: 8px;
      white-space: nowrap;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class CertificateFile {
  private readonly api = inject(ApiClient);

  readonly instrumentId = input.required<number>();
  readonly calibration = input.required<Calibration>();
  readonly readOnly = input(false);
  readonly attached = output<Calibration>();

  protected readonly mayAttach = may(attachCalibrationFile);
  protected readonly upload = new CertificateUpload();
  protected readonly picking = signal(false);
  protected readonly refused = signal('');
  protected readonly size = computed(() => byteCount(this.calibration().file?.bytes ?? 0));
  protected readonly address = computed(() =>
    hrefOf(readCalibrationFile, { params: { id: this.instrumentId(), calibration: this.calibration().id } }),
  );

  protected open(event: MouseEvent): void {
    const first = this.api.call(readInstrument, { params: { id: this.instrumentId() } });
    openInTab(event, this.address(), first, (sentence) => this.refused.set(sentence));
  }

  protected attach(file: File): void {
    const of = { instrumentId: this.instrumentId(), calibrationId: this.calibration().id };
    this.upload.send(of, file, { attached: (calibration) => this.attached.emit(calibration) });
  }
}
