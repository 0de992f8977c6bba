import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import { formatNumber } from '#shared/quantities/format-number';
import { Chart } from '../../ui/chart/chart';
import { chartAxis, chartBase } from '../../ui/chart/chart-base';
import { type ChartColours } from '../../ui/chart/chart-colours';
import { type ChartOption } from '../../ui/chart/chart-engine';
import { ChartTable } from '../../ui/chart/chart-table';

/** Line cycles that are drawn, so that alternate peaks show. */
const CYCLES = 2;
/** Points of the table: an eighth of a cycle apart. */
const TABLE_STEPS = 8;

/** The modelled output over two line cycles. */
@Component({
  selector: 'qr-ripple-chart',
  imports: [Chart, ChartTable],
  template: `
    <qr-chart [label]="sentence()" [options]="options()" [height]="200">
      <ng-template qrChartTable>
        <div class="scroll-x">
          <table class="mini">
            <thead>
              <tr>
                <th scope="col" class="right">Time, ms</th>
                <th scope="col" class="right">Output, V</th>
              </tr>
            </thead>
            <tbody>
              @for (point of points(); track $index) {
                <tr>
                  <td class="num right">{{ point.time }}</td>
                  <td class="num right">{{ point.volts }}</td>
                </tr>
              }
            </tbody>
          </table>
        </div>
      </ng-template>
    </qr-chart>
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class RippleChart {
  /** One line cycle of the output, evenly spaced, in volts. */
  readonly wave = input.required<Float64Array>();
  readonly lineHertz = input.required<number>();
  /** What it shows, in a sentence. */
  readonly sentence = input.required<string>();

  private readonly cycleMilliseconds = computed(() => 1000 / this.lineHertz());

  protected readonly points = computed(() => {
    const wave = this.wave();
    return Array.from({ length: TABLE_STEPS }, (_, step) => ({
      time: formatNumber((step / TABLE_STEPS) * this.cycleMilliseconds(), 2),
      volts: formatNumber(wave[Math.floor((step / TABLE_STEPS) * wave.length)] ?? 0, 3),
    }));
  });

  protected readonly options = computed(() => {
    const wave = this.wave();
    const milliseconds = this.cycleMilliseconds();
    const data = Array.from({ length: CYCLES * wave.length }, (_, index) => [
      (index / wave.length) * milliseconds,
      wave[index % wave.length] ?? 0,
    ]);
    return (colours: ChartColours): ChartOption => ({
      ...chartBase(colours),
      xAxis: {
        ...chartAxis(colours),
        type: 'value',
        min: 0,
        max: CYCLES * milliseconds,
        axisLabel: { ...chartAxis(colours).axisLabel, formatter: '{value} ms' },
      },
      yAxis: {
        ...chartAxis(colours),
        type: 'value',
        scale: true,
        splitNumber: 4,
        axisLabel: { ...chartAxis(colours).axisLabel, formatter: '{value} V' },
      },
      series: [{ type: 'line', data, showSymbol: false, lineStyle: { color: colours.chart1, width: 2 } }],
    });
  });
}
