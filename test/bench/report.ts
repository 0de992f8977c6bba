/** One line of the table; a line without bar is there to compare with. */
export interface Line {
  what: string;
  measured: string;
  bar: string;
  holds: boolean | null;
}

const HEAD = ['what', 'measured', 'bar', 'holds'];

function cellsOf({ what, measured, bar, holds }: Line): string[] {
  return [what, measured, bar, holds === null ? '' : holds ? 'yes' : 'NO'];
}

/** The lines as a table of text. */
export function table(lines: readonly Line[]): string {
  const rows = [HEAD, ...lines.map(cellsOf)];
  const widths = HEAD.map((_, column) => Math.max(...rows.map((row) => row[column]?.length ?? 0)));
  return rows
    .map((row) =>
      row
        .map((cell, column) => cell.padEnd(widths[column] ?? 0))
        .join('  ')
        .trimEnd(),
    )
    .join('\n');
}
