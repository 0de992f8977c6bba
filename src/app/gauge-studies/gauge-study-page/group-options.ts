import { inDisplayUnit } from '#shared/quantities/display-unit';
import { formatNumber } from '#shared/quantities/format-number';
import { type ReadingGroup } from '#shared/statistics/gauge-study/study-groups';
import { chartAxis, chartBase } from '../../ui/chart/chart-base';
import { type ChartColours } from '../../ui/chart/chart-colours';
import { type ChartOption } from '../../ui/chart/chart-engine';

/** Groups of readings that stand side by side; values in SI base units. */
export interface GroupsOfReadings {
  readonly names: readonly string[];
  readonly groups: readonly ReadingGroup[];
  readonly unit: string;
  readonly decimals: number;
}

/** With more groups their names no longer all have room. */
const MOST_NAMES = 16;
/** Room for the names together, and for one alone at most, in px. */
const NAMES_WIDTH = 560;
const NAME_WIDTH = 160;

/** Readings as white-filled circles and their mean as a bar, group beside group on one scale. */
export function groupOptions({ names, groups, unit, decimals }: GroupsOfReadings) {
  const points = groups.flatMap(({ readings }, group) =>
    readings.map((reading) => [group, inDisplayUnit(reading, unit)]),
  );
  const means = groups.map(({ mean }, group) => [group, inDisplayUnit(mean, unit)]);
  return (colours: ChartColours): ChartOption => {
    const axis = chartAxis(colours);
    return {
      ...chartBase(colours),
      xAxis: {
        ...axis,
        type: 'category',
        data: [...names],
        splitLine: { show: false },
        axisLabel: {
          ...axis.axisLabel,
          interval: names.length <= MOST_NAMES ? 0 : 'auto',
          width: Math.min(NAME_WIDTH, NAMES_WIDTH / Math.min(names.length, MOST_NAMES)),
          overflow: 'truncate',
          ellipsis: '…',
          hideOverlap: true,
        },
      },
      yAxis: {
        ...axis,
        type: 'value',
        scale: true,
        axisLine: { show: false },
        axisLabel: { ...axis.axisLabel, formatter: (value: number) => formatNumber(value, decimals) },
      },
      series: [
        {
          type: 'scatter',
          data: points,
          symbol: 'circle',
          symbolSize: 6,
          silent: true,
          itemStyle: { color: colours.sheet, borderColor: colours.chart1, borderWidth: 1.2 },
        },
        {
          type: 'scatter',
          data: means,
          symbol: 'rect',
          symbolSize: [28, 2],
          silent: true,
          itemStyle: { color: colours.chart1 },
        },
      ],
    };
  };
}
