import { type TextStyle } from './text-style';

/** Text in one style. */
export interface Piece {
  text: string;
  style: TextStyle;
}

/** A line: its pieces stand on one baseline. */
export interface TextLine {
  pieces: Piece[];
  width: number;
}

export type Measure = (piece: Piece) => number;

type Word = Piece[];

/** Words are parted by spaces alone; no-break spaces hold a number and its unit together. */
function wordsOf(pieces: readonly Piece[]): Word[] {
  const words: Word[] = [[]];
  for (const { text, style } of pieces) {
    for (const [nth, part] of text.split(' ').entries()) {
      if (nth > 0) words.push([]);
      if (part !== '') words.at(-1)?.push({ text: part, style });
    }
  }
  return words.filter((word) => word.length > 0);
}

const widthOf = (pieces: readonly Piece[], measure: Measure) =>
  pieces.reduce((width, piece) => width + measure(piece), 0);

/** Cuts a word that is wider than the line into parts that fit. */
function cut(word: Word, width: number, measure: Measure): Word[] {
  if (widthOf(word, measure) <= width) return [word];
  const parts: Word[] = [[]];
  for (const { text, style } of word) {
    for (const character of text) {
      const part = parts.at(-1) ?? [];
      const longer = joined(part, [{ text: character, style }], '');
      if (part.length > 0 && widthOf(longer, measure) > width) parts.push([{ text: character, style }]);
      else parts[parts.length - 1] = longer;
    }
  }
  return parts;
}

/** Appends pieces, in one with the piece before where the style is the same. */
function joined(line: readonly Piece[], word: readonly Piece[], space: string): Piece[] {
  const [first, ...rest] = word;
  const last = line.at(-1);
  if (!first || !last) return [...line, ...word];
  const before = line.slice(0, -1);
  if (last.style === first.style)
    return [...before, { text: last.text + space + first.text, style: last.style }, ...rest];
  return [...before, { text: last.text + space, style: last.style }, ...word];
}

/** A line that was broken at a space keeps it, unseen, so that whoever copies or hears the text gets whole words. */
function spaced(line: readonly Piece[]): Piece[] {
  const last = line.at(-1);
  return last ? [...line.slice(0, -1), { ...last, text: `${last.text} ` }] : [];
}

/** Breaks text into lines of a width, at spaces, and within a word only where it alone is wider. */
export function wrap(pieces: readonly Piece[], width: number, measure: Measure): TextLine[] {
  const lines: TextLine[] = [];
  const end = (line: Piece[], show = line) => lines.push({ pieces: show, width: widthOf(line, measure) });
  let line: Piece[] = [];
  for (const word of wordsOf(pieces)) {
    const longer = joined(line, word, ' ');
    if (widthOf(longer, measure) <= width) {
      line = longer;
      continue;
    }
    if (line.length > 0) end(line, spaced(line));
    const parts = cut(word, width, measure);
    for (const part of parts.slice(0, -1)) end(part);
    line = parts.at(-1) ?? [];
  }
  if (line.length > 0) end(line);
  return lines;
}

/** As much of a text as fits one line, with an ellipsis where it was cut. */
export function fitted(piece: Piece, width: number, measure: Measure): Piece {
  if (measure(piece) <= width) return piece;
  const characters = [...piece.text];
  while (characters.length > 0) {
    characters.pop();
    const shorter = { ...piece, text: `${characters.join('').trimEnd()}…` };
    if (measure(shorter) <= width) return shorter;
  }
  return { ...piece, text: '' };
}
