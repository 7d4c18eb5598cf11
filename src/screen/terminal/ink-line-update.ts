/**
 * Takes the place of Ink's own line update in the bundle (see .build/stand-ins.mjs). Ink keeps a row's
 * unchanged beginning and writes the rest of it anew; this writes only the cells that changed. Rows that
 * hold more than single-width characters and styles are left to Ink. That both leave the same cells on
 * the screen is held by a property test in a terminal.
 */
import type { StyledChar } from '@alcalzone/ansi-tokenize';
import inkLineUpdate from '../../../node_modules/ink/build/line-update.js';
import { styledCharsFromTokens, styledCharsToString, tokenize } from './ansi-tokenize.ts';
import { isPlainRow } from './plain-row.ts';

/** A gap of unchanged cells this short costs less to write than to step over. */
const SHORT_GAP = 6;
const ERASE_TO_END = '\x1b[K';

const toColumn = (column: number): string => (column === 0 ? '\r' : `\x1b[${column + 1}G`);

const cellsOf = (row: string): readonly StyledChar[] => styledCharsFromTokens(tokenize(row));

/** What to write, wherever in its row the cursor stands, to turn the row `previous` into `next`. */
export default function lineUpdate(previous: string, next: string, columns: number | undefined): string {
  if (columns === undefined || !isPlainRow(previous) || !isPlainRow(next)) {
    return inkLineUpdate(previous, next, columns);
  }
  const before = cellsOf(previous);
  const after = cellsOf(next);
  // A row that overflows wraps: leave the reckoning to Ink.
  if (before.length > columns || after.length > columns) return inkLineUpdate(previous, next, columns);

  let text = '';
  let column = 0;
  while (column < after.length) {
    // Equal cells are the same object: the stand-in for ansi-tokenize makes each but once.
    if (before[column] === after[column]) {
      column += 1;
      continue;
    }
    const end = endOfRun(before, after, column);
    text += toColumn(column) + styledCharsToString(after.slice(column, end));
    column = end;
  }
  if (before.length > after.length) text += toColumn(after.length) + ERASE_TO_END;
  return text;
}

/** One past the last changed cell of the run that starts at `from`, short gaps included. */
function endOfRun(before: readonly StyledChar[], after: readonly StyledChar[], from: number): number {
  let end = from + 1;
  for (let column = end; column < after.length && column - end < SHORT_GAP; column += 1) {
    if (before[column] !== after[column]) end = column + 1;
  }
  return end;
}
