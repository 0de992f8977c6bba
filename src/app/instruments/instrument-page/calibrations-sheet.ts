import { ChangeDetectionStrategy, Component, computed, input, output } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { RouterLink } from '@angular/router';
import { type Calibration, recordCalibration } from '#shared/contract/calibrations';
import { type Instrument } from '#shared/contract/instruments';
import { may } from '../../session/may';
import { EmptyState } from '../../ui/states/empty-state';
import { CalibrationEntry } from '../calibration/calibration-entry';

/** How many calibrations are in view before the older ones are asked for. */
const FIRST = 3;

/** The calibrations of an instrument, newest first. */
@Component({
  selector: 'qr-calibrations-sheet',
  imports: [CalibrationEntry, EmptyState, MatButton, RouterLink],
  template: `
    <h2>Calibrations</h2>
    @for (one of recent(); track one.id; let first = $first) {
      <qr-calibration-entry
        [instrumentId]="instrument().id"
        [calibration]="one"
        [unfolded]="first"
        (attached)="attached.emit($event)"
      />
    } @empty {
      <qr-empty-state
        title="No calibration recorded yet."
        text="Its due date rests on what was entered with the instrument."
      >
        @if (mayRecord()) {
          <a matButton="outlined" routerLink="calibrations/new">Record a calibration</a>
        }
      </qr-empty-state>
    }
    @if (older().length > 0) {
      <details>
        <summary>{{ older().length === 1 ? 'One older one' : older().length + ' older ones' }}</summary>
        @for (one of older(); track one.id) {
          <qr-calibration-entry
            [instrumentId]="instrument().id"
            [calibration]="one"
            (attached)="attached.emit($event)"
          />
        }
      </details>
    }
  `,
  styles: `
    :host {
      display: grid;
      grid-template-columns: minmax(0, 1fr);
      gap: 16px;
    }
    qr-calibration-entry + qr-calibration-entry,
    details {
      padding-top: 16px;
      border-top: 1px solid var(--qr-line);
    }
    summary {
      width: fit-content;
      font: 500 13px/18px var(--qr-sans);
      cursor: pointer;
    }
    summary + qr-calibration-entry {
      margin-top: 16px;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class CalibrationsSheet {
  readonly instrument = input.required<Instrument>();
  readonly calibrations = input.required<readonly Calibration[]>();
  readonly attached = output<Calibration>();

  protected readonly mayRecord = may(recordCalibration);
  protected readonly recent = computed(() => this.calibrations().slice(0, FIRST));
  protected readonly older = computed(() => this.calibrations().slice(FIRST));
}
