import { harmless, isHarmful } from '../../quantity/index.ts';

/** What a spreadsheet may run: a cell that begins with one of these, in either width, after blanks or not. */
const FORMULA = /^'*(?:[\s\0]*[=+\-@\uFF0B\uFF0D\uFF1D\uFF20]|[\t\r])/;
/** A plain number is a number for every reader, whatever its sign. */
const NUMBER = /^[+-]?(?:\d+(?:\.\d*)?|\.\d+)$/;
const GUARD = "'";

/** Nothing is cut from a cell. */
const WHOLE = Number.MAX_SAFE_INTEGER / 4;

/**
 * A cell that is read as text everywhere: one that a spreadsheet would run gets an apostrophe before it. Line ends stay,
 * but not a carriage return by itself, by which a terminal would write over the line.
 */
export function guarded(text: string): string {
  const plain = isHarmful(text)
    ? text.replace(/[^\t\r\n]+|\r(?!\n)/g, (part) => harmless(part, WHOLE))
    : text;
  return FORMULA.test(plain) && !NUMBER.test(plain) ? GUARD + plain : plain;
}

/** The text that `guarded` made harmless. */
export function unguarded(cell: string): string {
  return cell.startsWith(GUARD) && FORMULA.test(cell.slice(1)) ? cell.slice(1) : cell;
}
