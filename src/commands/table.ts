/** A column of a printed table. */
export interface Column {
  readonly head: string;
  readonly align: 'left' | 'right';
}

/** Rows of text under their heads, two blanks apart, trailing blanks trimmed. */
export function table(
  columns: readonly Column[],
  rows: readonly (readonly string[])[],
  indent = '',
): string[] {
  const widths = columns.map((column, at) =>
    Math.max(column.head.length, ...rows.map((row) => row[at]!.length), 0),
  );
  const line = (cells: readonly string[]) =>
    (
      indent +
      cells
        .map((cell, at) =>
          columns[at]!.align === 'right' ? cell.padStart(widths[at]!) : cell.padEnd(widths[at]!),
        )
        .join('  ')
    ).trimEnd();
  return [line(columns.map((column) => column.head)), ...rows.map(line)];
}
