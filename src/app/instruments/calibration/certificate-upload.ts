import { DestroyRef, inject, signal } from '@angular/core';
import { takeUntilDestroyed } from '@angular/core/rxjs-interop';
import { finalize } from 'rxjs';
import { attachCalibrationFile, type Calibration } from '#shared/contract/calibrations';
import { ApiClient } from '../../data/api';
import { problemOf } from '../../data/api-problem';

/** Sends the certificate of a calibration and tells how far it is. Make it where injection is possible. */
export class CertificateUpload {
  private readonly api = inject(ApiClient);
  private readonly destroyed = inject(DestroyRef);

  /** The share sent, from 0 to 1; null while nothing is on its way. */
  readonly share = signal<number | null>(null);
  readonly refusal = signal('');

  send(
    of: { instrumentId: number; calibrationId: number },
    file: File,
    then: { attached(calibration: Calibration): void; refused?(sentence: string): void },
  ): void {
    this.share.set(0);
    this.refusal.set('');
    const params = { id: of.instrumentId, calibration: of.calibrationId };
    this.api
      .upload(attachCalibrationFile, { params, query: { fileName: file.name.slice(-200) }, file })
      .pipe(
        finalize(() => this.share.set(null)),
        takeUntilDestroyed(this.destroyed),
      )
      .subscribe({
        next: (step) => {
          if (step.state === 'sending') this.share.set(step.share);
          else then.attached(step.reply);
        },
        error: (thrown: unknown) => {
          const { message } = problemOf(thrown);
          this.refusal.set(message);
          then.refused?.(message);
        },
      });
  }
}
