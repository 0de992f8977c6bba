import { type FontFile, FONT_FILES, fontBytes } from './font-files';
import { type FontWeight, type TextStyle } from './text-style';

/** A stretch of text that one font file can show. */
export interface FontRun {
  font: string;
  text: string;
}

/** pdfkit keeps the font it opened last here; its type declarations leave that out. */
interface WithOpenedFont {
  _font: { font: { hasGlyphForCodePoint(codePoint: number): boolean } };
}

/** Characters that no file has, and what stands for them. */
const STAND_INS: Record<string, string> = { '\u202f': '\u2009', '\u2010': '-', '\u2011': '-', '\u00ad': '' };
/** Shown for what cannot be shown, so that nothing vanishes unseen. */
const UNKNOWN = '\ufffd';

const ready = (text: string) =>
  text
    .normalize('NFC')
    .replaceAll(/\p{Cc}/gu, ' ')
    .replaceAll(/[\u202f\u2010\u2011\u00ad]/gu, (character) => STAND_INS[character] ?? '');

/** Chooses for each character a font file that has it, so that every glyph is embedded and none is missing. */
export class FontRuns {
  private readonly opened = new Map<string, (codePoint: number) => boolean>();
  private readonly chosen = new Map<string, string | undefined>();

  constructor(private readonly doc: PDFKit.PDFDocument) {}

  split(text: string, { family, weight }: TextStyle): FontRun[] {
    const runs: FontRun[] = [];
    for (const character of ready(text)) {
      // A thin space is the sans one in both families: in the other it is as wide as a digit.
      const files = FONT_FILES[character === '\u2009' ? 'roboto' : family];
      const font = this.fontFor(character, files, weight);
      const run =
        font === undefined
          ? { font: this.open({ family, subset: 'latin' }, weight), text: UNKNOWN }
          : { font, text: character };
      const last = runs.at(-1);
      if (last?.font === run.font) last.text += run.text;
      else runs.push(run);
    }
    return runs;
  }

  private fontFor(character: string, files: readonly FontFile[], weight: FontWeight): string | undefined {
    const key = `${files[0]?.family ?? ''} ${weight} ${character}`;
    if (!this.chosen.has(key)) this.chosen.set(key, this.search(character, files, weight));
    return this.chosen.get(key);
  }

  private search(character: string, files: readonly FontFile[], weight: FontWeight): string | undefined {
    const codePoint = character.codePointAt(0) ?? 0;
    for (const file of files) {
      const font = this.open(file, weight);
      if (this.opened.get(font)?.(codePoint)) return font;
    }
    return undefined;
  }

  private open(file: FontFile, weight: FontWeight): string {
    const name = `${file.family} ${file.subset} ${weight}`;
    if (!this.opened.has(name)) {
      this.doc.registerFont(name, fontBytes(file, weight)).font(name);
      const { font } = (this.doc as unknown as WithOpenedFont)._font;
      this.opened.set(name, (codePoint) => font.hasGlyphForCodePoint(codePoint));
    }
    return name;
  }
}
