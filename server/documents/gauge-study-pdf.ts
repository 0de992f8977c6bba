import {
  criteriaOf,
  negativeSentence,
  poolingSentence,
  smallStudySentences,
  verdictTitle,
  VERDICT_SOURCE,
} from '#shared/papers/gauge-study-words';
import { formatLimits } from '#shared/quantities/format-quantity';
import { leadingTable } from '#shared/statistics/gauge-study/leading-table';
import { groupsByPart, groupsByPerson } from '#shared/statistics/gauge-study/study-groups';
import { CHART_HEIGHT, groupsChart } from './gauge-study-chart';
import { type GaugeStudyPaper } from './gauge-study-paper';
import { readingsTable, sharesTable, varianceLines } from './gauge-study-tables';
import { LEFT, Paper, WIDTH } from './paper';
import { heading, HEADING_HEIGHT, paragraph, titledTable } from './paper-blocks';
import { LINE_2 } from './paper-colours';
import { bytesOf, openDocument } from './paper-document';
import { drawFact, type Fact } from './paper-facts';
import { feet } from './paper-feet';
import { paperHead } from './paper-head';
import { utcDay, utcMinute } from './paper-time';
import { STYLES } from './text-style';

type Element = PDFKit.PDFStructureElement;

function statusText({ study, printedAt }: GaugeStudyPaper): string {
  return study.closedAt === null
    ? `Open; readings may still change. Printed ${utcMinute(printedAt)}`
    : `Closed ${utcMinute(study.closedAt)}`;
}

function factsOf(paper: GaugeStudyPaper): Fact[] {
  const { title, instrument, quantity, unit, decimals, lowerLimit, upperLimit, ...study } = paper.study;
  const style = STYLES.strong;
  const size = `${String(study.parts.length)} parts, ${String(study.persons.length)} persons, ${String(study.trials)} trials each`;
  const limits = formatLimits(lowerLimit, upperLimit, unit, decimals);
  return [
    { label: 'Study', value: title, style },
    { label: 'Instrument', value: `${instrument.assetNumber}, ${instrument.description}`, style },
    { label: 'Measured', value: `${quantity}, ${limits}`, style },
    { label: 'Size', value: size, style },
    { label: 'Begun', value: `${utcDay(study.createdAt)} by ${study.author}`, style },
    { label: 'Status', value: statusText(paper), style },
  ];
}

function facts(paper: Paper, parent: Element, data: GaugeStudyPaper): void {
  const table = paper.doc.struct('Table');
  parent.add(table);
  for (const fact of factsOf(data)) drawFact(paper, table, fact, WIDTH);
  table.end();
}

function verdict(paper: Paper, parent: Element, { study, results }: GaugeStudyPaper): void {
  paper.advance(15);
  paper.rule(LEFT, paper.y, WIDTH, LINE_2);
  paper.advance(13);
  paragraph(paper, parent, verdictTitle(results), { ...STYLES.statement, weight: 500, size: 16, leading: 24 });
  const size = { parts: study.parts.length, persons: study.persons.length };
  const sentences = criteriaOf(leadingTable(results).analysis).map(({ sentence }) => sentence);
  for (const sentence of [...sentences, ...smallStudySentences(size)])
    paragraph(paper, parent, sentence, STYLES.statement);
  paper.advance(12);
  paper.rule(LEFT, paper.y, WIDTH, LINE_2);
  paper.advance(19);
}

/** Both methods, each with its table, and the analysis of variance they rest on. */
function methods(paper: Paper, parent: Element, { study, results }: GaugeStudyPaper): void {
  const { unit } = study;
  const leading = leadingTable(results);
  titledTable(paper, parent, `By analysis of variance, σ in ${unit}`, sharesTable(paper, leading.analysis, unit));
  paper.advance(6);
  for (const sentence of [poolingSentence(results), negativeSentence(leading.analysis)].filter((text) => text !== ''))
    paragraph(paper, parent, sentence, STYLES.fine);
  paper.advance(14);
  titledTable(paper, parent, `Analysis of variance, squares in (${unit})²`, varianceLines(leading, unit));
  paper.advance(16);
  const { analysis } = results.averageRange;
  titledTable(paper, parent, `By average and range, σ in ${unit}`, sharesTable(paper, analysis, unit));
  paper.advance(6);
  const negative = negativeSentence(analysis);
  if (negative !== '') paragraph(paper, parent, negative, STYLES.fine);
  paragraph(paper, parent, VERDICT_SOURCE, STYLES.fine);
  paper.advance(18);
}

function charts(paper: Paper, parent: Element, data: GaugeStudyPaper): void {
  const { parts, persons, values, unit } = data.study;
  const readings = values.map((rows) => rows.map((cell) => cell.map((value) => value ?? 0)));
  for (const { title, ...chart } of [
    { title: `Readings and their mean in ${unit}, by part`, names: parts, groups: groupsByPart(readings) },
    {
      title: `Readings less the mean of their part in ${unit}, by person`,
      names: persons,
      groups: groupsByPerson(readings),
    },
  ]) {
    paper.keepTogether(HEADING_HEIGHT + CHART_HEIGHT);
    heading(paper, parent, title, LEFT);
    groupsChart(paper, parent, { ...chart, alt: `${title}; the readings stand in the table of readings.` }, data);
  }
}

function compose(paper: Paper, data: GaugeStudyPaper): void {
  const { doc } = paper;
  const { study, issuer } = data;
  const content = doc.struct('Document');
  doc.addStructure(content);
  const at = study.closedAt ?? study.createdAt;
  paperHead(paper, content, { issuer, title: 'Gauge study', kind: 'Study', number: study.number, at });
  facts(paper, content, data);
  verdict(paper, content, data);
  methods(paper, content, data);
  charts(paper, content, data);
  if (study.note !== '') {
    heading(paper, content, 'Note', LEFT);
    for (const text of study.note.split(/\r?\n/)) paragraph(paper, content, text, STYLES.text);
    paper.advance(18);
  }
  titledTable(paper, content, `Readings in ${study.unit}, by trial`, readingsTable(data));
  content.end();
  feet(paper, study.number, study.closedAt === null ? 'Open study' : `Closed ${utcDay(study.closedAt)}`);
}

/** A whole gauge study as a PDF: A4, tagged, fonts embedded. The same data gives the same bytes. */
export async function gaugeStudyPdf(data: GaugeStudyPaper): Promise<Buffer> {
  const { study, issuer, printedAt } = data;
  const doc = openDocument({
    title: `Gauge study ${study.number}`,
    author: issuer.name,
    subject: `${study.instrument.assetNumber}, ${study.quantity}`,
    created: new Date(study.closedAt ?? printedAt),
  });
  const bytes = bytesOf(doc);
  compose(new Paper(doc), data);
  doc.end();
  return bytes;
}
