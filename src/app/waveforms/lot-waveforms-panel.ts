import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import { Loaded } from '../ui/page-state/loaded';
import { PageState } from '../ui/page-state/page-state';
import { lotWaveforms } from './lot-waveforms';
import { WaveformLine } from './unit-waveforms/waveform-line';

/** The waveforms of a lot, unit by unit; they come in while a rack sends them. */
@Component({
  selector: 'qr-lot-waveforms-panel',
  imports: [Loaded, PageState, WaveformLine],
  template: `
    <h2>Waveforms</h2>
    <qr-page-state what="The waveforms" [rows]="2">
      <ng-template [qrLoaded]="list" let-shown>
        @if (shown) {
          @for (head of shown.items; track head.id) {
            <qr-waveform-line [waveform]="head" [withUnit]="true" />
          } @empty {
            <p class="small quiet">{{ none() }}</p>
          }
        }
      </ng-template>
    </qr-page-state>
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class LotWaveformsPanel {
  readonly lotId = input.required<number>();
  /** Whether more may come. */
  readonly atBench = input(false);

  protected readonly list = lotWaveforms(() => this.lotId());
  protected readonly none = computed(() =>
    this.atBench() ? 'None yet. At the bench a file is dropped beside the reading.' : 'None was captured.',
  );
}
