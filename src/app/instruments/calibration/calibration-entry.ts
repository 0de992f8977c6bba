import { ChangeDetectionStrategy, Component, computed, input, output } from '@angular/core';
import { RouterLink } from '@angular/router';
import { type Calibration } from '#shared/contract/calibrations';
import { MomentPipe } from '../../ui/values/moment-pipe';
import { AsFound } from './as-found';
import { CertificateFile } from './certificate-file';
import { pointError } from './point-error';
import { PointsTable } from './points-table';

/** One calibration of an instrument as its certificate states it. */
@Component({
  selector: 'qr-calibration-entry',
  imports: [AsFound, CertificateFile, MomentPipe, PointsTable, RouterLink],
  template: `
    @let shown = calibration();
    <header>
      <h3 class="mono">{{ shown.calibratedOn }}</h3>
      <qr-as-found [of]="shown.asFound" />
      @if (shown.adjusted) {
        <span class="tag">Adjusted</span>
      }
      @if (shown.reviewId) {
        <a class="link small" [routerLink]="['/reviews', shown.reviewId]">Its review</a>
      }
    </header>
    <dl class="kv">
      <dt>Laboratory</dt>
      <dd>{{ shown.laboratory }}</dd>
      <dt>Certificate</dt>
      <dd class="mono">{{ shown.certificateNumber }}</dd>
      <dt>Next due</dt>
      <dd class="mono">{{ shown.dueOn }}</dd>
      <dt>Recorded</dt>
      <dd>{{ shown.recordedAt | moment: 'full' }}, {{ shown.recordedBy }}</dd>
      @if (shown.note) {
        <dt>Note</dt>
        <dd class="lines">{{ shown.note }}</dd>
      }
    </dl>
    @if (shown.points.length > 0) {
      <details [open]="unfolded()">
        <summary>{{ summary() }}</summary>
        <qr-points-table [points]="shown.points" [certificateNumber]="shown.certificateNumber" />
      </details>
    }
    <qr-certificate-file [instrumentId]="instrumentId()" [calibration]="shown" (attached)="attached.emit($event)" />
  `,
  styleUrl: './calibration-entry.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class CalibrationEntry {
  readonly instrumentId = input.required<number>();
  readonly calibration = input.required<Calibration>();
  /** Whether its points are in view from the start. */
  readonly unfolded = input(false);
  readonly attached = output<Calibration>();

  protected readonly summary = computed(() => {
    const { points } = this.calibration();
    const beyond = points.filter((point) => !pointError(point).isWithin).length;
    const counted = points.length === 1 ? 'One point' : `${points.length} points`;
    return beyond === 0 ? `${counted}, all within what is allowed` : `${counted}, ${beyond} beyond what is allowed`;
  });
}
