import { ChangeDetectionStrategy, Component, computed, inject, input, output } from '@angular/core';
import { VerdictMark } from '../../ui/marks/verdict-mark';
import { VerdictPlate } from '../../ui/verdict-plate/verdict-plate';
import { BenchSheet } from '../sheet/bench-sheet';
import { lowerThan } from './screen-height';

/** Whether measuring goes on: CONTINUE, or STOP from the moment a rejection number is reached. */
@Component({
  selector: 'qr-running-verdict',
  imports: [VerdictMark, VerdictPlate],
  template: `
    @if (plain()) {
      <span class="label">{{ stop() ? short() : 'Running verdict' }}</span>
      <b aria-live="assertive">{{ stop() ? 'STOP' : 'CONTINUE' }}</b>
    } @else {
      <qr-verdict-plate
        [variant]="stop() ? 'stop' : 'continue'"
        topLeft="Running verdict"
        [topRight]="short()"
        [trace]="!low()"
      />
    }
    @if (waiting(); as count) {
      <p class="waiting">
        <qr-verdict-mark look="hold" />
        <button type="button" class="link" (click)="shown.emit()">
          {{ count === 1 ? '1 reading waits' : count + ' readings wait' }} for an answer
        </button>
      </p>
    }
    @if (stop() && !plain()) {
      <p>{{ sheet.lot().reason }} Quarantine the lot.</p>
    }
  `,
  styles: `
    :host {
      --qr-plate-edge: var(--qr-sans);
      display: block;
    }
    :host(.plain) {
      display: grid;
      flex: none;
      align-content: center;
      justify-items: end;
      padding: 6px 16px;
      b {
        font: var(--qr-t-verdict);
        letter-spacing: 1px;
      }
    }
    :host(.plain.stop) {
      background: var(--qr-nok-fill);
      color: var(--qr-on-nok);
      .label {
        color: inherit;
      }
    }
    .waiting {
      display: flex;
      gap: 6px;
      align-items: center;
      color: var(--qr-ink);
    }
    button {
      min-height: 24px;
      padding: 0;
      border: 0;
      background: none;
      font: inherit;
      font-weight: 500;
      cursor: pointer;
    }
    p {
      margin-top: 8px;
      color: var(--qr-nok-text);
      font: var(--qr-t-small);
    }
  `,
  host: { '[class.plain]': 'plain()', '[class.stop]': 'stop()' },
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class RunningVerdict {
  protected readonly sheet = inject(BenchSheet);

  /** Whether only the word stands, in the head of a tablet. */
  readonly plain = input(false);
  /** The person wants to see the first reading that waits for an answer. */
  readonly shown = output();

  protected readonly waiting = computed(() => this.sheet.openQuestions().length);
  protected readonly low = lowerThan(860);
  protected readonly stop = computed(() => this.sheet.lot().stop);
  protected readonly short = computed(() => {
    if (this.stop()) return 'Rejection number reached';
    return this.sheet.lot().complete ? 'All units judged' : 'No rejection number reached';
  });
}
