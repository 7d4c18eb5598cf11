import type { SketchLoad, SketchView } from '../../explore/diagrams/sketch-model.ts';
import { Canvas } from '../draw/canvas.ts';
import { cells } from '../draw/cells.ts';
import type { Glyphs } from '../draw/glyphs.ts';
import { isFree, type Region } from './region.ts';

/** Rows below the loads: the beam, its supports with the lengths. */
const BEAM_ROWS = 2;
/** From this many rows there is one for the reactions. */
export const WITH_REACTIONS = 7;
/** Cells of a line load that its label leaves to the arrows. */
const LEAST_ARROWS = 6;
/** Heights of a tapering load, from nothing to all. */
const BLOCKS = { unicode: '▁▂▃▄▅▆▇█', ascii: '.:!|' } as const;

/** The column of a place from 0 to 1 in a region. */
export function columnAt(place: number, region: Region): number {
  return region.x + Math.round(place * (region.columns - 1));
}

/** The rows that a sketch needs for every load with its label, `most` at the utmost. */
export function sketchRows(
  sketch: SketchView,
  columns: number,
  most: number,
  withReactions: boolean,
  glyphs: Glyphs,
): number {
  const below = BEAM_ROWS + (withReactions ? 1 : 0);
  const least = below + 1;
  for (let rows = least; rows < most; rows += 1) {
    const region = { x: 0, y: 0, columns, rows: rows - below };
    const tried = drawLoads(sketch.loads, new Canvas(columns, rows), region, glyphs);
    if (tried.hidden === 0 && tried.unnamed === 0) return rows;
  }
  return most;
}

/**
 * The beam to scale: loads as rows of arrows over it (blocks where they taper), each with its kind and size, then the
 * beam, its supports and the lengths between them, and where there is room the reactions. Says how many loads found
 * no row.
 */
export function drawSketch(
  sketch: SketchView,
  canvas: Canvas,
  region: Region,
  withReactions: boolean,
  glyphs: Glyphs,
): number {
  const rows = region.rows - BEAM_ROWS - (withReactions ? 1 : 0);
  const { hidden } = drawLoads(sketch.loads, canvas, { ...region, rows }, glyphs);
  const y = region.y + rows;
  canvas.put(region.x, y, glyphs.fill.repeat(region.columns), 'strong');
  drawSupports(sketch, canvas, region, y, glyphs);
  drawLengths(sketch, canvas, region, y + 1);
  if (withReactions) drawReactions(sketch, canvas, region, y + 2);
  return hidden;
}

function drawSupports(sketch: SketchView, canvas: Canvas, region: Region, y: number, glyphs: Glyphs): void {
  for (const { at, label, held } of sketch.supports) {
    const column = columnAt(at, region);
    if (held === null) {
      canvas.put(column, y + 1, glyphs.pointer, 'strong');
      if (column + label.length < region.x + region.columns) canvas.put(column + 1, y + 1, label, 'quiet');
      else canvas.putRight(column - 1, y + 1, label, 'quiet');
    } else for (const row of [y - 1, y, y + 1]) canvas.put(column, row, glyphs.limit, 'strong');
  }
}

/** Lengths between the supports, in the middle of each field where they fit whole. */
function drawLengths(sketch: SketchView, canvas: Canvas, region: Region, y: number): void {
  for (const { from, to, label } of sketch.fields) {
    const middle = Math.round((columnAt(from, region) + columnAt(to, region)) / 2);
    const column = middle - Math.floor(label.length / 2);
    const inside = column > columnAt(from, region) + 1 && column + label.length < columnAt(to, region);
    if (inside && isFree(canvas, region, column, y, label.length)) canvas.put(column, y, label);
  }
}

function drawReactions(sketch: SketchView, canvas: Canvas, region: Region, y: number): void {
  for (const { at, reaction } of sketch.supports) {
    const text = cells(reaction);
    const ideal = columnAt(at, region) - Math.floor(text.length / 2);
    const column = Math.max(region.x, Math.min(ideal, region.x + region.columns - text.length));
    if (text !== '' && isFree(canvas, region, column, y, text.length)) canvas.put(column, y, text, 'quiet');
  }
}

