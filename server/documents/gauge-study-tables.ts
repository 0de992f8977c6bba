import { figureText, chanceText, percentText, sigmaText, squaresText } from '#shared/papers/gauge-study-figures';
import { SOURCE_TITLES, spreadTitle } from '#shared/papers/gauge-study-words';
import { formatNumber, inDisplayUnit } from '#shared/quantities/format-quantity';
import { type SpreadAnalysis, type SpreadShare, type VarianceTable } from '#shared/statistics/gauge-study/gauge-study';
import { type GaugeStudyPaper } from './gauge-study-paper';
import { LEFT, type Paper, WIDTH } from './paper';
import { INK, LINE_2 } from './paper-colours';
import { type Cell, type Column, type Table } from './paper-table';
import { STYLES } from './text-style';

const words = (text: string): Cell => ({ pieces: [{ text, style: STYLES.text }] });
const figures = (text: string): Cell => ({ pieces: [{ text, style: STYLES.reading }] });

const STRIP_WIDTH = 150;

/** A share as a strip of ink on a line that ends at the whole. */
function strip({ doc }: Paper, fraction: number | null): Cell {
  const draw = (x: number, y: number) => {
    doc
      .moveTo(x, y - 4)
      .lineTo(x + STRIP_WIDTH, y - 4)
      .lineWidth(1)
      .stroke(LINE_2);
    doc.rect(x, y - 8, STRIP_WIDTH * Math.min(1, fraction ?? 0), 8).fill(INK);
  };
  return { pieces: [], mark: { width: STRIP_WIDTH, draw } };
}

const SHARE_COLUMNS: Column[] = [
  { head: 'Share of the spread', x: 0, width: 170, align: 'left' },
  { head: 'σ', x: 174, width: 84, align: 'right' },
  { head: 'of total σ', x: 262, width: 68, align: 'right' },
  { head: 'of variance', x: 334, width: 72, align: 'right' },
  { head: '6σ of tolerance', x: 410, width: 82, align: 'right' },
  { head: 'Share of total σ', x: 500, width: STRIP_WIDTH, align: 'left' },
];

function shareRow(paper: Paper, share: SpreadShare, analysis: SpreadAnalysis, unit: string): Cell[] {
  return [
    words(spreadTitle(share.spread, analysis)),
    figures(sigmaText(share.sigma, unit)),
    figures(percentText(share.ofVariation)),
    figures(percentText(share.ofVariance)),
    figures(percentText(share.ofTolerance)),
    strip(paper, share.ofVariation),
  ];
}

/** The shares that one method splits the spread into. */
export function sharesTable(paper: Paper, analysis: SpreadAnalysis, unit: string): Table {
  const rows = analysis.shares.map((share) => shareRow(paper, share, analysis, unit));
  return { x: LEFT, width: WIDTH, columns: SHARE_COLUMNS, rows, rowHeight: 23 };
}

const VARIANCE_COLUMNS: Column[] = [
  { head: 'Source', x: 0, width: 130, align: 'left' },
  { head: 'Degrees', x: 134, width: 56, align: 'right' },
  { head: 'Sum of squares', x: 194, width: 110, align: 'right' },
  { head: 'Mean square', x: 308, width: 104, align: 'right' },
  { head: 'F', x: 416, width: 66, align: 'right' },
  { head: 'p', x: 486, width: 58, align: 'right' },
  { head: 'F divides by', x: 552, width: 98, align: 'left' },
];

/** The table of the analysis of variance; squares in the square of the display unit. */
export function varianceLines({ lines }: VarianceTable, unit: string): Table {
  const rows = lines.map((line) => [
    words(SOURCE_TITLES[line.source]),
    figures(formatNumber(line.degreesOfFreedom, 0)),
    figures(squaresText(line.sumOfSquares, unit)),
    figures(line.meanSquare === null ? '' : squaresText(line.meanSquare, unit)),
    figures(line.f === null ? '' : figureText(line.f)),
    figures(line.p === null ? '' : chanceText(line.p)),
    words(line.against === null ? '' : SOURCE_TITLES[line.against]),
  ]);
  return { x: LEFT, width: WIDTH, columns: VARIANCE_COLUMNS, rows, rowHeight: 23 };
}

/** Part and person take this much of the width, the trials the rest. */
const NAMES_WIDTH = 250;
/** Readings on one line at most; a study of more trials has a second line. */
const ON_A_LINE = 5;

function readingColumns(trials: number): Column[] {
  const onALine = Math.min(trials, ON_A_LINE);
  const width = (WIDTH - NAMES_WIDTH) / onALine;
  return Array.from({ length: onALine }, (_, nth): Column => {
    const heads = [nth + 1, nth + 1 + ON_A_LINE].filter((trial) => trial <= trials);
    return { head: heads.join(', '), x: NAMES_WIDTH + nth * width + 4, width: width - 4, align: 'right' };
  });
}

/** All readings: a line for each part and person, or two. */
export function readingsTable({ study }: GaugeStudyPaper): Table {
  const { parts, persons, trials, values, unit, decimals } = study;
  const columns: Column[] = [
    { head: 'Part', x: 0, width: 116, align: 'left' },
    { head: 'Person', x: 122, width: NAMES_WIDTH - 122, align: 'left' },
    ...readingColumns(trials),
  ];
  const reading = (value: number | null) =>
    figures(value === null ? '–' : formatNumber(inDisplayUnit(value, unit), decimals));
  const rows = parts.flatMap((part, ofPart) =>
    persons.flatMap((person, ofPerson) => {
      const cells = (values[ofPart]?.[ofPerson] ?? []).map(reading);
      const lines = [cells.slice(0, ON_A_LINE), cells.slice(ON_A_LINE)].filter((line) => line.length > 0);
      return lines.map((line) => [words(part), words(person), ...line]);
    }),
  );
  return { x: LEFT, width: WIDTH, columns, rows, rowHeight: 20 };
}
