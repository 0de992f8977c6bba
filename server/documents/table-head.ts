type Options = PDFKit.Mixins.StructureElementOptions;

/** What a head cell of a table is the head of; pdfkit writes it, its type declarations leave it out. */
type HeadOptions = Options & { scope: 'Column' | 'Row' };

export const COLUMN_HEAD: HeadOptions = { scope: 'Column' };
export const ROW_HEAD: HeadOptions = { scope: 'Row' };
