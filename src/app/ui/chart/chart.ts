import { NgTemplateOutlet } from '@angular/common';
import {
  afterNextRender,
  ChangeDetectionStrategy,
  Component,
  contentChild,
  DestroyRef,
  effect,
  type ElementRef,
  inject,
  input,
  output,
  signal,
  viewChild,
} from '@angular/core';
import { MatButton } from '@angular/material/button';
import { chartColours, type ChartColours } from './chart-colours';
import { type ChartOption, type ECharts } from './chart-engine';
import { ChartTable } from './chart-table';
import { onSchemeChange } from './scheme-changes';

/** Which part of the axis is shown, as fractions of the whole. */
export interface ChartWindow {
  readonly from: number;
  readonly to: number;
}

/**
 * A chart with its sentence and its table. What draws it is loaded when the first chart has a size; until then, and where it
 * cannot be loaded, the table is there.
 *
 *     <qr-chart label="Readings by part, 11.84 to 12.28 V" [options]="byPart">
 *       <ng-template qrChartTable> … </ng-template>
 *     </qr-chart>
 *
 * `options` is a function of the colours, so that the chart follows the scheme; when it changes, series are replaced and the
 * zoom stays.
 */
@Component({
  selector: 'qr-chart',
  imports: [MatButton, NgTemplateOutlet],
  templateUrl: './chart.html',
  styleUrl: './chart.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class Chart {
  private readonly destroyed = inject(DestroyRef);

  /** The whole chart in a sentence. */
  readonly label = input.required<string>();
  readonly options = input.required<(colours: ChartColours) => ChartOption>();
  /** Height of the drawing in px. */
  readonly height = input(240);
  /** The part of the first zoomed axis that is shown, when the person has changed it. */
  readonly zoomed = output<ChartWindow>();

  protected readonly table = contentChild.required(ChartTable);
  protected readonly asTable = signal(false);
  protected readonly failed = signal(false);
  private readonly plot = viewChild.required<ElementRef<HTMLElement>>('plot');
  private readonly chart = signal<ECharts | null>(null);
  private loading = false;

  constructor() {
    effect(() => this.draw());
    onSchemeChange(() => this.draw());
    afterNextRender(() => this.followSize());
    this.destroyed.onDestroy(() => this.chart()?.dispose());
  }

  private draw(): void {
    const chart = this.chart();
    const options = this.options();
    chart?.setOption(options(chartColours(this.plot().nativeElement)), { replaceMerge: ['series'] });
  }

  private followSize(): void {
    if (typeof ResizeObserver === 'undefined') return;
    const observer = new ResizeObserver(([entry]) => {
      if (!entry || entry.contentRect.width === 0) return;
      const chart = this.chart();
      if (chart) chart.resize();
      else void this.start();
    });
    observer.observe(this.plot().nativeElement);
    this.destroyed.onDestroy(() => observer.disconnect());
  }

  private async start(): Promise<void> {
    if (this.loading) return;
    this.loading = true;
    try {
      const { startChart } = await import('./chart-engine');
      if (this.destroyed.destroyed) return;
      const chart = startChart(this.plot().nativeElement);
      chart.on('datazoom', () => this.tellWindow(chart));
      this.chart.set(chart);
    } catch {
      // A renewed program no longer has this chunk; the table says the same.
      this.failed.set(true);
    }
  }

  private tellWindow(chart: ECharts): void {
    const { dataZoom } = chart.getOption() as { dataZoom?: { start?: number; end?: number }[] };
    const [zoom] = dataZoom ?? [];
    this.zoomed.emit({ from: (zoom?.start ?? 0) / 100, to: (zoom?.end ?? 100) / 100 });
  }
}
