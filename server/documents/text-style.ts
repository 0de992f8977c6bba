import { INK, INK_2, INK_3 } from './paper-colours';

export type FontFamily = 'roboto' | 'roboto-mono';
export type FontWeight = 400 | 500 | 700;

/** How a stretch of text is set; lengths are the design's pixels, 3/4 of a point each. */
export interface TextStyle {
  family: FontFamily;
  weight: FontWeight;
  size: number;
  /** Height of a line. */
  leading: number;
  colour: string;
  /** Added between letters. */
  tracking?: number;
}

const sans = (weight: FontWeight, size: number, leading: number, colour = INK): TextStyle => ({
  family: 'roboto',
  weight,
  size,
  leading,
  colour,
});
const mono = (weight: FontWeight, size: number, leading: number, colour = INK): TextStyle => ({
  ...sans(weight, size, leading, colour),
  family: 'roboto-mono',
});

/** The styles of a certificate, by what they are for. */
export const STYLES = {
  text: sans(400, 12, 17),
  strong: sans(500, 12, 17),
  quiet: sans(400, 12, 17, INK_2),
  identifier: mono(500, 12, 17),
  title: { ...sans(500, 30, 36), tracking: -0.5 },
  number: mono(500, 20, 26),
  statement: sans(400, 13, 19),
  heading: sans(500, 13, 18),
  columnHead: sans(500, 11, 16, INK_2),
  class: sans(500, 11.5, 17, INK_2),
  reading: mono(400, 11.5, 17),
  fine: sans(400, 11, 16, INK_2),
  signatory: sans(400, 11, 15, INK_2),
  footer: mono(400, 10.5, 14, INK_3),
} satisfies Record<string, TextStyle>;
