import { LEFT, type Paper } from './paper';
import { ROW_HEAD } from './table-head';
import { STYLES, type TextStyle } from './text-style';

/** A line of the facts at the head of a paper. */
export interface Fact {
  label: string;
  value: string;
  style: TextStyle;
}

const LABEL_WIDTH = 78;
/** Space below each fact. */
export const FACT_GAP = 5;

/** Draws a fact, label and value, into a width from the left margin; `facts` is the table it belongs to. */
export function drawFact(
  paper: Paper,
  facts: PDFKit.PDFStructureElement,
  { label, value, style }: Fact,
  width: number,
): void {
  const { doc, y } = paper;
  const { leading } = style;
  const lines = paper.wrap([{ text: value, style }], width - LABEL_WIDTH);
  const head = () => paper.line([{ text: label, style: STYLES.quiet }], LEFT, y, leading);
  const body = () => paper.lines(lines, LEFT + LABEL_WIDTH, y, leading);
  facts.add(doc.struct('TR', {}, [doc.struct('TH', ROW_HEAD, head), doc.struct('TD', {}, body)]));
  paper.advance(lines.length * leading + FACT_GAP);
}
