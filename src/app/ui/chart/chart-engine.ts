import { LineChart, type LineSeriesOption, ScatterChart, type ScatterSeriesOption } from 'echarts/charts';
import {
  DataZoomComponent,
  type DataZoomComponentOption,
  GridComponent,
  type GridComponentOption,
  MarkAreaComponent,
  MarkLineComponent,
} from 'echarts/components';
import { type ComposeOption, type ECharts, init, use } from 'echarts/core';
import { CanvasRenderer } from 'echarts/renderers';

use([CanvasRenderer, DataZoomComponent, GridComponent, LineChart, MarkAreaComponent, MarkLineComponent, ScatterChart]);

/** What a chart may be made of. */
export type ChartOption = ComposeOption<
  DataZoomComponentOption | GridComponentOption | LineSeriesOption | ScatterSeriesOption
>;
export type { ECharts };

/** Begins a chart in an element that has a size. */
export function startChart(element: HTMLElement): ECharts {
  return init(element, null, { renderer: 'canvas' });
}
