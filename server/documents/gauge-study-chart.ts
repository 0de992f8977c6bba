import { studyMeans } from '#shared/statistics/gauge-study/study-means';
import { type StudyReadings } from '#shared/statistics/gauge-study/gauge-study';
import { type GaugeStudyPaper } from './gauge-study-paper';
import { LEFT, type Paper, WIDTH } from './paper';
import { INK, INK_2, LINE, LINE_2, PRIMARY } from './paper-colours';
import { STYLES } from './text-style';

const HEIGHT = 150;
const LABELS = 18;
const INSET = 10;

/** Readings of one part or of one person, all less the first reading of the study. */
interface Group {
  name: string;
  readings: number[];
  mean: number;
}

/** The readings, grouped by part or by person. */
export function groupsOf({ study }: GaugeStudyPaper, by: 'part' | 'person'): Group[] {
  const given: StudyReadings = study.values.map((rows) => rows.map((cell) => cell.map((value) => value ?? 0)));
  const { readings, parts, persons } = studyMeans(given);
  if (by === 'part')
    return study.parts.map((name, nth) => ({ name, readings: readings[nth]?.flat() ?? [], mean: parts[nth] ?? 0 }));
  return study.persons.map((name, nth) => ({
    name,
    readings: readings.flatMap((rows) => rows[nth] ?? []),
    mean: persons[nth] ?? 0,
  }));
}

/** Where a reading stands: all of them fill the height of the chart. */
function scaleOf(groups: readonly Group[], top: number): (reading: number) => number {
  const all = groups.flatMap(({ readings }) => readings);
  const least = Math.min(...all);
  const spread = Math.max(...all) - least;
  const share = (reading: number) => (spread === 0 ? 0.5 : (reading - least) / spread);
  return (reading) => top + HEIGHT - INSET - share(reading) * (HEIGHT - 2 * INSET);
}

function drawGroup({ doc }: Paper, group: Group, left: number, width: number, y: (reading: number) => number): void {
  const middle = left + width / 2;
  const half = Math.min(18, width / 3);
  for (const reading of group.readings) doc.circle(middle, y(reading), 1.8).lineWidth(0.8).stroke(INK_2);
  doc
    .moveTo(middle - half, y(group.mean))
    .lineTo(middle + half, y(group.mean))
    .lineWidth(2)
    .stroke(PRIMARY);
}

function drawFrame(paper: Paper, top: number): void {
  const { doc } = paper;
  doc.rect(LEFT, top, WIDTH, HEIGHT).lineWidth(1).stroke(LINE);
  doc
    .moveTo(LEFT, top + HEIGHT)
    .lineTo(LEFT + WIDTH, top + HEIGHT)
    .lineWidth(1)
    .stroke(LINE_2);
}

/** Readings as circles and their mean as a bar, group beside group on one scale. */
export function groupsChart(
  paper: Paper,
  parent: PDFKit.PDFStructureElement,
  groups: readonly Group[],
  alt: string,
): void {
  const { doc } = paper;
  const top = paper.y;
  const width = WIDTH / groups.length;
  const style = { ...STYLES.fine, colour: INK };
  const draw = () => {
    drawFrame(paper, top);
    const y = scaleOf(groups, top);
    groups.forEach((group, nth) => {
      const left = LEFT + nth * width;
      drawGroup(paper, group, left, width, y);
      const name = paper.fitted(group.name, style, width - 4);
      const at = left + (width - paper.measure({ text: name, style })) / 2;
      paper.line([{ text: name, style }], at, top + HEIGHT + 2, style.leading);
    });
  };
  parent.add(doc.struct('Figure', { alt }, draw));
  paper.advance(HEIGHT + LABELS + 14);
}

/** Height that a chart takes with the names below it. */
export const CHART_HEIGHT = HEIGHT + LABELS + 14;
