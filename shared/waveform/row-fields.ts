/** How a file separates its fields and marks its decimals. */
export interface Dialect {
  delimiter: ';' | '\t' | ',' | '|' | ' ';
  decimal: '.' | ',';
}

/** In the order in which they are tried: the less a mark is used within numbers, the earlier. */
export const DIALECTS: readonly Dialect[] = (
  [
    [';', '.'],
    [';', ','],
    ['\t', '.'],
    ['\t', ','],
    [',', '.'],
    ['|', '.'],
    ['|', ','],
    [' ', '.'],
    [' ', ','],
  ] as const
).map(([delimiter, decimal]) => ({ delimiter, decimal }));

/** Numbers as instruments print them; what is no number but stands for one is found as well, to be refused by its row. */
const NUMERAL: Record<Dialect['decimal'], RegExp> = {
  '.': /^[+-]?(?:(?:\d+\.?\d*|\.\d+)(?:e[+-]?\d+)?|nan|inf(?:inity)?)$/i,
  ',': /^[+-]?(?:(?:\d+,?\d*|,\d+)(?:e[+-]?\d+)?|nan|inf(?:inity)?)$/i,
};

export function isNumeral(text: string, decimal: Dialect['decimal']): boolean {
  return NUMERAL[decimal].test(text);
}

function bare(field: string): string {
  const trimmed = field.trim();
  return trimmed.length >= 2 && trimmed.startsWith('"') && trimmed.endsWith('"')
    ? trimmed.slice(1, -1).trim()
    : trimmed;
}

/** The fields of a row without their quotes; spaces may come in runs, and a delimiter may close the row. */
export function rowFields(row: string, delimiter: Dialect['delimiter']): string[] {
  const fields = (delimiter === ' ' ? row.trim().split(/ +/) : row.split(delimiter)).map(bare);
  while (fields.length > 1 && fields.at(-1) === '') fields.pop();
  return fields;
}
