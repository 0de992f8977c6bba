import { type CertificateData } from '#shared/papers/certificate-data';
import { acceptedPlate, PLATE_HEIGHT, PLATE_WIDTH } from './accepted-plate';
import { certificateFacts } from './certificate-words';
import { LEFT, type Paper, WIDTH } from './paper';
import { paperHead } from './paper-head';
import { utcDay } from './paper-time';
import { ROW_HEAD } from './table-head';
import { STYLES, type TextStyle } from './text-style';

type Element = PDFKit.PDFStructureElement;

const RIGHT = LEFT + WIDTH;
const LABEL_WIDTH = 78;
const GAP = 24;
const FACT_GAP = 5;

/** Who issues it, the title, and at the right the number. */
export function certificateHead(paper: Paper, parent: Element, { issuer, number, issuedAt }: CertificateData): void {
  paperHead(paper, parent, { issuer, title: 'Certificate of conformance', kind: 'Certificate', number, at: issuedAt });
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
