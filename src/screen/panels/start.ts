import type { Canvas } from '../draw/canvas.ts';
import { cells, clip, keepToGlyphs, shorten, wrap } from '../draw/cells.ts';
import type { Glyphs } from '../draw/glyphs.ts';
import type { StartRow, StartView } from '../starts.ts';
import { drawKeys } from './foot.ts';
import { drawPrompt, type Place } from './prompt.ts';
import { windowStart } from './table.ts';

const LEFT = 3;
/** Cells of the key. */
const KEY = 3;
/** Title and a blank row; a blank row, two of what is asked or told, and the foot. */
const ABOVE = 2;
const BELOW = 4;
/** Rows of what is wrong. */
const FAULT_ROWS = 2;

/** What a start offers, and the question of the moment; gives the place of the field being typed into. */
export function drawStart(view: StartView, canvas: Canvas, glyphs: Glyphs): Place | null {
  const { columns, rows } = canvas;
  canvas.put(1, 0, 'thrice', 'strong');
  canvas.put(9, 0, view.title);
  const shown = Math.max(1, rows - ABOVE - BELOW);
  const from = windowStart(view.rows.length, shown, view.inHand);
  view.rows.slice(from, from + shown).forEach((row, at) => {
    const index = from + at;
    drawRow(
      row,
      { inHand: index === view.inHand, answered: view.question !== null, name: nameCells(view, row) },
      canvas,
      ABOVE + at,
      glyphs,
    );
    if (index !== view.inHand && at === 0 && from > 0) canvas.put(0, ABOVE, glyphs.further[0], 'quiet');
    if (at === shown - 1 && index < view.rows.length - 1)
      canvas.put(0, ABOVE + at, glyphs.further[1], 'quiet');
  });
  const fault = view.fault === null ? [] : wrap(cells(view.fault), columns - 2, FAULT_ROWS, glyphs);
  const faultFrom = rows - 1 - (view.question === null ? 0 : 1) - fault.length;
  let place: Place | null = null;
  if (view.question === null) drawKeys(view.foot, canvas, 1, columns - 1, rows - 1, glyphs);
  else place = drawPrompt(canvas, view.question.asks, clip(cells(view.question.hint), columns - 2, glyphs));
  fault.forEach((text, at) => {
    canvas.put(1, faultFrom + at, text, 'governs');
  });
  keepToGlyphs(canvas, glyphs);
  return place;
}

/** Cells of the names before what is said of them: of the numbered lines, or of the others. */
function nameCells({ rows }: StartView, of: StartRow): number {
  const numbered = (row: StartRow) => 'key' in row && row.key !== '';
  const names = rows.filter((row) => 'text' in row && row.about !== '' && numbered(row) === numbered(of));
  return Math.max(0, ...names.map((row) => ('text' in row ? cells(row.text).length : 0)));
}

function drawRow(
  row: StartRow,
  { inHand, answered, name: cellsOfName }: { inHand: boolean; answered: boolean; name: number },
  canvas: Canvas,
  y: number,
  glyphs: Glyphs,
): void {
  if ('heading' in row) {
    canvas.put(2, y, row.heading, 'quiet');
    return;
  }
  const style = inHand ? 'nowStrong' : answered ? 'quiet' : 'plain';
  if (inHand) canvas.put(1, y, glyphs.hand, 'nowStrong');
  canvas.put(LEFT, y, row.key, 'quiet');
  const x = LEFT + KEY;
  const room = canvas.columns - x - 1;
  canvas.put(x, y, shorten(cells(row.text), Math.min(room, cellsOfName), glyphs), style);
  const about = x + cellsOfName + 2;
  if (row.about !== '')
    canvas.put(about, y, clip(cells(row.about), canvas.columns - about - 1, glyphs), 'quiet');
}
