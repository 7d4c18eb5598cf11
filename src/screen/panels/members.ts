import type { Canvas } from '../draw/canvas.ts';
import { cells, clip, keepToGlyphs } from '../draw/cells.ts';
import type { Glyphs } from '../draw/glyphs.ts';
import type { MembersView } from '../members-view.ts';
import { drawLastRow } from './foot.ts';
import { drawQuestion, type Place } from './prompt.ts';
import { rule } from './region.ts';
import { drawHeads, drawTableRow, placeColumns, windowStart } from './table.ts';
import { drawBegun, type Framed } from './title.ts';

/** Title, status, heads. */
const ABOVE = 3;
/** Two rows of notes, the foot. */
const BELOW = 3;
const MARGIN = 3;
const MOST_COLUMNS = 180;
/** Most rows of who loses what. */
const MOST_NOTES = 8;

/** The members of a session, one a row, and who carries whom; gives the place of the field being typed into. */
export function drawMembers(screen: Framed, view: MembersView, canvas: Canvas, glyphs: Glyphs): Place | null {
  const { columns, rows } = canvas;
  const width = Math.min(columns, MOST_COLUMNS);
  drawBegun(screen, canvas, glyphs);
  canvas.put(1, 1, clip(cells(view.status), columns - 2, glyphs), 'quiet');
  const heads = { x: 0, y: ABOVE - 1, columns, rows: 1 };
  rule(canvas, heads, glyphs);
  const placed = placeColumns(view.columns, view.rows, MARGIN, width - MARGIN - 1);
  drawHeads(view.columns, placed, canvas, heads);
  const shown = Math.max(1, rows - ABOVE - BELOW);
  const from = windowStart(view.rows.length, shown, view.inHand);
  view.rows.slice(from, from + shown).forEach((row, at) => {
    const y = ABOVE + at;
    const index = from + at;
    const held = index === view.inHand;
    if (held) canvas.put(1, y, glyphs.hand, 'nowStrong');
    else if (at === 0 && from > 0) canvas.put(1, y, glyphs.further[0], 'quiet');
    else if (at === shown - 1 && from + shown < view.rows.length)
      canvas.put(1, y, glyphs.further[1], 'quiet');
    drawTableRow(
      { ...row, style: held ? 'nowStrong' : row.style },
      view.columns,
      placed,
      canvas,
      y,
      columns,
      glyphs,
    );
  });
  drawNotes(view, canvas, glyphs);
  const place = view.question === null ? null : drawQuestion(view.question, canvas, glyphs);
  if (place === null) drawLastRow(screen.notice, view.foot, canvas, glyphs);
  keepToGlyphs(canvas, glyphs);
  return place;
}

/** Above the foot; who loses what lies over the list where it takes more rows. */
function drawNotes(view: MembersView, canvas: Canvas, glyphs: Glyphs): void {
  const { columns, rows } = canvas;
  const end = rows - (view.question === null ? 1 : 2);
  const most = view.question === null ? BELOW - 1 : Math.min(MOST_NOTES, rows - ABOVE - BELOW);
  const each = view.notes.map((note) => clip(cells(note), columns - 2, glyphs));
  const lines =
    each.length > most ? [...each.slice(0, most - 1), `and ${each.length - most + 1} more`] : each;
  lines.forEach((line, at) => {
    const y = end - lines.length + at;
    canvas.put(0, y, ' '.repeat(columns));
    canvas.put(1, y, line, 'quiet');
  });
}
