import type { Canvas } from '../draw/canvas.ts';
import { cells, keepToGlyphs, shorten } from '../draw/cells.ts';
import type { Glyphs } from '../draw/glyphs.ts';
import { type MovesView, SIDE_LINES, type SideView, WAYS, type Way } from '../moves-view.ts';
import { ALL_KEYS, type View } from '../view.ts';
import { showRatio } from './figures.ts';
import { drawKeys } from './foot.ts';
import { heading, rule, write } from './region.ts';
import { drawHeads, drawTableRow, placeColumns, windowStart } from './table.ts';
import { drawTitle } from './title.ts';
import { drawVerdict } from './verdict.ts';

/** Title, verdict. */
const ABOVE = 3;
/** Cells of what a line of "deepen or widen" is, of the mark of what is in hand. */
const SIDE_LABEL = 11;
const MARGIN = 3;
/** Cells of one ratio, close and with room for its name above. */
const RATIO = { close: 5, wide: 8 } as const;
const MOST_SIDE = 52;
const WIDE_SIDE = 40;
/** What the move in hand comes to: a rule, the ratios on two rows, what it takes. */
const BELOW = 4;
const MOST_COLUMNS = 130;

/** Deepening and widening side by side, under them the moves, best first, and what the one in hand comes to. */
export function drawMoveList(
  view: View,
  moves: MovesView,
  line: number,
  way: Way,
  canvas: Canvas,
  glyphs: Glyphs,
): void {
  canvas.glyphs.fill(' ');
  canvas.styles.fill(0);
  const columns = Math.min(canvas.columns, MOST_COLUMNS);
  drawTitle(view, canvas, { x: 0, y: 0, columns: canvas.columns, rows: 1 }, glyphs);
  drawVerdict(view, canvas, { x: 0, y: 1, columns: canvas.columns, rows: 2 }, glyphs);
  drawSides(moves, line, way, canvas, columns, glyphs);
  const top = ABOVE + 1 + SIDE_LINES;
  const rows = canvas.rows - top - 1 - BELOW - 1;
  drawRows(moves, line - SIDE_LINES, canvas, columns, top, rows, glyphs);
  drawAfter(moves, canvas, columns, top + 1 + Math.min(rows, Math.max(1, moves.rows.length)), glyphs);
  const foot = [
    { keys: '↑↓', does: 'move' },
    ...(line < SIDE_LINES ? [{ keys: '←→', does: 'deepen or widen' }] : []),
    { keys: 'Enter', does: 'apply' },
    { keys: 'i', does: 'units' },
    { keys: 'Esc', does: 'back' },
    { keys: 'w', does: 'workings' },
    ALL_KEYS,
  ];
  drawKeys(foot, canvas, 1, canvas.columns - 1, canvas.rows - 1, glyphs);
  keepToGlyphs(canvas, glyphs);
}

function drawSides(
  moves: MovesView,
  line: number,
  way: Way,
  canvas: Canvas,
  columns: number,
  glyphs: Glyphs,
): void {
  const region = { x: 0, y: ABOVE, columns: canvas.columns, rows: 1 };
  rule(canvas, region, glyphs);
  const side = Math.min(MOST_SIDE, Math.floor((columns - MARGIN - SIDE_LABEL) / 2));
  const ratio = side >= WIDE_SIDE ? RATIO.wide : RATIO.close;
  // Less the mark of what is in hand and a blank before the next side.
  const name = side - 3 * ratio - 2 - 1;
  for (const [at, each] of WAYS.entries()) {
    const x = MARGIN + SIDE_LABEL + at * side + 2;
    heading(canvas, region, x, each, 'strong');
    for (const power of [0, 1, 2] as const) {
      const head = `${['shear', 'bend', 'defl'][power]}${glyphs.superscripts[power]}`;
      const shown = ratio === RATIO.wide ? head : glyphs.superscripts[power];
      heading(canvas, region, x + name + (power + 1) * ratio - shown.length, shown);
    }
  }
  moves.sides.forEach((each, row) => {
    const y = ABOVE + 1 + row;
    canvas.put(MARGIN, y, each.label, row === line ? 'strong' : 'plain');
    WAYS.forEach((which, at) => {
      const x = MARGIN + SIDE_LABEL + at * side;
      const inHand = row === line && which === way;
      if (inHand) canvas.put(x, y, glyphs.hand, 'nowStrong');
      drawSide(each.sides[which], inHand, x + 2, y, { name, ratio }, canvas, glyphs);
    });
  });
}

function drawSide(
  side: SideView | null,
  inHand: boolean,
  x: number,
  y: number,
  cellsOf: { readonly name: number; readonly ratio: number },
  canvas: Canvas,
  glyphs: Glyphs,
): void {
  if (side === null) {
    canvas.put(x, y, 'the largest', 'quiet');
    return;
  }
  const style = inHand ? 'nowStrong' : side.passes ? 'strong' : 'quiet';
  canvas.put(x, y, shorten(cells(side.to), cellsOf.name, glyphs), style);
  for (const [power, ratio] of side.ratios.entries()) {
    const fails = ratio !== null && ratio > 1 && ratio === Math.max(...side.ratios.map((each) => each ?? 0));
    canvas.putRight(
      x + cellsOf.name + (power + 1) * cellsOf.ratio - 1,
      y,
      showRatio(ratio, glyphs),
      fails ? 'governs' : 'plain',
    );
  }
}

function drawRows(
  moves: MovesView,
  inHand: number,
  canvas: Canvas,
  columns: number,
  top: number,
  rows: number,
  glyphs: Glyphs,
): void {
  const region = { x: 0, y: top, columns: canvas.columns, rows: 1 };
  rule(canvas, region, glyphs);
  if (moves.rows.length === 0) {
    canvas.put(MARGIN, top + 1, moves.none, 'quiet');
    return;
  }
  const placed = placeColumns(moves.columns, moves.rows, MARGIN, columns - MARGIN - 1);
  drawHeads(moves.columns, placed, canvas, region);
  const start = windowStart(moves.rows.length, rows, inHand);
  moves.rows.slice(start, start + rows).forEach((row, at) => {
    const y = top + 1 + at;
    const chosen = start + at === inHand;
    if (chosen) canvas.put(1, y, glyphs.hand, 'nowStrong');
    else if (at === 0 && start > 0) canvas.put(1, y, glyphs.further[0], 'quiet');
    else if (at === rows - 1 && start + rows < moves.rows.length)
      canvas.put(1, y, glyphs.further[1], 'quiet');
    const shown = chosen ? { ...row, style: 'nowStrong' as const } : row;
    drawTableRow(shown, moves.columns, placed, canvas, y, columns, glyphs);
  });
}

/** Every ratio after the move in hand, on as many rows as they take. */
function drawAfter(moves: MovesView, canvas: Canvas, columns: number, y: number, glyphs: Glyphs): void {
  if (moves.after.length === 0) return;
  const region = { x: 0, y, columns: canvas.columns, rows: 1 };
  rule(canvas, region, glyphs);
  heading(canvas, region, MARGIN, shorten(cells(moves.note), columns - MARGIN - 3, glyphs));
  let [x, row] = [MARGIN, y + 1];
  for (const item of moves.after) {
    const text = cells(item);
    if (x > MARGIN && x + text.length > columns - 1) [x, row] = [MARGIN, row + 1];
    if (row > y + 2) return;
    write(canvas, x, row, text, columns - 1 - x);
    x += text.length + 3;
  }
  write(canvas, MARGIN, row + 1, cells(moves.takes), columns - 1 - MARGIN, 'quiet');
}
