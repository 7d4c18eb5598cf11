import type { Canvas } from '../draw/canvas.ts';
import { cells, shorten } from '../draw/cells.ts';
import type { Glyphs } from '../draw/glyphs.ts';
import type { View } from '../view.ts';
import { showRatio } from './figures.ts';
import { heading, type Region, rule, write, writeRight } from './region.ts';
import { drawHeads, drawTableRow, placeColumns } from './table.ts';

const KIND_LEAST = 12;
const RATIO = 7;
const COST = 13;

/**
 * The moves beside the gauges, best first: what to change, to what, the ratio after and what it costs; until they are
 * found the nearest cures.
 */
export function drawMoves(view: View, canvas: Canvas, region: Region, glyphs: Glyphs): void {
  rule(canvas, region, glyphs);
  if (view.moves == null) drawCures(view, canvas, region, glyphs);
  else drawTable(view.moves, canvas, region, glyphs);
}

function drawTable(
  { columns, rows, none }: NonNullable<View['moves']>,
  canvas: Canvas,
  region: Region,
  glyphs: Glyphs,
): void {
  const left = region.x + MARGIN;
  if (rows.length === 0) {
    heading(canvas, region, left, 'moves');
    if (region.rows > 1) write(canvas, left, region.y + 1, none, region.columns - MARGIN, 'quiet');
    return;
  }
  const placed = placeColumns(columns, rows, left, region.columns - MARGIN - 1);
  drawHeads(columns, placed, canvas, region);
  const shown = rows.slice(0, region.rows - 1);
  for (const [at, row] of shown.entries()) {
    const y = region.y + 1 + at;
    drawTableRow(row, columns, placed, canvas, y, region.x + region.columns, glyphs);
    const more = at === shown.length - 1 && rows.length > shown.length;
    if (more) canvas.put(region.x, y, glyphs.further[1], 'quiet');
  }
}

/** Cells left of the table: one for the mark of what is further down. */
const MARGIN = 1;

function drawCures(view: View, canvas: Canvas, region: Region, glyphs: Glyphs): void {
  const left = region.x + 1;
  const end = region.x + region.columns - 2;
  const ratioEnd = end - COST;
  let kindWidth = KIND_LEAST;
  for (const cure of view.cures) kindWidth = Math.max(kindWidth, cure.kind.length + 2);
  kindWidth = Math.min(kindWidth, Math.floor((ratioEnd - left) / 2));
  heading(canvas, region, left, 'moves');
  heading(canvas, region, ratioEnd - 4, 'ratio');
  heading(canvas, region, end - 3, 'cost');

  let y = region.y + 1;
  for (const cure of view.cures) {
    if (y >= region.y + region.rows) return;
    const style = cure.passes ? 'plain' : 'quiet';
    canvas.put(left, y, shorten(cells(cure.kind), kindWidth - 1, glyphs), style);
    const room = ratioEnd - RATIO - left - kindWidth + 1;
    canvas.put(
      left + kindWidth,
      y,
      shorten(cells(cure.label), room, glyphs),
      cure.passes ? 'strong' : 'quiet',
    );
    writeRight(canvas, left, ratioEnd, y, showRatio(cure.ratio, glyphs), cure.passes ? 'plain' : 'governs');
    writeRight(canvas, ratioEnd + 2, end, y, cells(cure.cost), style);
    y += 1;
  }
}
