import { type CertificateData, type Signature } from '#shared/papers/certificate-data';
import { BOTTOM, LEFT, type Paper } from './paper';
import { INK } from './paper-colours';
import { utcMinute } from './paper-time';
import { type Piece, type TextLine } from './text-lines';
import { STYLES } from './text-style';

const SIGNATURE_WIDTH = 309;
const ROOM_TO_SIGN = 20;
const BELOW_LINE = 6;
const SPACE_BEFORE = 8;
/** On a later page the signatures follow the content; on the first they stand at its end. */
const SPACE_ON_LATER_PAGE = 40;

type Element = PDFKit.PDFStructureElement;

interface SignatureBlock {
  paragraphs: { lines: TextLine[]; leading: number }[];
  height: number;
}

function signatureBlock(paper: Paper, { name, title, stampNumber, signedAt }: Signature): SignatureBlock {
  const texts: Piece[] = [
    { text: name, style: STYLES.strong },
    { text: stampNumber === null ? title : `${title}, stamp ${stampNumber}`, style: STYLES.signatory },
    { text: `Signed ${utcMinute(signedAt)}`, style: STYLES.signatory },
  ];
  const paragraphs = texts.map((piece) => ({
    lines: paper.wrap([piece], SIGNATURE_WIDTH),
    leading: piece.style.leading,
  }));
  const text = paragraphs.reduce((sum, { lines, leading }) => sum + lines.length * leading, 0);
  return { paragraphs, height: ROOM_TO_SIGN + BELOW_LINE + text };
}

function drawSignature(paper: Paper, parent: Element, { paragraphs }: SignatureBlock, x: number, top: number): void {
  paper.rule(x, top + ROOM_TO_SIGN - 1, SIGNATURE_WIDTH, INK);
  let y = top + ROOM_TO_SIGN + BELOW_LINE;
  for (const { lines, leading } of paragraphs) {
    const at = y;
    parent.add(paper.doc.struct('P', {}, () => paper.lines(lines, x, at, leading)));
    y += lines.length * leading;
  }
}

/** The signatures, side by side. */
export function signatures(paper: Paper, parent: Element, { inspector, quality }: CertificateData): void {
  const blocks = [inspector, quality].map((signature) => signatureBlock(paper, signature));
  const height = Math.max(...blocks.map((block) => block.height));
  paper.keepTogether(SPACE_BEFORE + height);
  const atTheEnd = BOTTOM - height;
  const onFirstPage = paper.doc.bufferedPageRange().count === 1;
  const top = onFirstPage ? atTheEnd : Math.min(paper.y + SPACE_ON_LATER_PAGE, atTheEnd);
  for (const [nth, block] of blocks.entries()) {
    drawSignature(paper, parent, block, LEFT + nth * (SIGNATURE_WIDTH + 32), top);
  }
}

/** The digest as people compare it: its first sixteen digits in fours. */
export const shortDigest = (digest: string) => digest.slice(0, 16).replaceAll(/(.{4})(?=.)/g, '$1 ');
