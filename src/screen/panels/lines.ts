import type { Canvas } from '../draw/canvas.ts';
import { cells, wrap } from '../draw/cells.ts';
import type { Glyphs } from '../draw/glyphs.ts';
import type { View } from '../view.ts';
import { heading, type Region, rule, write } from './region.ts';

/** " handover  (2) 2x14 is lightest from 14'-4" to 15'-6"; ...": whole, without its label, without its last clauses, or not at all. */
export function drawHandover(view: View, canvas: Canvas, region: Region): void {
  if (view.handover === null || view.handover === '') return;
  const label = 'handover';
  const room = region.columns - 2;
  const clauses = cells(view.handover).split('; ');
  for (let count = clauses.length; count > 0; count -= 1) {
    const text = clauses.slice(0, count).join('; ');
    if (label.length + 2 + text.length <= room) {
      canvas.put(region.x + 1, region.y, label, 'quiet');
      canvas.put(region.x + 1 + label.length + 2, region.y, text);
      return;
    }
    if (write(canvas, region.x + 1, region.y, text, room)) return;
  }
}

/** What is assumed and warned, the most worth first, each on a row of its own; one that does not fit is left out. */
export function drawRemarks(view: View, canvas: Canvas, region: Region): void {
  let y = region.y;
  for (const remark of view.remarks) {
    if (y >= region.y + region.rows) return;
    if (write(canvas, region.x + 1, y, cells(remark), region.columns - 2, 'quiet')) y += 1;
  }
}

/** All of the remarks in a column of their own, wrapped, under a heading in the rule. */
export function drawNotes(view: View, canvas: Canvas, region: Region, glyphs: Glyphs): void {
  rule(canvas, region, glyphs);
  heading(canvas, region, region.x + 1, 'assumed');
  const end = region.y + region.rows;
  let y = region.y + 1;
  for (const remark of view.remarks) {
    const lines = wrap(cells(remark), region.columns - 2, end - y, glyphs);
    for (const line of lines) {
      canvas.put(region.x + 1, y, line, 'quiet');
      y += 1;
    }
  }
}
