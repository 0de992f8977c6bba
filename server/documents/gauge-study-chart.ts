import { formatNumber, inDisplayUnit } from '#shared/quantities/format-quantity';
import { type ReadingGroup } from '#shared/statistics/gauge-study/study-groups';
import { type GaugeStudyPaper } from './gauge-study-paper';
import { LEFT, type Paper, WIDTH } from './paper';
import { INK, INK_2, LINE, LINE_2, PRIMARY } from './paper-colours';
import { STYLES } from './text-style';

/** Groups of readings side by side on one scale. */
export interface GroupsChart {
  names: readonly string[];
  groups: readonly ReadingGroup[];
  /** What a reader who does not see it is told. */
  alt: string;
}

const HEIGHT = 150;
const INSET = 10;
/** Room at the left for the largest and the smallest reading. */
const SCALE_WIDTH = 66;
const PLOT_LEFT = LEFT + SCALE_WIDTH;
const PLOT_WIDTH = WIDTH - SCALE_WIDTH;
/** Height that a chart takes with the names below it. */
export const CHART_HEIGHT = HEIGHT + 32;

const STYLE = { ...STYLES.fine, colour: INK };

interface Scale {
  least: number;
  most: number;
  y: (reading: number) => number;
}

/** Where a reading stands: all of them fill the height of the chart. */
function scaleOf(groups: readonly ReadingGroup[], top: number): Scale {
  const all = groups.flatMap(({ readings }) => readings);
  const [least, most] = [Math.min(...all), Math.max(...all)];
  const share = (reading: number) => (most === least ? 0.5 : (reading - least) / (most - least));
  return { least, most, y: (reading) => top + HEIGHT - INSET - share(reading) * (HEIGHT - 2 * INSET) };
}

function drawGroup({ doc }: Paper, { readings, mean }: ReadingGroup, middle: number, half: number, scale: Scale): void {
  for (const reading of readings) doc.circle(middle, scale.y(reading), 1.8).lineWidth(0.8).stroke(INK_2);
  doc
    .moveTo(middle - half, scale.y(mean))
    .lineTo(middle + half, scale.y(mean))
    .lineWidth(2)
    .stroke(PRIMARY);
}

function drawFrame(paper: Paper, top: number, { least, most, y }: Scale, { study }: GaugeStudyPaper): void {
  const { doc } = paper;
  doc.rect(PLOT_LEFT, top, PLOT_WIDTH, HEIGHT).lineWidth(1).stroke(LINE);
  doc
    .moveTo(PLOT_LEFT, top + HEIGHT)
    .lineTo(PLOT_LEFT + PLOT_WIDTH, top + HEIGHT)
    .lineWidth(1)
    .stroke(LINE_2);
  for (const reading of least === most ? [least] : [least, most]) {
    const text = formatNumber(inDisplayUnit(reading, study.unit), study.decimals);
    paper.lineEndingAt(text, STYLES.footer, PLOT_LEFT - 6, y(reading) - STYLES.footer.leading / 2);
  }
}

/** The name of a group below it; where the name has no room, its place in the order. */
function drawName(paper: Paper, name: string, nth: number, left: number, width: number, top: number): void {
  const fits = paper.measure({ text: name, style: STYLE }) <= width - 4;
  const text = fits || width > 60 ? paper.fitted(name, STYLE, width - 4) : String(nth + 1);
  const at = left + (width - paper.measure({ text, style: STYLE })) / 2;
  paper.line([{ text, style: STYLE }], at, top + HEIGHT + 2, STYLE.leading);
}

/** Readings as circles and their mean as a bar, group beside group. */
export function groupsChart(
  paper: Paper,
  parent: PDFKit.PDFStructureElement,
  { names, groups, alt }: GroupsChart,
  data: GaugeStudyPaper,
): void {
  const top = paper.y;
  const width = PLOT_WIDTH / groups.length;
  const scale = scaleOf(groups, top);
  const draw = () => {
    drawFrame(paper, top, scale, data);
    groups.forEach((group, nth) => {
      const left = PLOT_LEFT + nth * width;
      drawGroup(paper, group, left + width / 2, Math.min(18, width / 3), scale);
      drawName(paper, names[nth] ?? '', nth, left, width, top);
    });
  };
  parent.add(paper.doc.struct('Figure', { alt }, draw));
  paper.advance(CHART_HEIGHT);
}
