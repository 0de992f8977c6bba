import { type WaveformPeak, type WaveformRecord } from '#shared/contract/waveforms';
import { formatQuantity } from '#shared/quantities/format-quantity';
import { chartAxis, chartBase } from '../../ui/chart/chart-base';
import { type ChartColours } from '../../ui/chart/chart-colours';
import { type ChartOption } from '../../ui/chart/chart-engine';
import { type WaveSamples } from './wave-samples';
import { type Share } from './wave-window';

/** What is drawn of a waveform. */
export interface DrawnWave {
  readonly samples: WaveSamples;
  readonly spacing: WaveformRecord['spacing'];
  readonly peaks: readonly WaveformPeak[];
  readonly oddMean: number | null;
  readonly evenMean: number | null;
  /** The part that is shown. */
  readonly share: Share;
  /** Number among the peaks of the one that is being moved; null while none is. */
  readonly chosen: number | null;
}

/** Columns of the envelope; more than a screen has pixels across would draw nothing more. */
const COLUMNS = 1200;
/** Up to so many samples are drawn one by one. */
const ONE_BY_ONE = 2400;
const PEAK_SIZE = 9;
const ABOVE = -12;

/** Points of the line: samples where they are few, lowest and highest of each column where they are many. */
export function drawnPoints({ samples, spacing, share }: DrawnWave): [number, number][] {
  const { volts, pyramid } = samples;
  const { start, interval } = spacing;
  const from = Math.max(0, Math.floor(share.from * (volts.length - 1)));
  const to = Math.min(volts.length, Math.ceil(share.to * (volts.length - 1)) + 1);
  if (to - from <= ONE_BY_ONE)
    return Array.from({ length: to - from }, (_, at) => [start + (from + at) * interval, volts[from + at] ?? 0]);
  const { low, high } = pyramid.between(from, to, COLUMNS);
  const width = (to - from) / COLUMNS;
  return Array.from({ length: COLUMNS }, (_, column): [number, number][] => {
    const seconds = start + (from + (column + 0.5) * width) * interval;
    // Up and down in turn, so that the line joins what lies side by side.
    const pair: [number, number][] = [
      [seconds, low[column] ?? 0],
      [seconds, high[column] ?? 0],
    ];
    return column % 2 === 0 ? pair : pair.reverse();
  }).flat();
}

export const secondsText = (seconds: number) => formatQuantity(seconds, 's');
/** Labels of an axis all have the digits that tell them apart. */
const voltsText = (volts: number) => formatQuantity(volts, 'V', { significant: 4 });

function familyLine(mean: number | null, name: string, colours: ChartColours) {
  return mean === null
    ? undefined
    : {
        silent: true,
        symbol: 'none',
        lineStyle: { color: colours.ink2, type: 'dashed' as const, width: 1 },
        label: {
          formatter: `${name}\n${voltsText(mean)}`,
          position: 'end' as const,
          color: colours.ink2,
          fontSize: 11,
        },
        data: [{ yAxis: mean }],
      };
}

function peakSeries(drawn: DrawnWave, family: WaveformPeak['family'], colours: ChartColours) {
  const mean = family === 'odd' ? drawn.oddMean : drawn.evenMean;
  const points = drawn.peaks.flatMap((peak, nth) => {
    if (peak.family !== family) return [];
    const isChosen = nth === drawn.chosen;
    const isFilled = family === 'odd' && drawn.chosen === null;
    return [
      {
        value: [peak.seconds, peak.volts],
        symbolSize: isChosen ? PEAK_SIZE * 1.6 : PEAK_SIZE,
        itemStyle: {
          color: isFilled ? colours.chart1 : colours.sheet,
          borderColor: isChosen ? colours.nok : colours.chart1,
          borderWidth: isChosen ? 2.4 : 1.4,
        },
      },
    ];
  });
  const markLine = familyLine(mean, family === 'odd' ? 'odd' : 'even', colours);
  return {
    type: 'scatter' as const,
    data: points,
    symbol: 'triangle',
    symbolRotate: 180,
    symbolOffset: [0, ABOVE] as [number, number],
    silent: true,
    z: 4,
    ...(markLine && { markLine }),
  };
}

/** The waveform as its line, its peaks by family, and their means. */
export function waveOptions(drawn: DrawnWave): (colours: ChartColours) => ChartOption {
  const { samples, spacing, share } = drawn;
  const { start, interval } = spacing;
  const end = start + (samples.volts.length - 1) * interval;
  const points = drawnPoints(drawn);
  const zoom = { xAxisIndex: 0, start: share.from * 100, end: share.to * 100 };
  return (colours) => {
    const axis = chartAxis(colours);
    return {
      ...chartBase(colours),
      grid: { left: 8, right: 68, top: 28, bottom: 48, outerBoundsMode: 'same', outerBoundsContain: 'axisLabel' },
      dataZoom: [
        { type: 'inside', ...zoom, zoomOnMouseWheel: 'ctrl', moveOnMouseWheel: false, filterMode: 'none' },
        {
          type: 'slider',
          ...zoom,
          height: 22,
          bottom: 6,
          showDetail: false,
          brushSelect: false,
          filterMode: 'none',
          borderColor: colours.line,
          fillerColor: colours.container,
          handleStyle: { color: colours.sheet, borderColor: colours.chart1 },
          moveHandleStyle: { color: colours.line },
          dataBackground: { lineStyle: { opacity: 0 }, areaStyle: { opacity: 0 } },
          selectedDataBackground: { lineStyle: { opacity: 0 }, areaStyle: { opacity: 0 } },
        },
      ],
      xAxis: {
        ...axis,
        type: 'value',
        min: start,
        max: end,
        axisLabel: { ...axis.axisLabel, hideOverlap: true, formatter: (value: number) => secondsText(value) },
      },
      yAxis: {
        ...axis,
        type: 'value',
        scale: true,
        axisLine: { show: false },
        axisLabel: { ...axis.axisLabel, formatter: (value: number) => voltsText(value) },
      },
      series: [
        {
          type: 'line',
          data: points,
          showSymbol: false,
          silent: true,
          lineStyle: { color: colours.chart1, width: 1.8 },
          sampling: undefined,
        },
        peakSeries(drawn, 'odd', colours),
        peakSeries(drawn, 'even', colours),
      ],
    };
  };
}
