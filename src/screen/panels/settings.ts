import type { Canvas } from '../draw/canvas.ts';
import { cells, clip, keepToGlyphs, shorten } from '../draw/cells.ts';
import type { Glyphs } from '../draw/glyphs.ts';
import type { SettingsRow, SettingsView } from '../settings-view.ts';
import type { Notice } from '../state.ts';
import { drawLastRow } from './foot.ts';
import type { Place } from './prompt.ts';
import { rule } from './region.ts';
import { windowStart } from './table.ts';
import { drawBegun, type Framed } from './title.ts';

/** Title, rule. */
const ABOVE = 2;
/** What the setting in hand is about, the foot. */
const BELOW = 2;
const LABEL = 3;
const VALUE = 18;
/** Values in words are no longer; from this many columns what they are about stands beside them. */
const VALUE_CELLS = 36;
const WIDE = 110;

/** What is set for the whole session, one setting a row; gives the place of the field being typed into. */
export function drawSettings(
  screen: Framed,
  view: SettingsView,
  canvas: Canvas,
  glyphs: Glyphs,
): Place | null {
  const { columns, rows } = canvas;
  drawBegun(screen, canvas, glyphs);
  rule(canvas, { x: 0, y: 1, columns, rows: 1 }, glyphs);
  const shown = Math.max(1, rows - ABOVE - BELOW);
  const from = windowStart(view.rows.length, shown, view.inHand);
  view.rows.slice(from, from + shown).forEach((row, at) => {
    const held = from + at === view.inHand;
    drawRow(row, held, canvas, ABOVE + at, glyphs);
    if (held) canvas.put(1, ABOVE + at, glyphs.hand, 'nowStrong');
    else if (at === 0 && from > 0) canvas.put(0, ABOVE + at, glyphs.further[0], 'quiet');
    else if (at === shown - 1 && from + shown < view.rows.length)
      canvas.put(0, ABOVE + at, glyphs.further[1], 'quiet');
  });
  drawBelow(screen.notice, view, canvas, glyphs);
  keepToGlyphs(canvas, glyphs);
  if (!view.typing) return null;
  return { row: ABOVE + view.inHand - from, column: VALUE, width: columns - VALUE - 1 };
}

function drawRow(row: SettingsRow, held: boolean, canvas: Canvas, y: number, glyphs: Glyphs): void {
  if ('heading' in row) {
    canvas.put(2, y, row.heading, 'quiet');
    return;
  }
  const wide = canvas.columns >= WIDE;
  const room = wide ? VALUE_CELLS : canvas.columns - VALUE - 1;
  canvas.put(LABEL, y, row.label, held ? 'nowStrong' : 'plain');
  canvas.put(VALUE, y, shorten(cells(row.value), room, glyphs), held ? 'nowStrong' : 'plain');
  const about = VALUE + VALUE_CELLS + 2;
  if (wide) canvas.put(about, y, clip(cells(row.about), canvas.columns - about - 1, glyphs), 'quiet');
}

function drawBelow(notice: Notice | null, view: SettingsView, canvas: Canvas, glyphs: Glyphs): void {
  const { columns, rows } = canvas;
  const row = view.rows[view.inHand]!;
  const about = 'about' in row ? row.about : '';
  const told = view.fault ?? about;
  canvas.put(1, rows - 2, clip(cells(told), columns - 2, glyphs), view.fault === null ? 'quiet' : 'governs');
  drawLastRow(notice, view.foot, canvas, glyphs);
}
