import type { Column } from '../sheet.ts';
import { wrapText } from '../workings-rows.ts';
import { columnWidths } from './column-widths.ts';

/** Blanks between two columns. */
const GAP = 2;
/** What a level that was closed in on may lack. */
const HAIR = 1e-6;
/** A longer word does not keep its column from giving way. */
const LONG_WORD = 12;

/** A table in lines of at most `width` columns: cells that do not fit are broken between words, within words at need. */
export function textTable(
  columns: readonly Column[],
  rows: readonly (readonly string[])[],
  width: number,
): string[] {
  const all = [columns.map(({ head }) => head), ...rows];
  const wishes = columns.map((_, at) => {
    const cells = all.map((row) => row[at]!);
    const words = cells.flatMap((cell) => cell.split(' '));
    const longest = Math.max(...words.map((word) => word.length));
    const wanted = Math.max(...cells.map((cell) => cell.length));
    // A figure stays beside its unit.
    const least = Math.min(columns[at]!.align === 'right' ? wanted : longest, LONG_WORD);
    return { wanted, least };
  });
  const room = width - GAP * (columns.length - 1);
  const widths = columnWidths(wishes, room).map((each) => Math.max(1, Math.floor(each + HAIR)));
  const lines = (cells: readonly string[]): string[] => {
    const broken = cells.map((cell, at) => wrapText(cell, widths[at]!));
    const height = Math.max(1, ...broken.map((each) => each.length));
    return Array.from({ length: height }, (_, row) =>
      broken
        .map((each, at) => {
          const text = each[row] ?? '';
          return columns[at]!.align === 'right' ? text.padStart(widths[at]!) : text.padEnd(widths[at]!);
        })
        .join(' '.repeat(GAP))
        .trimEnd(),
    );
  };
  const rule = widths.map((each) => '-'.repeat(each)).join(' '.repeat(GAP));
  return [...lines(all[0]!), rule, ...rows.flatMap(lines)];
}
