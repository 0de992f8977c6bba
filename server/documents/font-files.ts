import { readFileSync } from 'node:fs';
import { createRequire } from 'node:module';
import { sfntOf } from './sfnt';
import { type FontFamily, type FontWeight } from './text-style';

/** A font comes in files of some scripts each. */
export interface FontFile {
  family: FontFamily;
  subset: string;
}

const SUBSETS = ['latin', 'latin-ext', 'greek', 'cyrillic', 'vietnamese', 'greek-ext', 'cyrillic-ext'];
const SIGNS = ['math', 'symbols'];

const filesOf = (family: FontFamily, subsets: readonly string[]): FontFile[] =>
  subsets.map((subset) => ({ family, subset }));

/** Where a character of a family is looked for, in this order; the fixed-width family borrows what it lacks. */
export const FONT_FILES: Record<FontFamily, readonly FontFile[]> = {
  roboto: filesOf('roboto', [...SUBSETS, ...SIGNS]),
  'roboto-mono': [
    ...filesOf(
      'roboto-mono',
      SUBSETS.filter((subset) => subset !== 'greek-ext'),
    ),
    ...filesOf('roboto', ['greek-ext', ...SIGNS]),
  ],
};

const find = createRequire(import.meta.url);
const kept = new Map<string, Buffer>();

/** The unpacked bytes of a font file, read once. */
export function fontBytes({ family, subset }: FontFile, weight: FontWeight): Buffer {
  const name = `@fontsource/${family}/files/${family}-${subset}-${weight}-normal.woff`;
  const known = kept.get(name);
  if (known) return known;
  const bytes = sfntOf(readFileSync(find.resolve(name)));
  kept.set(name, bytes);
  return bytes;
}
