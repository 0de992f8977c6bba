import { OK_FILL, OK_TEXT } from './paper-colours';
import { type Paper } from './paper';
import { rippleLine } from './ripple-line';
import { type TextStyle } from './text-style';

export const PLATE_WIDTH = 318;
export const PLATE_HEIGHT = 158;
/** From the outer edge to the text. */
const INSET = 27;

const SMALL: TextStyle = { family: 'roboto-mono', weight: 500, size: 12, leading: 16, colour: OK_TEXT };
const WORD: TextStyle = { family: 'roboto', weight: 700, size: 42, leading: 44, colour: OK_TEXT, tracking: 0.5 };

/** What stands in the corners of the plate. */
export interface PlateCorners {
  topLeft: string;
  topRight: string;
  bottomLeft: string;
  bottomRight: string;
}

function outline({ doc }: Paper, x: number, y: number): void {
  doc
    .roundedRect(x + 1, y + 1, PLATE_WIDTH - 2, PLATE_HEIGHT - 2, 19)
    .lineWidth(2)
    .stroke(OK_FILL);
  doc
    .roundedRect(x + 6.5, y + 6.5, PLATE_WIDTH - 13, PLATE_HEIGHT - 13, 14.5)
    .lineWidth(1)
    .stroke(OK_FILL);
}

function trace({ doc }: Paper, x: number, y: number): void {
  const width = PLATE_WIDTH - 2 * INSET;
  rippleLine(doc, { x, y, width, ripple: width * 0.36, amplitude: 10, turns: 2.5 })
    .lineWidth(2.5)
    .stroke(OK_TEXT);
}

/** Two texts at the ends of a row; the right one gives way where both do not fit. */
function ends(paper: Paper, left: string, right: string, x: number, y: number): (() => void)[] {
  const width = PLATE_WIDTH - 2 * INSET;
  const start = { text: paper.fitted(left, SMALL, width * 0.6), style: SMALL };
  const end = paper.fitted(right, SMALL, width - paper.measure(start) - 12);
  return [() => paper.line([start], x, y, SMALL.leading), () => paper.lineEndingAt(end, SMALL, x + width, y)];
}

/** The verdict plate of an accepted lot: rounded, a double rule, and a ripple that settles. */
export function acceptedPlate(
  paper: Paper,
  parent: PDFKit.PDFStructureElement,
  x: number,
  corners: PlateCorners,
): void {
  const { doc, y } = paper;
  const left = x + INSET;
  paper.artifact(() => {
    outline(paper, x, y);
    trace(paper, left, y + 101);
  });
  const texts = [
    ...ends(paper, corners.topLeft, corners.topRight, left, y + 19),
    () => paper.line([{ text: 'ACCEPTED', style: WORD }], left, y + 41, WORD.leading),
    ...ends(paper, corners.bottomLeft, corners.bottomRight, left, y + 121),
  ];
  parent.add(
    doc.struct(
      'Sect',
      {},
      texts.map((draw) => doc.struct('P', {}, draw)),
    ),
  );
}
