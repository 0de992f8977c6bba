import { type CertificateData } from '#shared/papers/certificate-data';
import { shortDigest, signatures } from './certificate-foot';
import { certificateHead, factsAndPlate } from './certificate-head';
import { groupsTable, instrumentsTable, resultsTable } from './certificate-tables';
import { finePrint, statement } from './certificate-words';
import { BOTTOM, FIRST_LINE, LEFT, Paper, WIDTH } from './paper';
import { feet } from './paper-feet';
import { HEADING_HEIGHT, paragraph, titledTable } from './paper-blocks';
import { LINE_2 } from './paper-colours';
import { bytesOf, openDocument } from './paper-document';
import { tableHeight } from './paper-table';
import { STYLES } from './text-style';

type Element = PDFKit.PDFStructureElement;

function statementBetweenRules(paper: Paper, parent: Element, data: CertificateData): void {
  paper.advance(20);
  paper.rule(LEFT, paper.y, WIDTH, LINE_2);
  paper.advance(13);
  paragraph(paper, parent, statement(data), STYLES.statement);
  paper.advance(12);
  paper.rule(LEFT, paper.y, WIDTH, LINE_2);
  paper.advance(19);
}

/** Two tables that fit a page stand side by side; longer ones follow each other and may go over pages. */
function instrumentsAndGroups(paper: Paper, parent: Element, data: CertificateData): void {
  const left = instrumentsTable(data);
  const right = groupsTable(paper, data);
  const height = HEADING_HEIGHT + Math.max(tableHeight(paper, left), tableHeight(paper, right));
  if (height > BOTTOM - FIRST_LINE) {
    titledTable(paper, parent, 'Instruments', left);
    paper.advance(20);
    titledTable(paper, parent, 'Sampling groups', { ...right, x: LEFT });
    return;
  }
  paper.keepTogether(height);
  const top = paper.y;
  titledTable(paper, parent, 'Instruments', left);
  paper.y = top;
  titledTable(paper, parent, 'Sampling groups', right);
  paper.y = top + height;
}

function finePrintBelow(paper: Paper, parent: Element, data: CertificateData, dataDigest: string): void {
  paper.advance(8);
  for (const text of finePrint(data, dataDigest)) paragraph(paper, parent, text, STYLES.fine);
  paper.advance(14);
}

function compose(paper: Paper, data: CertificateData, dataDigest: string): void {
  const { doc } = paper;
  const content = doc.struct('Document');
  doc.addStructure(content);
  certificateHead(paper, content, data);
  factsAndPlate(paper, content, data);
  statementBetweenRules(paper, content, data);
  titledTable(paper, content, 'Results', resultsTable(paper, data));
  finePrintBelow(paper, content, data, dataDigest);
  instrumentsAndGroups(paper, content, data);
  signatures(paper, content, data);
  content.end();
  feet(paper, data.number, `Data digest ${shortDigest(dataDigest)}`);
}

/**
 * The certificate of conformance as a PDF: A4, tagged, fonts embedded. The same data gives the same bytes.
 *
 * @param dataDigest SHA-256 of the data, in hexadecimal
 */
export async function certificatePdf(data: CertificateData, dataDigest: string): Promise<Buffer> {
  const doc = openDocument({
    title: `Certificate of conformance ${data.number}`,
    author: data.issuer.name,
    subject: `Lot ${data.lot.number}, ${data.part.number}`,
    created: new Date(data.issuedAt),
  });
  const bytes = bytesOf(doc);
  compose(new Paper(doc), data, dataDigest);
  doc.end();
  return bytes;
}