interface Tried {
  /** Loads that found no row. */
  readonly hidden: number;
  /** Loads drawn without their label. */
  readonly unnamed: number;
}

/** Point loads stand on the beam, typed lines over them, area loads on top: each in the lowest row that has room. */
function drawLoads(loads: readonly SketchLoad[], canvas: Canvas, region: Region, glyphs: Glyphs): Tried {
  let hidden = 0;
  let unnamed = 0;
  const rows = Array.from({ length: Math.max(0, region.rows) }, (_, row) => region.y + region.rows - 1 - row);
  const points = loads.filter((load) => load.type === 'point');
  const lines = loads.filter((load) => load.type === 'line').reverse();
  for (const [index, load] of [...points, ...lines].entries()) {
    const draw = load.type === 'point' ? drawPoint : drawLine;
    // The row of the points is theirs, so that lines lie over all of them.
    const own = load.type === 'line' && points.length > 0 && rows.length > 1 && index >= points.length;
    const from = own ? rows.slice(1) : rows;
    if (from.some((y) => draw(load, cells(load.label), canvas, region, y, glyphs))) continue;
    unnamed += 1;
    if (!from.some((y) => draw(load, '', canvas, region, y, glyphs))) hidden += 1;
  }
  return { hidden, unnamed };
}

function arrow(up: boolean, glyphs: Glyphs): string {
  return glyphs.further[up ? 0 : 1];
}

/** A row of arrows, of blocks where the load tapers, with its label in the middle or beside it; false where not free. */
function drawLine(
  load: SketchLoad,
  label: string,
  canvas: Canvas,
  region: Region,
  y: number,
  glyphs: Glyphs,
): boolean {
  const from = columnAt(load.from, region);
  const width = columnAt(load.to, region) - from + 1;
  const inside = label.length + LEAST_ARROWS <= width;
  const beside = [from + width + 1, from - 1 - label.length];
  const at = inside
    ? from + Math.floor((width - label.length) / 2)
    : beside.find((x) => isFree(canvas, region, x, y, label.length));
  if (at === undefined || !isFree(canvas, region, from, y, width)) return false;
  for (let cell = 0; cell < width; cell += 1) {
    const share = width === 1 ? 0 : cell / (width - 1);
    const rise = load.rise[0] + (load.rise[1] - load.rise[0]) * share;
    if (load.rise[0] !== load.rise[1]) canvas.put(from + cell, y, block(rise, glyphs));
    else if (cell % 2 === 0 || cell === width - 1) canvas.put(from + cell, y, arrow(load.up, glyphs));
  }
  if (label !== '') canvas.put(inside ? at - 1 : at, y, inside ? ` ${label} ` : label);
  return true;
}

function block(rise: number, glyphs: Glyphs): string {
  const blocks = BLOCKS[glyphs.kind];
  return blocks[Math.min(blocks.length - 1, Math.floor(rise * blocks.length))]!;
}

function drawPoint(
  load: SketchLoad,
  label: string,
  canvas: Canvas,
  region: Region,
  y: number,
  glyphs: Glyphs,
): boolean {
  const column = columnAt(load.from, region);
  const width = label === '' ? 1 : label.length + 2;
  const right = isFree(canvas, region, column, y, width);
  const start = right ? column : column - width + 1;
  if (!right && !isFree(canvas, region, start, y, width)) return false;
  canvas.put(column, y, arrow(load.up, glyphs), 'strong');
  if (label !== '') canvas.put(right ? column + 2 : start, y, label);
  // The stem goes down to the beam where a load stands higher than the row above it.
  for (let row = y + 1; row < region.y + region.rows; row += 1) {
    if (canvas.glyphs[row * canvas.columns + column] === ' ') canvas.put(column, row, glyphs.bar, 'strong');
  }
  return true;
}
