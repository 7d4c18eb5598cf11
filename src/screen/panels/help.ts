import type { Canvas } from '../draw/canvas.ts';
import { cells, shorten, wrap } from '../draw/cells.ts';
import type { Glyphs } from '../draw/glyphs.ts';
import type { FootView } from '../view.ts';
import { keyNames } from './foot.ts';
import { drawText, lastOffset, type TextLine, textRows } from './text.ts';

/** A part of the list of keys: its title, then what to press or a word, and what that does or is. */
export interface HelpSection {
  readonly title: string;
  /** Term and what it means; a line without a term goes on from the one before. */
  readonly lines: readonly (readonly [string, string])[];
}

/** Longer lines are tiring to read. */
const MEASURE = 100;
const INDENT = 2;
const GAP = 2;

/** The list as lines of at most `columns` cells: terms in a column of their own, meanings wrapped beside it. */
export function helpLines(sections: readonly HelpSection[], columns: number, glyphs: Glyphs): TextLine[] {
  const measure = Math.min(columns - 2, MEASURE);
  let term = 0;
  for (const section of sections) {
    for (const [text] of section.lines) term = Math.max(term, keyNames(text, glyphs).length);
  }
  term = Math.min(term, Math.floor(measure / 3));
  const beside = measure - INDENT - term - GAP;
  const lines: TextLine[] = [];
  for (const section of sections) {
    if (lines.length > 0) lines.push({ text: '', style: 'plain' });
    lines.push({ text: section.title, style: 'strong' });
    for (const [text, meaning] of joined(section.lines)) {
      const wrapped = wrap(cells(meaning), beside, Number.POSITIVE_INFINITY, glyphs);
      const first = shorten(keyNames(text, glyphs), term, glyphs).padEnd(term);
      lines.push({
        text: `${' '.repeat(INDENT)}${first}${' '.repeat(GAP)}${wrapped[0] ?? ''}`,
        style: 'plain',
      });
      for (const more of wrapped.slice(1)) {
        lines.push({ text: ' '.repeat(INDENT + term + GAP) + more, style: 'plain' });
      }
    }
  }
  return lines;
}

/** Joins lines without a term to the one before, so that they wrap as one. */
function joined(lines: HelpSection['lines']): [string, string][] {
  const all: [string, string][] = [];
  for (const [term, meaning] of lines) {
    const before = all[all.length - 1];
    if (term === '' && before !== undefined) before[1] += ` ${meaning}`;
    else all.push([term, meaning]);
  }
  return all;
}

/** The list of all keys and words over the whole canvas, from line `scroll` on; says how far it can scroll. */
export function drawHelp(
  canvas: Canvas,
  sections: readonly HelpSection[],
  scroll: number,
  glyphs: Glyphs,
): { readonly lastOffset: number } {
  const lines = helpLines(sections, canvas.columns, glyphs);
  const foot: FootView[] = [{ keys: 'Esc', does: 'back' }];
  if (lines.length > textRows(canvas.rows)) foot.unshift({ keys: glyphs.upDown, does: 'scroll' });
  drawText({ title: 'thrice: keys and words', lines, offset: scroll, foot }, canvas, glyphs);
  return { lastOffset: lastOffset(lines.length, canvas.rows) };
}
