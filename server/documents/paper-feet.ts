import { BOTTOM, LEFT, type Paper, WIDTH } from './paper';
import { LINE } from './paper-colours';
import { STYLES } from './text-style';

/** The paper's number, what tells its data or state, and page n of m at the foot of every page. */
export function feet(paper: Paper, number: string, middle: string): void {
  const { doc } = paper;
  const style = STYLES.footer;
  const { count } = doc.bufferedPageRange();
  const y = BOTTOM + 22;
  for (let page = 0; page < count; page++) {
    doc.switchToPage(page);
    paper.rule(LEFT, y, WIDTH, LINE);
    paper.artifact(() => {
      const width = paper.measure({ text: middle, style });
      paper.line([{ text: number, style }], LEFT, y + 9, style.leading);
      paper.line([{ text: middle, style }], LEFT + (WIDTH - width) / 2, y + 9, style.leading);
      paper.lineEndingAt(`Page ${page + 1} of ${count}`, style, LEFT + WIDTH, y + 9);
    }, 'Pagination');
  }
}
