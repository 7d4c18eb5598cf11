import type { Canvas, Style } from '../draw/canvas.ts';
import { cells, clip, keepToGlyphs, shorten } from '../draw/cells.ts';
import type { Glyphs } from '../draw/glyphs.ts';
import type { FootView } from '../view.ts';
import { drawKeys } from './foot.ts';
import { heading, rule } from './region.ts';

/** A view of text that takes the main area: a title, lines that scroll, the keys that matter. */
export interface TextView {
  readonly title: string;
  readonly lines: readonly TextLine[];
  /** The first line shown; held within the text. */
  readonly offset: number;
  readonly foot: readonly FootView[];
}

export interface TextLine {
  readonly text: string;
  readonly style: Style;
}

/** Rows that are not the text: title, rule, foot. */
const AROUND = 3;
/** The rows of text that a screen of this many rows shows at once. */
export function textRows(rows: number): number {
  return Math.max(1, rows - AROUND);
}

/** The last offset that still fills the screen: scrolling goes no further. */
export function lastOffset(lines: number, rows: number): number {
  return Math.max(0, lines - textRows(rows));
}

/** Draws the view over the whole canvas. */
export function drawText(text: TextView, canvas: Canvas, glyphs: Glyphs): void {
  canvas.glyphs.fill(' ');
  canvas.styles.fill(0);
  const { columns, rows } = canvas;
  const shown = textRows(rows);
  const offset = Math.max(0, Math.min(text.offset, lastOffset(text.lines.length, rows)));
  canvas.put(1, 0, shorten(cells(text.title), columns - 2, glyphs), 'strong');

  const line = { x: 0, y: 1, columns, rows: 1 };
  rule(canvas, line, glyphs);
  if (text.lines.length > shown) {
    const to = Math.min(text.lines.length, offset + shown);
    const place = `lines ${offset + 1} to ${to} of ${text.lines.length}`;
    heading(canvas, line, columns - place.length - 3, place);
  }
  for (let row = 0; row < shown; row += 1) {
    const found = text.lines[offset + row];
    if (found === undefined) break;
    canvas.put(1, 2 + row, clip(cells(found.text), columns - 2, glyphs), found.style);
  }
  drawKeys(text.foot, canvas, 1, columns - 1, rows - 1, glyphs);
  keepToGlyphs(canvas, glyphs);
}
