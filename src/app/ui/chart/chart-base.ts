import { type ChartColours } from './chart-colours';
import { type ChartOption } from './chart-engine';

const MONO = "'Roboto Mono', ui-monospace, monospace";

/** What every chart has in common: no animation, small mono figures. Spread it first. */
export function chartBase(colours: ChartColours): ChartOption {
  return {
    animation: false,
    textStyle: { fontFamily: MONO, fontSize: 11, color: colours.ink2 },
    grid: { left: 8, right: 12, top: 12, bottom: 4, outerBoundsMode: 'same', outerBoundsContain: 'axisLabel' },
  };
}

/** The look of an axis: labels in quiet figures, hairlines across. */
export function chartAxis(colours: ChartColours) {
  return {
    axisLine: { lineStyle: { color: colours.line } },
    axisTick: { show: false },
    axisLabel: { color: colours.ink2, fontFamily: MONO, fontSize: 11 },
    splitLine: { lineStyle: { color: colours.grid } },
  };
}
