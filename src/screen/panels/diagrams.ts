import { type DiagramsView, GUTTER } from '../diagrams-view.ts';
import type { Canvas } from '../draw/canvas.ts';
import { cells, keepToGlyphs } from '../draw/cells.ts';
import type { Glyphs } from '../draw/glyphs.ts';
import type { TitleView } from '../view.ts';
import { drawKeys } from './foot.ts';
import { drawPlot } from './plot.ts';
import { heading, type Region, rule } from './region.ts';
import { columnAt, drawSketch, sketchRows } from './sketch.ts';
import { drawTitle } from './title.ts';

/** Rows that are neither sketch nor diagrams: title, rule, the cursor's place, foot. */
const AROUND = 4;
/** The most rows of the sketch: on the lowest screens, on a usual one, on a tall one. */
const SKETCH = { low: 5, usual: 7, high: 10 } as const;
/** Rows of a usual screen. */
const USUAL = 24;
/** From this many rows a blank row parts the diagrams, and the reactions are shown. */
const PARTED = 30;
const PLOTS = 3;

/** The diagrams over the whole canvas: what they are of, the beam, shear, moment and deflection under it. */
export function drawDiagrams(title: TitleView, view: DiagramsView, canvas: Canvas, glyphs: Glyphs): void {
  canvas.glyphs.fill(' ');
  canvas.styles.fill(0);
  const { columns, rows } = canvas;
  drawTitle({ title }, canvas, { x: 0, y: 0, columns, rows: 1 }, glyphs);
  drawWhich(view, canvas, { x: 0, y: 1, columns, rows: 1 }, glyphs);

  const parted = rows >= PARTED ? 1 : 0;
  const free = rows - AROUND;
  const across = { x: GUTTER, columns: columns - GUTTER - 1 };
  const reactions = rows >= PARTED;
  const most = reactions ? SKETCH.high : rows >= USUAL ? SKETCH.usual : SKETCH.low;
  const needed = sketchRows(view.sketch, across.columns, most, reactions, glyphs);
  const each = Math.floor((free - needed) / PLOTS);
  // What the diagrams cannot share evenly stands above the loads.
  const sketch = free - each * PLOTS;
  drawSketchBeside(view, canvas, { ...across, y: 2, rows: sketch }, reactions, glyphs);
  for (const [index, plot] of view.plots.entries()) {
    const region = { y: 2 + sketch + index * each + parted, rows: each - parted };
    const gutter = { ...region, x: 1, columns: GUTTER - 2 };
    drawPlot(plot, canvas, { ...across, ...region }, gutter, view.cursor, glyphs);
  }
  drawPlace(view, canvas, { ...across, y: rows - 2, rows: 1 }, glyphs);
  drawKeys(view.foot, canvas, 1, columns - 1, rows - 1, glyphs);
  keepToGlyphs(canvas, glyphs);
}

function drawWhich(view: DiagramsView, canvas: Canvas, region: Region, glyphs: Glyphs): void {
  rule(canvas, region, glyphs);
  const which = cells(view.which);
  heading(canvas, region, 2, which, 'strong');
  const counts = cells(view.counts);
  const x = region.columns - counts.length - 2;
  if (x > 2 + which.length + 3) heading(canvas, region, x, counts);
}

function drawSketchBeside(
  view: DiagramsView,
  canvas: Canvas,
  region: Region,
  reactions: boolean,
  glyphs: Glyphs,
): void {
  const hidden = drawSketch(view.sketch, canvas, region, reactions, glyphs);
  const beam = region.y + region.rows - (reactions ? 3 : 2);
  canvas.put(1, beam - 1, 'loads', 'quiet');
  if (hidden > 0) canvas.put(1, beam, `${hidden} more`, 'quiet');
  if (reactions) canvas.put(1, beam + 2, 'reactions', 'quiet');
  canvas.put(columnAt(view.cursor, region), beam, glyphs.now, 'nowStrong');
}

/** Where the cursor stands, under it: text that would leave the row is moved in. */
function drawPlace(view: DiagramsView, canvas: Canvas, region: Region, glyphs: Glyphs): void {
  const column = columnAt(view.cursor, region);
  const text = cells(view.place);
  const fitsRight = column + 2 + text.length <= region.x + region.columns;
  canvas.put(column, region.y, glyphs.pointer, 'nowStrong');
  canvas.put(fitsRight ? column + 2 : column - 1 - text.length, region.y, text, 'now');
}
