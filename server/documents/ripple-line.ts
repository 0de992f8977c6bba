/** Where a settling ripple runs: from x to the right, the ripple over part of the width, straight after it. */
export interface RippleLine {
  x: number;
  y: number;
  width: number;
  /** Width of the part that ripples. */
  ripple: number;
  amplitude: number;
  turns: number;
}

const DECAY = 1.6;
const STEPS = 100;

/** The product's mark as a path: a damped ripple that settles to a straight line; the caller strokes it. */
export function rippleLine(
  doc: PDFKit.PDFDocument,
  { x, y, width, ripple, amplitude, turns }: RippleLine,
): PDFKit.PDFDocument {
  doc.moveTo(x, y);
  for (let step = 1; step <= STEPS; step++) {
    const t = step / STEPS;
    const swing = amplitude * (1 - t) ** DECAY * Math.sin(2 * Math.PI * turns * t);
    doc.lineTo(x + ripple * t, y + swing);
  }
  return doc
    .lineTo(x + width, y)
    .lineCap('round')
    .lineJoin('round');
}
