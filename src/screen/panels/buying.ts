import type { BuyingView } from '../buying-view.ts';
import type { Canvas } from '../draw/canvas.ts';
import { cells, clip, keepToGlyphs, shorten, wrap } from '../draw/cells.ts';
import type { Glyphs } from '../draw/glyphs.ts';
import { drawKeys } from './foot.ts';
import type { Place } from './prompt.ts';
import { rule } from './region.ts';
import { drawHeads, drawTableRow, placeColumns, windowStart } from './table.ts';
import { drawBegun, type Framed } from './title.ts';

/** Title, two rows of what it goes by, heads. */
const ABOVE = 4;
/** Below this many columns the words on the size in hand take three rows, else two. */
const NARROW = 76;
const noteRows = (canvas: Canvas) => (canvas.columns < NARROW ? 3 : 2);
/** Those rows, foot. */
const below = (canvas: Canvas) => noteRows(canvas) + 1;
/** Most rows of what is told while something is typed: they lie over the table. */
const TOLD_ROWS = 6;
/** Cells for the marks of a row: in hand, at hand, lit, blanks. */
const MARGIN = 6;
/** What is told is wrapped at this: longer lines are hard to read. */
const MOST_COLUMNS = 130;
/** The words before a field take no more than this part of the row. */
const ASKS = 0.4;

/** Every size of the rack with what it takes to buy; gives the place of the field being typed into. */
export function drawBuying(screen: Framed, view: BuyingView, canvas: Canvas, glyphs: Glyphs): Place | null {
  const { columns } = canvas;
  drawBegun(screen, canvas, glyphs);
  view.status.forEach((text, at) => {
    canvas.put(1, 1 + at, clip(cells(text), columns - 2, glyphs), 'quiet');
  });
  drawSizes(view, canvas, glyphs);
  const width = Math.min(columns, MOST_COLUMNS) - 2;
  const place =
    view.question === null
      ? drawNote(screen, view, canvas, width, glyphs)
      : drawQuestion(view.question, canvas, width, glyphs);
  keepToGlyphs(canvas, glyphs);
  return place;
}

function drawSizes(view: BuyingView, canvas: Canvas, glyphs: Glyphs): void {
  const { columns } = canvas;
  const line = { x: 0, y: ABOVE - 1, columns, rows: 1 };
  rule(canvas, line, glyphs);
  const placed = placeColumns(view.columns, view.rows, MARGIN, columns - MARGIN - 1);
  drawHeads(view.columns, placed, canvas, line);
  const shown = Math.max(1, canvas.rows - ABOVE - below(canvas));
  const from = windowStart(view.rows.length, shown, view.inHand);
  view.rows.slice(from, from + shown).forEach((row, at) => {
    const y = ABOVE + at;
    const index = from + at;
    if (index === view.inHand) canvas.put(1, y, glyphs.hand, 'nowStrong');
    else if (at === 0 && from > 0) canvas.put(1, y, glyphs.further[0], 'quiet');
    else if (at === shown - 1 && from + shown < view.rows.length)
      canvas.put(1, y, glyphs.further[1], 'quiet');
    if (index === view.current) canvas.put(3, y, glyphs.current, 'nowStrong');
    if (index === view.lit) canvas.put(4, y, glyphs.lightest, 'strong');
    else if (view.nonDominated[index]) canvas.put(4, y, glyphs.nonDominated, row.style);
    drawTableRow(row, view.columns, placed, canvas, y, columns, glyphs);
  });
}

/** The size in hand in full, and below it the keys or the message of the moment. */
function drawNote({ notice }: Framed, view: BuyingView, canvas: Canvas, width: number, glyphs: Glyphs): null {
  const { columns, rows } = canvas;
  wrap(cells(view.note), width, noteRows(canvas), glyphs).forEach((text, at) => {
    canvas.put(1, rows - below(canvas) + at, text);
  });
  if (notice === null) drawKeys(view.foot, canvas, 1, columns - 1, rows - 1, glyphs);
  else {
    const text = clip(cells(notice.text), columns - 2, glyphs);
    canvas.put(1, rows - 1, text, notice.refusal ? 'governs' : 'strong');
  }
  return null;
}

/** What is asked on the last row, above it what may be typed or why that may not be. */
function drawQuestion(
  { asks, told, isFault }: NonNullable<BuyingView['question']>,
  canvas: Canvas,
  width: number,
  glyphs: Glyphs,
): Place {
  const { columns, rows } = canvas;
  const lines = wrap(cells(told), width, Math.min(TOLD_ROWS, rows - ABOVE - 2), glyphs);
  const first = rows - 1 - Math.max(lines.length, noteRows(canvas));
  for (let y = first; y < rows; y += 1) canvas.put(0, y, ' '.repeat(columns));
  lines.forEach((text, at) => {
    canvas.put(1, rows - 1 - lines.length + at, text, isFault ? 'governs' : 'quiet');
  });
  const question = shorten(cells(asks), Math.floor(columns * ASKS), glyphs);
  canvas.put(1, rows - 1, question, 'governsStrong');
  const column = question.length + 3;
  return { row: rows - 1, column, width: Math.max(1, columns - column - 1) };
}
