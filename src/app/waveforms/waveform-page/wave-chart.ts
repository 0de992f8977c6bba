import { ChangeDetectionStrategy, Component, computed, inject, input } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { type WaveformPeak, type WaveformRecord } from '#shared/contract/waveforms';
import { Chart } from '../../ui/chart/chart';
import { ChartTable } from '../../ui/chart/chart-table';
import { ScrollRegion } from '../../ui/scroll-region';
import { QuantityPipe } from '../../ui/values/quantity-pipe';
import { waveOptions, secondsText } from './wave-options';
import { type WaveSamples } from './wave-samples';
import { WaveWindow } from './wave-window';

/** A person reads so many lines of a table. */
const MOST_LINES = 40;

const KEYS: Readonly<Record<string, (view: WaveWindow) => void>> = {
  '+': (view) => view.zoom('in'),
  '=': (view) => view.zoom('in'),
  '-': (view) => view.zoom('out'),
  '0': (view) => view.whole(),
  ArrowLeft: (view) => view.move('left'),
  ArrowRight: (view) => view.move('right'),
};

/** The drawn waveform with its peaks; zoomed and moved with the pointer, with keys and with buttons. */
@Component({
  selector: 'qr-wave-chart',
  imports: [Chart, ChartTable, MatButton, QuantityPipe, ScrollRegion],
  template: `
    <div class="bar" role="toolbar" aria-label="Part of the waveform">
      <button type="button" matButton="outlined" (click)="view.zoom('in')">Zoom in</button>
      <button
        type="button"
        matButton="outlined"
        [disabled]="view.isWhole()"
        disabledInteractive
        (click)="view.zoom('out')"
      >
        Zoom out
      </button>
      <button
        type="button"
        matButton="outlined"
        [disabled]="view.isWhole()"
        disabledInteractive
        (click)="view.move('left')"
      >
        Earlier
      </button>
      <button
        type="button"
        matButton="outlined"
        [disabled]="view.isWhole()"
        disabledInteractive
        (click)="view.move('right')"
      >
        Later
      </button>
      <button type="button" matButton [disabled]="view.isWhole()" disabledInteractive (click)="view.whole()">
        Whole
      </button>
      <span class="small quiet hint">
        Here <kbd>+</kbd> <kbd>−</kbd> <kbd>←</kbd> <kbd>→</kbd> <kbd>0</kbd> do the same; in the drawing
        <kbd>Ctrl</kbd> and the wheel.
      </span>
    </div>
    <qr-chart [label]="sentence()" [options]="options()" [height]="340" (zoomed)="view.show($event)">
      <ng-template qrChartTable>
        <div qrScrollRegion="Peaks">
          <table class="mini">
            <caption class="small quiet">
              {{
                caption()
              }}
            </caption>
            <thead>
              <tr>
                <th scope="col">Peak</th>
                <th scope="col">Family</th>
                <th scope="col" class="right">At</th>
                <th scope="col" class="right">Height</th>
              </tr>
            </thead>
            <tbody>
              @for (peak of lines(); track peak.index) {
                <tr>
                  <th scope="row" class="num">{{ $index + 1 }}</th>
                  <td>{{ peak.family }}</td>
                  <td class="num right">{{ at(peak.seconds) }}</td>
                  <td class="num right">{{ peak.volts | quantity: 'V' : { significant: 5 } }}</td>
                </tr>
              }
            </tbody>
          </table>
        </div>
      </ng-template>
    </qr-chart>
  `,
  styles: `
    :host {
      display: block;
      min-width: 0;
    }
    .bar {
      display: flex;
      flex-wrap: wrap;
      gap: 8px;
      align-items: center;
      margin-bottom: 8px;
    }
    @media (pointer: coarse), (max-width: 700px) {
      .hint {
        display: none;
      }
    }
    caption {
      text-align: left;
      padding-bottom: 6px;
    }
  `,
  host: { '(keydown)': 'press($event)' },
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class WaveChart {
  readonly record = input.required<WaveformRecord>();
  readonly samples = input.required<WaveSamples>();
  /** The peaks that are drawn: those found, or those that are being moved. */
  readonly peaks = input.required<readonly WaveformPeak[]>();
  readonly chosen = input<number | null>(null);

  protected readonly view = inject(WaveWindow);
  protected readonly at = secondsText;
  protected readonly options = computed(() => {
    const { spacing, analysis } = this.record();
    const { oddMean, evenMean } = analysis;
    const means = this.chosen() === null ? { oddMean, evenMean } : { oddMean: null, evenMean: null };
    return waveOptions({
      ...means,
      samples: this.samples(),
      spacing,
      peaks: this.peaks(),
      share: this.view.share(),
      chosen: this.chosen(),
    });
  });
  protected readonly lines = computed(() => this.peaks().slice(0, MOST_LINES));
  protected readonly caption = computed(() => {
    const count = this.peaks().length;
    const more = count > MOST_LINES ? `, the first ${MOST_LINES} of them here` : '';
    return `${count} ${count === 1 ? 'peak' : 'peaks'}${more}.`;
  });
  protected readonly sentence = computed(() => {
    const { samples, spacing, analysis } = this.record();
    const long = secondsText((samples - 1) * spacing.interval);
    return `Voltage over ${long}, ${analysis.lineCycles} line cycles, with ${this.peaks().length} peaks marked.`;
  });

  protected press(event: KeyboardEvent): void {
    const act = event.ctrlKey || event.altKey || event.metaKey ? undefined : KEYS[event.key];
    if (!act) return;
    event.preventDefault();
    act(this.view);
  }
}
