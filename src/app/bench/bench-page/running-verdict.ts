import { ChangeDetectionStrategy, Component, computed, inject, input } from '@angular/core';
import { VerdictPlate } from '../../ui/verdict-plate/verdict-plate';
import { BenchSheet } from '../sheet/bench-sheet';
import { lowerThan } from './screen-height';

/** Whether measuring goes on: CONTINUE, or STOP from the moment a rejection number is reached. */
@Component({
  selector: 'qr-running-verdict',
  imports: [VerdictPlate],
  template: `
    <qr-verdict-plate
      [variant]="stop() ? 'stop' : 'continue'"
      topLeft="Running verdict"
      [topRight]="short()"
      [trace]="!low() && !compact()"
    />
    @if (stop()) {
      <p>{{ sheet.lot().reason }} Quarantine the lot.</p>
    }
  `,
  styles: `
    :host {
      display: block;
    }
    p {
      margin-top: 8px;
      color: var(--qr-nok-text);
      font: var(--qr-t-small);
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class RunningVerdict {
  protected readonly sheet = inject(BenchSheet);

  readonly compact = input(false);

  protected readonly low = lowerThan(860);
  protected readonly stop = computed(() => this.sheet.lot().stop);
  protected readonly short = computed(() => {
    if (this.stop()) return 'Rejection number reached';
    return this.sheet.lot().complete ? 'All units judged' : 'No rejection number reached';
  });
}
