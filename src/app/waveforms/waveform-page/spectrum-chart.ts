import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import { type WaveformRecord } from '#shared/contract/waveforms';
import { formatQuantity } from '#shared/quantities/format-quantity';
import { Chart } from '../../ui/chart/chart';
import { chartAxis, chartBase } from '../../ui/chart/chart-base';
import { type ChartColours } from '../../ui/chart/chart-colours';
import { type ChartOption } from '../../ui/chart/chart-engine';
import { ChartTable } from '../../ui/chart/chart-table';
import { QuantityPipe } from '../../ui/values/quantity-pipe';

/** The spectrum is drawn up to this harmonic of the line. */
const HARMONICS = 20;

/** Amplitudes by frequency, the harmonics of the mains marked. */
@Component({
  selector: 'qr-spectrum-chart',
  imports: [Chart, ChartTable, QuantityPipe],
  template: `
    <qr-chart [label]="sentence()" [options]="options()" [height]="200">
      <ng-template qrChartTable>
        <table class="mini">
          <thead>
            <tr>
              <th scope="col">Frequency</th>
              <th scope="col" class="right">Amplitude</th>
            </tr>
          </thead>
          <tbody>
            @for (line of record().analysis.harmonics; track line.hertz) {
              <tr>
                <th scope="row" class="num">{{ line.hertz | quantity: 'Hz' }}</th>
                <td class="num right">{{ line.amplitude | quantity: 'V' : { significant: 3 } }}</td>
              </tr>
            }
          </tbody>
        </table>
      </ng-template>
    </qr-chart>
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class SpectrumChart {
  readonly record = input.required<WaveformRecord>();

  protected readonly options = computed(() => spectrumOptions(this.record()));
  protected readonly sentence = computed(() => {
    const { atLine, atTwiceLine, lineHertz } = this.record().analysis;
    const volts = (value: number) => formatQuantity(value, 'V', { significant: 3 });
    const hertz = (value: number) => formatQuantity(value, 'Hz');
    return `Amplitudes by frequency: ${volts(atLine)} at ${hertz(lineHertz)}, ${volts(atTwiceLine)} at ${hertz(2 * lineHertz)}.`;
  });
}

function spectrumOptions({ spectrum, analysis }: WaveformRecord): (colours: ChartColours) => ChartOption {
  const { hertzPerBin, amplitudes } = spectrum;
  const most = HARMONICS * analysis.lineHertz;
  const shown = amplitudes.slice(0, Math.floor(most / (hertzPerBin || 1)) + 1);
  const line = shown.map((amplitude, bin) => [bin * hertzPerBin, amplitude]);
  return (colours) => {
    const axis = chartAxis(colours);
    return {
      ...chartBase(colours),
      xAxis: {
        ...axis,
        type: 'value',
        min: 0,
        max: most,
        interval: 2 * analysis.lineHertz,
        axisLabel: { ...axis.axisLabel, hideOverlap: true, formatter: (value: number) => formatQuantity(value, 'Hz') },
      },
      yAxis: {
        ...axis,
        type: 'value',
        min: 0,
        axisLine: { show: false },
        axisLabel: {
          ...axis.axisLabel,
          formatter: (value: number) => formatQuantity(value, 'V', { significant: 3 }),
        },
      },
      series: [
        {
          type: 'line',
          data: line,
          showSymbol: false,
          silent: true,
          lineStyle: { color: colours.chart1, width: 1.4 },
        },
        {
          type: 'scatter',
          data: analysis.harmonics.map(({ hertz, amplitude }) => [hertz, amplitude]),
          symbol: 'circle',
          symbolSize: 6,
          silent: true,
          itemStyle: { color: colours.sheet, borderColor: colours.chart1, borderWidth: 1.4 },
        },
      ],
    };
  };
}
