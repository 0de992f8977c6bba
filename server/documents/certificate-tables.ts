import { INSTRUMENT_KIND_TITLES } from '#shared/contract/instruments';
import { type CertificateData } from '#shared/papers/certificate-data';
import { type NonconformityClass } from '#shared/sampling/scheme';
import { formatNumber } from '#shared/quantities/format-quantity';
import { findings, limitsText, meanText, resultName, uncertaintyCell } from './certificate-words';
import { CLASS_GLYPH_WIDTH, classGlyph } from './class-glyph';
import { LEFT, type Paper, WIDTH } from './paper';
import { type Cell, type Column, type Table } from './paper-table';
import { STYLES } from './text-style';

const words = (text: string): Cell => ({ pieces: [{ text, style: STYLES.text }] });
const figures = (text: string): Cell => ({ pieces: [{ text, style: STYLES.reading }] });
const count = (value: number) => figures(formatNumber(value, 0));
const acceptReject = (acceptance: number, rejection: number) => figures(`${acceptance}\u00a0/\u00a0${rejection}`);

function classCell({ doc }: Paper, kind: NonconformityClass): Cell {
  return {
    pieces: [{ text: kind.charAt(0).toUpperCase() + kind.slice(1), style: STYLES.class }],
    mark: { width: CLASS_GLYPH_WIDTH, draw: (x, y) => classGlyph(doc, kind, x, y) },
  };
}

const RESULT_COLUMNS: Column[] = [
  { head: 'Characteristic', x: 0, width: 140, align: 'left' },
  { head: 'Class', x: 145, width: 58, align: 'left' },
  { head: 'Limits', x: 206, width: 113, align: 'left' },
  { head: 'n', x: 319, width: 23, align: 'right' },
  { head: 'Found', x: 344, width: 33, align: 'right' },
  { head: 'Range of readings', x: 385, width: 126, align: 'left' },
  { head: 'U', x: 511, width: 46, align: 'right' },
  { head: 'Mean', x: 559, width: 45, align: 'right' },
  { head: 'Ac / Re', x: 606, width: 44, align: 'right' },
];

export function resultsTable(paper: Paper, { results }: CertificateData): Table {
  const rows = results.map((result) => {
    const set = result.kind === 'attribute' ? words : figures;
    return [
      words(resultName(result)),
      classCell(paper, result.class),
      set(limitsText(result)),
      count(result.n),
      count(result.found),
      set(findings(result)),
      figures(uncertaintyCell(result)),
      figures(meanText(result)),
      acceptReject(result.acceptance, result.rejection),
    ];
  });
  return { x: LEFT, width: WIDTH, columns: RESULT_COLUMNS, rows, rowHeight: 25 };
}

const HALF = 307;

const INSTRUMENT_COLUMNS: Column[] = [
  { head: 'Instrument', x: 0, width: 84, align: 'left' },
  { head: 'Kind', x: 92, width: 123, align: 'left' },
  { head: 'Calibration due', x: 223, width: 84, align: 'right' },
];

/** Titles of the kinds of instrument; a kind unknown here is printed as it is kept. */
const KIND_TITLES = new Map<string, string>(Object.entries(INSTRUMENT_KIND_TITLES));

export function instrumentsTable({ instruments }: CertificateData): Table {
  const rows = instruments.map(({ assetNumber, kind, calibrationDue }) => [
    figures(assetNumber),
    words(KIND_TITLES.get(kind) ?? kind),
    words(calibrationDue.slice(0, 10)),
  ]);
  return { x: LEFT, width: HALF, columns: INSTRUMENT_COLUMNS, rows, rowHeight: 23 };
}

const GROUP_COLUMNS: Column[] = [
  { head: 'Class', x: 0, width: 68, align: 'left' },
  { head: 'Level', x: 72, width: 30, align: 'left' },
  { head: 'Letter', x: 106, width: 32, align: 'left' },
  { head: 'AQL', x: 140, width: 40, align: 'right' },
  { head: 'n', x: 184, width: 34, align: 'right' },
  { head: 'Found', x: 222, width: 36, align: 'right' },
  { head: 'Ac / Re', x: 262, width: 45, align: 'right' },
];

export function groupsTable(paper: Paper, { groups }: CertificateData): Table {
  const rows = groups.map((group) => [
    classCell(paper, group.class),
    words(group.level),
    words(group.codeLetter),
    figures(group.aql),
    count(group.sampleSize),
    count(group.found),
    acceptReject(group.acceptance, group.rejection),
  ]);
  return { x: LEFT + WIDTH - HALF, width: HALF, columns: GROUP_COLUMNS, rows, rowHeight: 23 };
}
