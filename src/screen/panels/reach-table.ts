import type { Canvas } from '../draw/canvas.ts';
import { keepToGlyphs } from '../draw/cells.ts';
import type { Glyphs } from '../draw/glyphs.ts';
import type { ReachView } from '../reach-view.ts';
import { ALL_KEYS, type View } from '../view.ts';
import { drawKeys } from './foot.ts';
import { rule } from './region.ts';
import { drawHeads, drawTableRow, placeColumns } from './table.ts';
import { drawTitle } from './title.ts';

/** Title, heads; foot. */
const ABOVE = 2;
const BELOW = 1;
const MARGIN = 5;
const MOST_COLUMNS = 130;

/** Rows of the table that a screen of this many rows shows at once. */
export function reachRows(rows: number): number {
  return Math.max(1, rows - ABOVE - BELOW);
}

/** Every size of the rack with its longest span, in the order of the rack, from line `scroll` on. */
export function drawReachTable(
  screen: Pick<View, 'title'>,
  view: ReachView,
  scroll: number,
  canvas: Canvas,
  glyphs: Glyphs,
): void {
  canvas.glyphs.fill(' ');
  canvas.styles.fill(0);
  const { columns, rows } = canvas;
  drawTitle(screen, canvas, { x: 0, y: 0, columns, rows: 1 }, glyphs);
  const line = { x: 0, y: 1, columns, rows: 1 };
  rule(canvas, line, glyphs);
  const width = Math.min(columns, MOST_COLUMNS) - MARGIN - 1;
  const placed = placeColumns(view.columns, view.rows, MARGIN, width);
  drawHeads(view.columns, placed, canvas, line);
  const shown = reachRows(rows);
  const from = Math.max(0, Math.min(scroll, view.rows.length - shown));
  view.rows.slice(from, from + shown).forEach((row, at) => {
    const y = ABOVE + at;
    if (from + at === view.current) canvas.put(2, y, glyphs.current, 'nowStrong');
    if (from + at === view.lit) canvas.put(3, y, glyphs.lightest, 'strong');
    drawTableRow(row, view.columns, placed, canvas, y, columns, glyphs);
  });
  if (from > 0) canvas.put(1, ABOVE, glyphs.further[0], 'quiet');
  if (from + shown < view.rows.length) canvas.put(1, ABOVE + shown - 1, glyphs.further[1], 'quiet');
  if (view.rows.length === 0) canvas.put(MARGIN, ABOVE, 'This wood has no stock sizes.', 'quiet');
  const scrolls = view.rows.length > shown;
  const foot = [
    ...(scrolls ? [{ keys: '↑↓', does: `scroll ${view.rows.length} sizes` }] : []),
    { keys: 'i', does: 'units' },
    { keys: 'Esc', does: 'back' },
    { keys: 'w', does: 'workings' },
    ALL_KEYS,
  ];
  drawKeys(foot, canvas, 1, columns - 1, rows - 1, glyphs);
  keepToGlyphs(canvas, glyphs);
}
