import type { SketchView } from '../../explore/diagrams/sketch-model.ts';
import type { Addition } from '../additions.ts';
import type { Canvas } from '../draw/canvas.ts';
import { cells, keepToGlyphs } from '../draw/cells.ts';
import type { Glyphs } from '../draw/glyphs.ts';
import { ALL_KEYS, type View } from '../view.ts';
import { drawKeys } from './foot.ts';
import { heading, rule, write } from './region.ts';
import { drawSketch, WITH_REACTIONS } from './sketch.ts';
import { drawTitle } from './title.ts';
import { drawVerdict } from './verdict.ts';

/** Rows above the list: title, verdict, rule. */
const ABOVE = 4;
/** Rows of the sketch below it, and the most that it takes. */
const SKETCH_ROWS = 5;
const MOST_SKETCH_ROWS = 8;
const LABEL_COLUMNS = 34;
const MOST_COLUMNS = 120;

/** The list of what can be added, under the verdict, and below it the beam as it is. */
export function drawAdd(
  view: View,
  question: string,
  lines: readonly Addition[],
  line: number,
  sketch: SketchView,
  canvas: Canvas,
  glyphs: Glyphs,
): void {
  canvas.glyphs.fill(' ');
  canvas.styles.fill(0);
  const columns = canvas.columns;
  drawTitle(view, canvas, { x: 0, y: 0, columns, rows: 1 }, glyphs);
  drawVerdict(view, canvas, { x: 0, y: 1, columns, rows: 2 }, glyphs);
  const region = { x: 0, y: ABOVE - 1, columns, rows: 1 };
  rule(canvas, region, glyphs);
  heading(canvas, region, 4, cells(question), 'strong');
  const end = canvas.rows - 2;
  lines.slice(0, end - ABOVE).forEach((each, index) => {
    const chosen = index === line;
    const y = ABOVE + index;
    if (chosen) canvas.put(1, y, glyphs.hand, 'nowStrong');
    canvas.put(3, y, each.key, 'strong');
    canvas.put(6, y, cells(each.label), chosen ? 'nowStrong' : 'plain');
    write(canvas, 6 + LABEL_COLUMNS, y, cells(each.detail), columns - 7 - LABEL_COLUMNS, 'quiet');
  });
  const below = ABOVE + lines.length + 1;
  const room = end - below;
  if (room >= SKETCH_ROWS) {
    const rows = Math.min(room, MOST_SKETCH_ROWS);
    const width = Math.min(columns, MOST_COLUMNS) - 6;
    drawSketch(sketch, canvas, { x: 3, y: end - rows, columns: width, rows }, rows >= WITH_REACTIONS, glyphs);
  }
  const foot = [
    { keys: '↑↓', does: 'choose' },
    { keys: 'Enter', does: 'add' },
    { keys: 'Esc', does: 'back' },
    ALL_KEYS,
  ];
  drawKeys(foot, canvas, 1, columns - 1, canvas.rows - 1, glyphs);
  keepToGlyphs(canvas, glyphs);
}
