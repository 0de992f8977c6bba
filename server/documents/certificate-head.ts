import { type CertificateData } from '#shared/papers/certificate-data';
import { acceptedPlate, PLATE_HEIGHT, PLATE_WIDTH } from './accepted-plate';
import { certificateFacts } from './certificate-words';
import { LEFT, type Paper, WIDTH } from './paper';
import { drawFact, FACT_GAP } from './paper-facts';
import { paperHead } from './paper-head';
import { utcDay } from './paper-time';
import { STYLES } from './text-style';

type Element = PDFKit.PDFStructureElement;

const RIGHT = LEFT + WIDTH;
const GAP = 24;
const FACTS_WIDTH = WIDTH - PLATE_WIDTH - GAP;

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
    drawFact(paper, facts, { ...fact, style: nth === 0 ? STYLES.identifier : STYLES.strong }, FACTS_WIDTH);
  }
  facts.end();
  paper.y = Math.max(paper.y - FACT_GAP, top + PLATE_HEIGHT);
}

function signer({ inspector }: CertificateData): string {
  return inspector.stampNumber === null ? inspector.name : `${inspector.name}, stamp ${inspector.stampNumber}`;
}
