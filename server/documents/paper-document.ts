import PDFDocument from 'pdfkit';

/** What a reader of the file shows as its properties. */
export interface DocumentInfo {
  title: string;
  author: string;
  subject: string;
  created: Date;
}

/** An empty document: A4, tagged, in English; the same content gives the same bytes. */
export function openDocument({ title, author, subject, created }: DocumentInfo): PDFKit.PDFDocument {
  return new PDFDocument({
    size: 'A4',
    margin: 0,
    autoFirstPage: false,
    bufferPages: true,
    pdfVersion: '1.7',
    tagged: true,
    lang: 'en',
    displayTitle: true,
    info: { Title: title, Author: author, Subject: subject, Creator: 'Quietrail', CreationDate: created },
  });
}

/** The bytes of a document once it is ended. */
export function bytesOf(doc: PDFKit.PDFDocument): Promise<Buffer> {
  return new Promise((resolve, reject) => {
    const chunks: Buffer[] = [];
    doc.on('data', (chunk: Buffer) => chunks.push(chunk));
    doc.on('end', () => resolve(Buffer.concat(chunks)));
    doc.on('error', reject);
  });
}
