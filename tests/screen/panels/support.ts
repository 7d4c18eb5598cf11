import { Canvas } from '../../../src/screen/draw/canvas.ts';
import { type Glyphs, glyphsOf } from '../../../src/screen/draw/glyphs.ts';
import type { Region } from '../../../src/screen/panels/region.ts';

export const unicode = glyphsOf('unicode');
export const ascii = glyphsOf('ascii');

/** The rows of a canvas as a reader sees them. */
export function frame(canvas: Canvas): string[] {
  return Array.from({ length: canvas.rows }, (_, y) => canvas.text(y));
}

/** What one panel draws in a region that is the whole canvas. */
export function drawn(
  columns: number,
  rows: number,
  draw: (canvas: Canvas, region: Region, glyphs: Glyphs) => unknown,
  glyphs: Glyphs = unicode,
): { rows: string[]; canvas: Canvas } {
  const canvas = new Canvas(columns, rows);
  draw(canvas, { x: 0, y: 0, columns, rows }, glyphs);
  return { rows: frame(canvas), canvas };
}
