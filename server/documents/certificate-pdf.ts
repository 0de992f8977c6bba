import { type CertificateData } from '#shared/papers/certificate-data';
import PDFDocument from 'pdfkit';
import { feet, signatures } from './certificate-foot';
import { certificateHead, factsAndPlate } from './certificate-head';
import { groupsTable, instrumentsTable, resultsTable } from './certificate-tables';
import { finePrint, statement } from './certificate-words';
import { BOTTOM, FIRST_LINE, LEFT, Paper, WIDTH } from './paper';
import { LINE_2 } from './paper-colours';
import { drawTable, type Table, tableHeight } from './paper-table';
import { STYLES, type TextStyle } from './text-style';

type Element = PDFKit.PDFStructureElement;

const HEADING_HEIGHT = 22;
/** A heading stays with the head and the first row of its table. */
const TABLE_START = HEADING_HEIGHT + 24 + 25;

function paragraph(paper: Paper, parent: Element, text: string, style: TextStyle): void {
  const lines = paper.wrap([{ text, style }], WIDTH);
  paper.keepTogether(lines.length * style.leading);
  parent.add(paper.doc.struct('P', {}, () => paper.lines(lines, LEFT, paper.y, style.leading)));
  paper.advance(lines.length * style.leading);
}

function heading(paper: Paper, parent: Element, text: string, x: number): void {
  const style = STYLES.heading;
  parent.add(paper.doc.struct('H2', {}, () => paper.line([{ text, style }], x, paper.y, style.leading)));
  paper.advance(HEADING_HEIGHT);
}

function statementBetweenRules(paper: Paper, parent: Element, data: CertificateData): void {
  paper.advance(20);
  paper.rule(LEFT, paper.y, WIDTH, LINE_2);
  paper.advance(13);
  paragraph(paper, parent, statement(data), STYLES.statement);
  paper.advance(12);
  paper.rule(LEFT, paper.y, WIDTH, LINE_2);
  paper.advance(19);
}

function titledTable(paper: Paper, parent: Element, title: string, table: Table): void {
  paper.keepTogether(TABLE_START);
  heading(paper, parent, title, table.x);
  drawTable(paper, parent, table);
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

function openDocument(data: CertificateData): PDFKit.PDFDocument {
  return new PDFDocument({
    size: 'A4',
    margin: 0,
    autoFirstPage: false,
    bufferPages: true,
    pdfVersion: '1.7',
    tagged: true,
    lang: 'en',
    displayTitle: true,
    info: {
      Title: `Certificate of conformance ${data.number}`,
      Author: data.issuer.name,
      Subject: `Lot ${data.lot.number}, ${data.part.number}`,
      Creator: 'Quietrail',
      CreationDate: new Date(data.issuedAt),
    },
  });
}

function bytesOf(doc: PDFKit.PDFDocument): Promise<Buffer> {
  return new Promise((resolve, reject) => {
    const chunks: Buffer[] = [];
    doc.on('data', (chunk: Buffer) => chunks.push(chunk));
    doc.on('end', () => resolve(Buffer.concat(chunks)));
    doc.on('error', reject);
  });
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
  feet(paper, data.number, dataDigest);
}

/**
 * The certificate of conformance as a PDF: A4, tagged, fonts embedded. The same data gives the same bytes.
 *
 * @param dataDigest SHA-256 of the data, in hexadecimal
 */
export async function certificatePdf(data: CertificateData, dataDigest: string): Promise<Buffer> {
  const doc = openDocument(data);
  const bytes = bytesOf(doc);
  compose(new Paper(doc), data, dataDigest);
  doc.end();
  return bytes;
}
