import { fitted, type Piece, wrap } from '#server/documents/text-lines';
import { STYLES } from '#server/documents/text-style';
import { describe, expect, it } from 'vitest';

/** Every character is one wide. */
const measure = ({ text }: Piece) => text.length;
const piece = (text: string, style: Piece['style'] = STYLES.text): Piece => ({ text, style });
const lines = (text: string, width: number) =>
  wrap([piece(text)], width, measure).map((line) => line.pieces.map((each) => each.text).join(''));

describe('lines of a paper', () => {
  it('break at spaces and keep the space, so that copied words stay apart', () => {
    expect(lines('no-load voltage, loaded', 10)).toEqual(['no-load ', 'voltage, ', 'loaded']);
  });

  it('keep a number with its unit', () => {
    expect(lines('max 2.40\u00a0V', 8)).toEqual(['max ', '2.40\u00a0V']);
  });

  it('cut a word only where it alone is wider than the line', () => {
    expect(lines('a bcdefghij k', 4)).toEqual(['a ', 'bcde', 'fghi', 'j k']);
  });

  it('lose no character however narrow they are', () => {
    const text = 'Case temperature rise, after 1 h at 40 °C';
    for (let width = 1; width < 50; width++) {
      const shown = lines(text, width);
      expect(shown.join('').replaceAll(' ', ''), `width ${width}`).toBe(text.replaceAll(' ', ''));
      expect(Math.max(...shown.map((line) => line.trimEnd().length))).toBeLessThanOrEqual(width);
    }
  });

  it('join styles within a word and tell the width without the hidden space', () => {
    const [first, second] = wrap(
      [piece('Hollowmere', STYLES.strong), piece(', Incoming inspection', STYLES.quiet)],
      20,
      measure,
    );
    expect(first?.pieces.map((each) => each.text)).toEqual(['Hollowmere', ', Incoming ']);
    expect(first?.width).toBe(20);
    expect(second?.pieces).toEqual([piece('inspection', STYLES.quiet)]);
  });

  it('are none for no text', () => {
    expect(lines('', 10)).toEqual([]);
  });

  it('are shortened with an ellipsis where only one fits', () => {
    expect(fitted(piece('I. Sandvær, stamp 07'), 12, measure).text).toBe('I. Sandvær,…');
    expect(fitted(piece('n 80'), 12, measure).text).toBe('n 80');
  });
});
