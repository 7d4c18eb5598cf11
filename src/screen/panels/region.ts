import type { Canvas, Style } from '../draw/canvas.ts';
import type { Glyphs } from '../draw/glyphs.ts';

/** A rectangle of cells that one panel draws in and no other does. */
export interface Region {
  readonly x: number;
  readonly y: number;
  readonly columns: number;
  readonly rows: number;
}

/** Writes text whole, or not at all when it is longer than `width`; says whether it stands. */
export function write(
  canvas: Canvas,
  x: number,
  y: number,
  text: string,
  width: number,
  style: Style = 'plain',
): boolean {
  if (text === '' || text.length > width) return false;
  canvas.put(x, y, text, style);
  return true;
}

/** Writes text that ends at column `end`, whole, or not at all when it would begin before `from`. */
export function writeRight(
  canvas: Canvas,
  from: number,
  end: number,
  y: number,
  text: string,
  style: Style = 'plain',
): boolean {
  return write(canvas, end - text.length + 1, y, text, end - from + 1, style);
}

/** True when text of this length at (x, y) stays in the region and leaves a blank cell on either side. */
export function isFree(canvas: Canvas, region: Region, x: number, y: number, length: number): boolean {
  if (x < region.x || x + length > region.x + region.columns) return false;
  const from = Math.max(x - 1, region.x);
  const to = Math.min(x + length, region.x + region.columns - 1);
  for (let column = from; column <= to; column += 1) {
    if (canvas.glyphs[y * canvas.columns + column] !== ' ') return false;
  }
  return true;
}

/** A rule across the region's first row; headings are written over it. */
export function rule(canvas: Canvas, region: Region, glyphs: Glyphs): void {
  canvas.put(region.x, region.y, glyphs.rule.repeat(region.columns), 'quiet');
}

/** A word let into a rule, with a blank on either side; left out when it would leave the region. */
export function heading(
  canvas: Canvas,
  region: Region,
  x: number,
  text: string,
  style: Style = 'quiet',
): void {
  if (text === '' || x - 1 < region.x || x + text.length + 1 > region.x + region.columns) return;
  canvas.put(x - 1, region.y, ` ${text} `, style);
}
