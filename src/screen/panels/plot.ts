import { DOTS_ACROSS, DOTS_DOWN, Dots } from '../../sheet/drawing/dots.ts';
import type { PlotView } from '../diagrams-view.ts';
import { dotGlyph } from '../draw/braille.ts';
import type { Canvas } from '../draw/canvas.ts';
import { cells, wrap } from '../draw/cells.ts';
import type { Glyphs } from '../draw/glyphs.ts';
import type { Region } from './region.ts';
import { columnAt } from './sketch.ts';

/** Dots from one to the next: of the axis, of the ends of a band behind a single combination, of the shade in a band. */
const AXIS = 2;
const DOTTED = 3;
const SHADE = 4;
/** Rows from a diagram's name to its reading. */
const READING = 3;

/**
 * One diagram in dots: its axis, the curve of one combination or the shaded band of all, each extreme marked and
 * labelled as near to its place as there is room. Name, unit and the reading at the cursor stand in the gutter.
 */
export function drawPlot(
  plot: PlotView,
  canvas: Canvas,
  region: Region,
  gutter: Region,
  cursor: number,
  glyphs: Glyphs,
): void {
  drawGutter(plot, canvas, gutter);
  const column = columnAt(cursor, region);
  for (let y = region.y; y < region.y + region.rows; y += 1) canvas.put(column, y, glyphs.bar, 'now');
  if (plot.lines === null) {
    for (const [row, text] of wrap(cells(plot.missing), region.columns, region.rows, glyphs).entries()) {
      canvas.put(region.x, region.y + row, text, 'quiet');
    }
    return;
  }
  const { strong, quiet, place } = dotsOf(plot, region);
  for (let row = 0; row < region.rows; row += 1) {
    for (let cell = 0; cell < region.columns; cell += 1) {
      const line = strong.cell(cell, row);
      const faint = quiet.cell(cell, row);
      if ((line | faint) === 0) continue;
      // ASCII marks show one thing only: the curve before what lies behind it.
      const bits = glyphs.kind === 'ascii' && line !== 0 ? line : line | faint;
      const x = region.x + cell;
      const style = x === column ? 'nowStrong' : line !== 0 ? 'plain' : 'quiet';
      if (line !== 0 || x !== column) canvas.put(x, region.y + row, dotGlyph(bits, glyphs), style);
    }
  }
  drawExtremes(plot, canvas, region, strong, place, glyphs);
}

/** Name and unit, and below them what stands at the cursor, the larger value over the smaller; the unit gives way. */
function drawGutter(plot: PlotView, canvas: Canvas, gutter: Region): void {
  const end = gutter.x + gutter.columns - 1;
  const first = Math.min(gutter.y + READING, gutter.y + gutter.rows - plot.reading.length);
  canvas.put(gutter.x, gutter.y, plot.name, 'strong');
  if (first > gutter.y + 1) canvas.put(gutter.x, gutter.y + 1, plot.unit, 'quiet');
  for (const [row, text] of plot.reading.entries()) {
    const shown = cells(text);
    if (shown.length <= gutter.columns) canvas.putRight(end, first + row, shown, 'nowStrong');
  }
}

/** The row of dots of a value, from the top. */
type Place = (value: number) => number;

function dotsOf(plot: PlotView, region: Region): { strong: Dots; quiet: Dots; place: Place } {
  const { columns, rows } = region;
  const last = rows * DOTS_DOWN - 1;
  const extent = plot.top - plot.bottom;
  const place: Place = (value) =>
    extent > 0
      ? Math.min(last, Math.max(0, Math.round(((plot.top - value) / extent) * last)))
      : Math.round(last / 2);
  const strong = new Dots(columns, rows);
  const quiet = new Dots(columns, rows);
  const axis = place(0);
  const across = columns * DOTS_ACROSS;
  for (let x = 0; x < across; x += AXIS) quiet.put(x, axis);

  const { max, min, whole } = plot.lines!;
  for (const values of whole === null ? [max, min] : [whole]) {
    strong.through(values.map(place));
    // The curve is drawn to its end on the axis, as on paper.
    for (const x of [0, across - 1]) strong.upright(x, axis, place(values[x]!));
  }
  if (whole === null) {
    for (let x = 0; x < across; x += SHADE) {
      const [from, to] = [place(max[x]!), place(min[x]!)];
      for (let y = Math.ceil((from + 1) / SHADE) * SHADE; y < to; y += SHADE) quiet.put(x, y);
    }
  } else {
    for (let x = 0; x < across; x += DOTTED) for (const end of [max, min]) quiet.put(x, place(end[x]!));
  }
  return { strong, quiet, place };
}

/** A row further off counts as this many columns: a label reads as belonging to what it stands beside. */
const ROW_APART = 5;
/** Rows off from which a label would be taken for that of something else. */
const NEAR_ROWS = 2;

function drawExtremes(
  plot: PlotView,
  canvas: Canvas,
  region: Region,
  strong: Dots,
  place: Place,
  glyphs: Glyphs,
): void {
  const taken = new Set<number>();
  const keeps = (x: number, y: number) => taken.has(y * canvas.columns + x);
  const covers = (x: number, y: number) => keeps(x, y) || strong.cell(x - region.x, y - region.y) !== 0;
  const beads = plot.extremes.map(({ at, value, label }) => {
    const x = columnAt(at, region);
    const y = region.y + Math.floor(place(value) / DOTS_DOWN);
    taken.add(y * canvas.columns + x);
    return { x, y, label: cells(label) };
  });
  for (const { x, y, label } of beads) {
    // What brings it is left out before the label covers the curve, and the curve is covered before the label is lost.
    const short = label.split(',')[0]!;
    const tries = [
      [label, covers, NEAR_ROWS],
      [short, covers, NEAR_ROWS],
      [short, keeps, region.rows],
    ] as const;
    for (const [text, isTaken, rows] of tries) {
      const at = freeSpot(text.length, x, y, rows, region, isTaken);
      if (at === null) continue;
      canvas.put(at.x, at.y, text, 'strong');
      for (let cell = 0; cell < text.length; cell += 1) taken.add(at.y * canvas.columns + at.x + cell);
      // The shade keeps off the words.
      for (const cell of [at.x - 1, at.x + text.length]) {
        const inside = cell >= region.x && cell < region.x + region.columns;
        if (inside && !covers(cell, at.y)) canvas.put(cell, at.y, ' ');
      }
      break;
    }
  }
  for (const { x, y } of beads) canvas.put(x, y, glyphs.extreme, 'strong');
}

/** The place for a text nearest to a bead, at most `rows` off, where nothing is taken; null where there is none. */
function freeSpot(
  length: number,
  x: number,
  y: number,
  rows: number,
  region: Region,
  isTaken: (x: number, y: number) => boolean,
): { readonly x: number; readonly y: number } | null {
  let best: { x: number; y: number } | null = null;
  let least = Number.POSITIVE_INFINITY;
  const lastStart = region.x + region.columns - length;
  const first = Math.max(region.y, y - rows);
  const last = Math.min(region.y + region.rows - 1, y + rows);
  for (let row = first; row <= last; row += 1) {
    for (let start = region.x; start <= lastStart; start += 1) {
      const gap = start > x ? start - x : start + length - 1 < x ? x - start - length + 1 : 0;
      const cost = gap + ROW_APART * Math.abs(row - y);
      if (cost >= least) continue;
      let free = true;
      for (let cell = start - 1; free && cell <= start + length; cell += 1) free = !isTaken(cell, row);
      if (!free) continue;
      least = cost;
      best = { x: start, y: row };
    }
  }
  return best;
}
