/** A column of a printed table. */
export interface Column {
  readonly head: string;
  readonly align: 'left' | 'right';
}

/** Columns of every terminal; wider tables move their columns together. */
const LINE = 80;

/** Rows of text under their heads, two blanks apart or one where two would not fit, trailing blanks trimmed. */
export function table(
  columns: readonly Column[],
  rows: readonly (readonly string[])[],
  indent = '',
): string[] {
  const widths = columns.map((column, at) =>
    Math.max(column.head.length, ...rows.map((row) => row[at]!.length), 0),
  );
  const wide = indent.length + widths.reduce((sum, width) => sum + width, 0) + 2 * (widths.length - 1) > LINE;
  const gap = wide ? ' ' : '  ';
  const line = (cells: readonly string[]) =>
    (
      indent +
      cells
        .map((cell, at) =>
          columns[at]!.align === 'right' ? cell.padStart(widths[at]!) : cell.padEnd(widths[at]!),
        )
        .join(gap)
    ).trimEnd();
  return [line(columns.map((column) => column.head)), ...rows.map(line)];
}
