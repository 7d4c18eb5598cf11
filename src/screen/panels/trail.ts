import type { Canvas } from '../draw/canvas.ts';
import { cells, clip, keepToGlyphs } from '../draw/cells.ts';
import type { Glyphs } from '../draw/glyphs.ts';
import type { Notice } from '../state.ts';
import type { TrailView } from '../trail-view.ts';
import { ALL_KEYS, type View } from '../view.ts';
import { drawKeys } from './foot.ts';
import { rule } from './region.ts';
import { drawHeads, drawTableRow, placeColumns, windowStart } from './table.ts';
import { drawTitle } from './title.ts';

/** Title, heads, the foot. */
const AROUND = 3;
const MARGIN = 3;
const MOST_COLUMNS = 120;

/** What was done to a member, oldest first; the line in hand can be gone back to. */
export function drawTrail(
  view: Pick<View, 'title'>,
  trail: TrailView,
  line: number,
  notice: Notice | null,
  canvas: Canvas,
  glyphs: Glyphs,
): void {
  const columns = Math.min(canvas.columns, MOST_COLUMNS);
  drawTitle(view, canvas, { x: 0, y: 0, columns: canvas.columns, rows: 1 }, glyphs);
  const region = { x: 0, y: 1, columns: canvas.columns, rows: 1 };
  rule(canvas, region, glyphs);
  const shown = Math.max(1, canvas.rows - AROUND);
  const start = windowStart(trail.count, shown, line);
  const rows = trail.rows(start, start + shown);
  const placed = placeColumns(trail.columns, rows, MARGIN, columns - MARGIN - 1);
  drawHeads(trail.columns, placed, canvas, region);
  for (const [at, row] of rows.entries()) {
    const y = 2 + at;
    const chosen = start + at === line;
    if (chosen) canvas.put(1, y, glyphs.hand, 'nowStrong');
    else if (at === 0 && start > 0) canvas.put(1, y, glyphs.further[0], 'quiet');
    else if (at === shown - 1 && start + shown < trail.count) canvas.put(1, y, glyphs.further[1], 'quiet');
    const style = chosen ? 'nowStrong' : row.style;
    drawTableRow({ ...row, style }, trail.columns, placed, canvas, y, columns, glyphs);
  }
  const foot = [
    { keys: '↑↓', does: 'line' },
    { keys: 'Enter', does: 'back to it, as it stood then' },
    { keys: 'u', does: 'undo' },
    { keys: 'i', does: 'units' },
    { keys: 'Esc', does: 'back' },
    { keys: 'w', does: 'workings' },
    ALL_KEYS,
  ];
  if (notice !== null) {
    const text = clip(cells(notice.text), canvas.columns - 2, glyphs);
    canvas.put(1, canvas.rows - 1, text, notice.refusal ? 'governs' : 'strong');
  } else drawKeys(foot, canvas, 1, canvas.columns - 1, canvas.rows - 1, glyphs);
  keepToGlyphs(canvas, glyphs);
}
