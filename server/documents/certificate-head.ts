import { type CertificateData } from '#shared/papers/certificate-data';
import { acceptedPlate, PLATE_HEIGHT, PLATE_WIDTH } from './accepted-plate';
import { certificateFacts } from './certificate-words';
import { LEFT, type Paper, WIDTH } from './paper';
import { utcDay } from './paper-time';
import { type Piece } from './text-lines';
import { ROW_HEAD } from './table-head';
import { STYLES, type TextStyle } from './text-style';

type Element = PDFKit.PDFStructureElement;

const RIGHT = LEFT + WIDTH;
const SENDER_WIDTH = 440;
const LABEL_WIDTH = 78;
const GAP = 24;
const FACT_GAP = 5;

/** Who issues it, the title, and at the right the number. */
export function certificateHead(paper: Paper, parent: Element, data: CertificateData): void {
  const { doc } = paper;
  const { issuer } = data;
  const sender: Piece[] = [
    { text: issuer.name, style: STYLES.strong },
    { text: `, ${issuer.department}`, style: STYLES.quiet },
  ];
  const address = issuer.address.split(/\r?\n/).map((text) => [{ text, style: STYLES.quiet }]);
  for (const pieces of [sender, ...address]) {
    const lines = paper.wrap(pieces, SENDER_WIDTH);
    parent.add(doc.struct('P', {}, () => paper.lines(lines, LEFT, paper.y, STYLES.quiet.leading)));
    paper.advance(lines.length * STYLES.quiet.leading);
  }
  paper.advance(10);
  const title: Piece = { text: 'Certificate of conformance', style: STYLES.title };
  parent.add(doc.struct('H1', {}, () => paper.line([title], LEFT, paper.y, STYLES.title.leading)));
  const bottom = paper.y + STYLES.title.leading;
  drawNumber(paper, parent, data, bottom);
  paper.advance(STYLES.title.leading + 22);
}

function drawNumber(paper: Paper, parent: Element, data: CertificateData, bottom: number): void {
  const rows = [
    { text: 'Certificate', style: STYLES.quiet },
    { text: data.number, style: STYLES.number },
    { text: utcDay(data.issuedAt), style: STYLES.quiet },
  ];
  let y = bottom - rows.reduce((height, row) => height + row.style.leading, 0);
  for (const { text, style } of rows) {
    const top = y;
    parent.add(paper.doc.struct('P', {}, () => paper.lineEndingAt(text, style, RIGHT, top)));
    y += style.leading;
  }
}

/** The facts at the left, the plate at the right. */
export function factsAndPlate(paper: Paper, parent: Element, data: CertificateData): void {
  const top = paper.y;
  acceptedPlate(paper, parent, RIGHT - PLATE_WIDTH, {
    topLeft: data.lot.number,
    topRight: utcDay(data.issuedAt),
    bottomLeft: `n\u00a0${data.sampleSize}`,
    bottomRight: signer(data),
  });
  const facts = paper.doc.struct('Table');
  parent.add(facts);
  for (const [nth, fact] of certificateFacts(data).entries()) {
    drawFact(paper, facts, fact, nth === 0 ? STYLES.identifier : STYLES.strong);
  }
  facts.end();
  paper.y = Math.max(paper.y - FACT_GAP, top + PLATE_HEIGHT);
}

function signer({ inspector }: CertificateData): string {
  return inspector.stampNumber === null ? inspector.name : `${inspector.name}, stamp ${inspector.stampNumber}`;
}

function drawFact(paper: Paper, facts: Element, fact: { label: string; value: string }, style: TextStyle): void {
  const { doc, y } = paper;
  const { leading } = style;
  const width = WIDTH - PLATE_WIDTH - GAP - LABEL_WIDTH;
  const lines = paper.wrap([{ text: fact.value, style }], width);
  const label = () => paper.line([{ text: fact.label, style: STYLES.quiet }], LEFT, y, leading);
  const value = () => paper.lines(lines, LEFT + LABEL_WIDTH, y, leading);
  facts.add(doc.struct('TR', {}, [doc.struct('TH', ROW_HEAD, label), doc.struct('TD', {}, value)]));
  paper.advance(lines.length * leading + FACT_GAP);
}
