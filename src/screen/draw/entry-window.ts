import { isSingleWidth } from '../terminal/single-width.ts';

/** What a field shows of a text too long for it. */
export interface EntryWindow {
  /** At most `width` characters. */
  readonly shown: string;
  /** Cell of the cursor within the field, 0 to width - 1. */
  readonly cursor: number;
}

/** Stands in the field for a character that would not take exactly one cell. */
const UNSHOWN = '?';

/** The stretch of `text` around its cursor (0 to its length, in characters) that a field of `width` cells shows. */
export function entryWindow(text: string, cursor: number, width: number): EntryWindow {
  const characters = [...text].map((character) => (isSingleWidth(character) ? character : UNSHOWN));
  // The cursor may stand behind the last character, so that cell has to be in sight too.
  const start = Math.max(0, Math.min(cursor, characters.length) - width + 1);
  return {
    shown: characters.slice(start, start + width).join(''),
    cursor: Math.min(cursor, characters.length) - start,
  };
}
