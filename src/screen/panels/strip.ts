import type { Canvas } from '../draw/canvas.ts';
import { cells, keepToGlyphs } from '../draw/cells.ts';
import type { Glyphs } from '../draw/glyphs.ts';
import { ALL_KEYS, type View } from '../view.ts';
import { drawKeys } from './foot.ts';
import { heading, rule } from './region.ts';
import { drawHeads, drawTableRow, placeColumns, type TableColumn, type TableRow } from './table.ts';
import { drawTitle } from './title.ts';

/** A strip of handovers in words, places from 0 to 1 along it. */
export interface StripView {
  readonly title: string;
  readonly ends: readonly [string, string];
  readonly now: number;
  readonly nowText: string;
  readonly stretches: readonly StretchView[];
}

export interface StretchView {
  readonly from: number;
  readonly to: number;
  readonly fromText: string;
  readonly toText: string;
  /** null where nothing passes. */
  readonly size: string | null;
}

/** Title, heading, strip, ends; heads of the table; foot. */
const STRIP_AT = 2;
const TABLE_AT = 5;
const MARGIN = 4;
const LETTERS = 'abcdefghijklmnopqrstuvwxyz';

/** Rows of the table that a screen of this many rows shows at once. */
export function stripRows(rows: number): number {
  return Math.max(1, rows - TABLE_AT - 2);
}

/** a to z, then a2, b2 and so on. */
function letter(at: number): string {
  const round = Math.floor(at / LETTERS.length);
  return `${LETTERS[at % LETTERS.length]}${round === 0 ? '' : round + 1}`;
}

const COLUMNS: readonly TableColumn[] = [
  { head: '', align: 'left' },
  { head: 'from', align: 'right' },
  { head: 'to', align: 'right' },
  { head: 'size', align: 'left' },
];

/** The strip over its table: each stretch with the size that is best there, now under it. A text: how far finding it has come. */
export function drawStrip(
  screen: Pick<View, 'title'>,
  strip: StripView | string,
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
  heading(canvas, line, 2, cells(typeof strip === 'string' ? 'handovers' : strip.title), 'strong');
  if (typeof strip === 'string') canvas.put(MARGIN, STRIP_AT, cells(strip), 'quiet');
  else {
    drawBar(strip, canvas, columns - 2 * MARGIN, glyphs);
    drawTable(strip, scroll, canvas, glyphs);
  }
  const scrolls = typeof strip !== 'string' && strip.stretches.length > stripRows(rows);
  const foot = [
    ...(scrolls ? [{ keys: '↑↓', does: 'scroll' }] : []),
    { keys: 'Esc', does: 'back' },
    { keys: 'w', does: 'workings' },
    ALL_KEYS,
  ];
  drawKeys(foot, canvas, 1, columns - 1, rows - 1, glyphs);
  keepToGlyphs(canvas, glyphs);
}

function drawBar(strip: StripView, canvas: Canvas, width: number, glyphs: Glyphs): void {
  const place = (at: number) => MARGIN + Math.round(at * (width - 1));
  for (const [at, { from, to, size }] of strip.stretches.entries()) {
    const [first, end] = [place(from), at === strip.stretches.length - 1 ? place(to) + 1 : place(to)];
    if (end <= first) continue;
    const inHand = strip.now >= from && (strip.now < to || at === strip.stretches.length - 1);
    const style = inHand ? 'nowStrong' : 'plain';
    const fill = size === null ? glyphs.unknown : glyphs.rule;
    canvas.put(first, STRIP_AT, (letter(at) + fill.repeat(end - first)).slice(0, end - first), style);
  }
  canvas.put(place(Math.max(0, Math.min(1, strip.now))), STRIP_AT + 1, glyphs.pointer, 'nowStrong');
  const y = STRIP_AT + 2;
  const [least, most] = strip.ends.map(cells) as [string, string];
  canvas.put(MARGIN, y, least, 'quiet');
  canvas.putRight(MARGIN + width - 1, y, most, 'quiet');
  const now = cells(strip.nowText);
  const x = Math.max(
    MARGIN + least.length + 2,
    Math.min(place(strip.now) - Math.floor(now.length / 2), MARGIN + width - most.length - now.length - 2),
  );
  canvas.put(x, y, now, 'nowStrong');
}

function drawTable(strip: StripView, scroll: number, canvas: Canvas, glyphs: Glyphs): void {
  const line = { x: 0, y: TABLE_AT, columns: canvas.columns, rows: 1 };
  const rows = strip.stretches.map((stretch, at): TableRow => {
    const inHand = strip.now >= stretch.from && strip.now < stretch.to;
    return {
      cells: [letter(at), stretch.fromText, stretch.toText, stretch.size ?? 'none passes'],
      style: inHand ? 'nowStrong' : stretch.size === null ? 'quiet' : 'plain',
    };
  });
  rule(canvas, line, glyphs);
  const placed = placeColumns(COLUMNS, rows, MARGIN, canvas.columns - MARGIN - 1);
  drawHeads(COLUMNS, placed, canvas, line);
  const shown = stripRows(canvas.rows);
  const from = Math.max(0, Math.min(scroll, rows.length - shown));
  rows.slice(from, from + shown).forEach((row, at) => {
    drawTableRow(row, COLUMNS, placed, canvas, TABLE_AT + 1 + at, canvas.columns, glyphs);
    if (row.style === 'nowStrong') canvas.put(2, TABLE_AT + 1 + at, glyphs.now, 'nowStrong');
  });
  if (from > 0) canvas.put(1, TABLE_AT + 1, glyphs.further[0], 'quiet');
  if (from + shown < rows.length) canvas.put(1, TABLE_AT + shown, glyphs.further[1], 'quiet');
}
