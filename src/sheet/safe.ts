import { harmless } from '../quantity/index.ts';
import type { WorkingLine } from '../timber/workings/index.ts';

/** A sheet leaves nothing out: a note may be as long as the session file lets it be, a calculation longer. */
const LONGEST = 100_000;

/** A text of the sheet without what moves a cursor, hides or turns what is read; on one line. */
export function safe(text: string): string {
  return harmless(text, LONGEST);
}

/** The same for every part of a line of a calculation. */
export function safeLine(line: WorkingLine): WorkingLine {
  return Object.fromEntries(Object.entries(line).map(([part, text]) => [part, safe(text)]));
}
