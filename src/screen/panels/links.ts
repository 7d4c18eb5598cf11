import type { SketchView } from '../../explore/diagrams/sketch-model.ts';
import type { Canvas } from '../draw/canvas.ts';
import { cells, keepToGlyphs, shorten } from '../draw/cells.ts';
import type { Glyphs } from '../draw/glyphs.ts';
import type { LinksView } from '../links-view.ts';
import type { View } from '../view.ts';
import { drawFoot } from './foot.ts';
import { drawQuestion, type Place } from './prompt.ts';
import { rule } from './region.ts';
import { drawSketch, WITH_REACTIONS } from './sketch.ts';
import { drawHeads, drawTableRow, placeColumns, windowStart } from './table.ts';
import { drawTitle } from './title.ts';
import { drawVerdict } from './verdict.ts';

/** Title, two rows of the verdict, heads. */
const ABOVE = 4;
/** What is told while something is typed, foot. */
const BELOW = 2;
const MARGIN = 3;
const MOST_COLUMNS = 120;
/** Rows of the sketch, and the most that it takes. */
const SKETCH_ROWS = 5;
const MOST_SKETCH_ROWS = 9;

/** The links of a member under its verdict, and below them the beam with what lands on it; gives the place of the field being typed into. */
export function drawLinks(
  screen: View,
  view: LinksView,
  sketch: SketchView,
  canvas: Canvas,
  glyphs: Glyphs,
): Place | null {
  canvas.glyphs.fill(' ');
  canvas.styles.fill(0);
  const { columns, rows } = canvas;
  drawTitle(screen, canvas, { x: 0, y: 0, columns, rows: 1 }, glyphs);
  drawVerdict(screen, canvas, { x: 0, y: 1, columns, rows: 2 }, glyphs);
  const line = { x: 0, y: ABOVE - 1, columns, rows: 1 };
  rule(canvas, line, glyphs);
  const table = view.rows.filter((_, at) => view.lines[at] !== null);
  const width = Math.min(columns, MOST_COLUMNS) - MARGIN - 1;
  const placed = placeColumns(view.columns, table, MARGIN, width);
  if (table.length > 0) drawHeads(view.columns, placed, canvas, line);
  const shown = Math.max(1, rows - ABOVE - BELOW);
  const from = windowStart(view.rows.length, shown, view.inHand);
  view.rows.slice(from, from + shown).forEach((row, at) => {
    const y = ABOVE + at;
    const index = from + at;
    if (view.lines[index] === null) {
      canvas.put(1, y, shorten(cells(row.cells.join(' ')), columns - 2, glyphs), row.style);
      return;
    }
    if (index === view.inHand) canvas.put(1, y, glyphs.hand, 'nowStrong');
    else if (at === shown - 1 && index < view.rows.length - 1) canvas.put(1, y, glyphs.further[1], 'quiet');
    const held = index === view.inHand ? { ...row, style: 'nowStrong' as const } : row;
    drawTableRow(held, view.columns, placed, canvas, y, columns, glyphs);
  });
  const room = rows - BELOW - ABOVE - view.rows.length - 1;
  if (room >= SKETCH_ROWS) {
    const tall = Math.min(room, MOST_SKETCH_ROWS);
    const region = { x: 3, y: rows - BELOW - tall, columns: Math.min(columns, MOST_COLUMNS) - 6, rows: tall };
    drawSketch(sketch, canvas, region, tall >= WITH_REACTIONS, glyphs);
  }
  const place = view.question === null ? null : drawQuestion(view.question, canvas, glyphs);
  if (place === null)
    drawFoot({ ...screen, foot: view.foot }, canvas, { x: 0, y: rows - 1, columns, rows: 1 }, glyphs);
  keepToGlyphs(canvas, glyphs);
  return place;
}
