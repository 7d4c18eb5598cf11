import { DOTS_ACROSS, DOTS_DOWN, Dots } from '../../sheet/drawing/dots.ts';
import { dotGlyph } from '../draw/braille.ts';
import type { Canvas } from '../draw/canvas.ts';
import { cells, keepToGlyphs, shorten } from '../draw/cells.ts';
import type { Glyphs } from '../draw/glyphs.ts';
import type { HeadroomView, StoreyView } from '../headroom-view.ts';
import { ALL_KEYS, type View } from '../view.ts';
import { drawKeys } from './foot.ts';
import { drawKnobs, type EntryPlace } from './knobs.ts';
import { heading, type Region, rule } from './region.ts';
import { drawTableRow, placeColumns, type TableColumn, type TableRow, windowStart } from './table.ts';
import { drawTitle } from './title.ts';
import { drawVerdict } from './verdict.ts';

/** Title, verdict on two rows. */
const ABOVE = 3;
/** From this many columns knobs, storey and rack stand side by side. */
const WIDE = 100;
const KNOBS = { columns: 31, rows: 8 } as const;
/** Size, clear height, and by how much it is over. */
const RACK = 44;
const LABELS = 19;
/** The room is drawn no wider than this many times its height. */
const ROOM = 1.4;

/** The storey to scale with its knobs, and what each size of the rack leaves; says where the field being typed stands. */
export function drawHeadroom(
  screen: View,
  view: HeadroomView,
  canvas: Canvas,
  glyphs: Glyphs,
): EntryPlace | null {
  canvas.glyphs.fill(' ');
  canvas.styles.fill(0);
  const { columns, rows } = canvas;
  drawTitle(screen, canvas, { x: 0, y: 0, columns, rows: 1 }, glyphs);
  drawVerdict(screen, canvas, { x: 0, y: 1, columns, rows: 2 }, glyphs);
  const body = rows - ABOVE - 1;
  const wide = columns >= WIDE;
  const first = wide ? KNOBS.columns : RACK;
  const knobs = { x: 0, y: ABOVE, columns: first, rows: wide ? body : KNOBS.rows };
  const place = drawKnobs(view, canvas, knobs, glyphs);
  if (view.entry === null && view.note !== '' && view.knobs.every((knob) => knob.fault === null))
    canvas.put(4, ABOVE + 1 + view.knobs.length, view.note, 'quiet');
  const rack = wide
    ? { x: columns - RACK, y: ABOVE, columns: RACK, rows: body }
    : { x: 0, y: ABOVE + KNOBS.rows, columns: RACK, rows: body - KNOBS.rows };
  drawRows(view, canvas, rack, glyphs);
  const storey = { x: first, y: ABOVE, columns: columns - first - (wide ? RACK : 0), rows: body };
  drawStorey(view, canvas, storey, glyphs);
  const foot =
    view.entry === null
      ? [
          { keys: '↑↓', does: 'knob' },
          { keys: '←→', does: 'nudge' },
          { keys: 'Enter', does: 'type' },
          { keys: 'Delete', does: 'no storey' },
          { keys: 'Esc', does: 'back' },
          { keys: 'w', does: 'workings' },
          ALL_KEYS,
        ]
      : [
          { keys: 'Enter', does: 'take it' },
          { keys: 'Esc', does: 'leave it' },
        ];
  drawKeys(foot, canvas, 1, columns - 1, rows - 1, glyphs);
  keepToGlyphs(canvas, glyphs);
  return place;
}

const COLUMNS: readonly TableColumn[] = [
  { head: 'size', align: 'left' },
  { head: 'clear', align: 'right' },
  { head: '', align: 'left' },
];

/** The rack about the lit size: too deep ones stay, with how much they are over. */
function drawRows(view: HeadroomView, canvas: Canvas, region: Region, glyphs: Glyphs): void {
  rule(canvas, region, glyphs);
  const rows: TableRow[] = view.rows.map((row, at) => ({
    cells: [row.label, row.clear, row.says],
    style: at === view.current ? 'nowStrong' : at === view.lit ? 'strong' : row.counts ? 'plain' : 'quiet',
  }));
  const placed = placeColumns(COLUMNS, rows, region.x + 4, region.columns - 5);
  for (const [at, { x, cells: width }] of placed.entries()) {
    const head = COLUMNS[at]!.head;
    heading(canvas, region, COLUMNS[at]!.align === 'right' ? x + width - head.length : x, head);
  }
  const shown = region.rows - 1;
  const start = windowStart(rows.length, shown, view.lit >= 0 ? view.lit : view.current);
  rows.slice(start, start + shown).forEach((row, at) => {
    const y = region.y + 1 + at;
    const index = start + at;
    if (index === view.current) canvas.put(region.x + 1, y, glyphs.current, 'nowStrong');
    if (index === view.lit) canvas.put(region.x + 2, y, glyphs.lightest, 'strong');
    drawTableRow(row, COLUMNS, placed, canvas, y, region.x + region.columns, glyphs);
  });
}

/** The section through the storey in dots, one scale both ways; the layers are named beside it. */
function drawStorey(view: HeadroomView, canvas: Canvas, region: Region, glyphs: Glyphs): void {
  const { storey } = view;
  rule(canvas, region, glyphs);
  heading(
    canvas,
    region,
    region.x + 3,
    shorten(cells(view.sentence), region.columns - 5, glyphs),
    view.fits ? 'strong' : 'governsStrong',
  );
  const rows = region.rows - 1;
  const columns = Math.min(region.columns - LABELS - 3, Math.round(rows * 2 * ROOM));
  if (rows < 3 || columns < 6) return;
  const picture = { x: region.x + 3, y: region.y + 1, columns, rows };
  const last = rows * DOTS_DOWN - 1;
  const place = (inches: number) =>
    Math.round((Math.max(0, Math.min(storey.height, inches)) / storey.height) * last);
  const { beam, rest } = layersOf(storey, picture, place);
  for (let row = 0; row < rows; row += 1) {
    for (let column = 0; column < columns; column += 1) {
      const [own, other] = [beam.cell(column, row), rest.cell(column, row)];
      if ((own | other) === 0) continue;
      const bits = glyphs.kind === 'ascii' && own !== 0 ? own : own | other;
      const glyph = glyphs.kind === 'ascii' && own !== 0 ? glyphs.beyond : dotGlyph(bits, glyphs);
      canvas.put(
        picture.x + column,
        picture.y + row,
        glyph,
        own !== 0 ? (view.fits ? 'nowStrong' : 'governsStrong') : 'quiet',
      );
    }
  }
  drawLabels(storey, canvas, picture, place, glyphs);
}

/** Dots between two of the line up to which clear height is wanted, and of the joists' hatching. */
const DASH = 3;

function layersOf(storey: StoreyView, picture: Region, place: (inches: number) => number) {
  const { columns, rows } = picture;
  const across = columns * DOTS_ACROSS;
  const last = rows * DOTS_DOWN - 1;
  const beam = new Dots(columns, rows);
  const rest = new Dots(columns, rows);
  const level = (y: number, step = 1) => {
    for (let x = 0; x < across; x += step) rest.put(x, y);
  };
  level(0);
  level(place(storey.joists.from));
  level(last);
  level(place(storey.wanted), DASH);
  if (storey.ceiling.to > storey.ceiling.from) {
    level(place(storey.ceiling.from));
    level(place(storey.ceiling.to));
  }
  const wide = Math.max(2, Math.round((storey.beam.width / storey.height) * last));
  const left = Math.round((across - wide) / 2);
  const isBeside = storey.joists.from === storey.beam.from;
  const ends = (x: number) => !isBeside || x < left - 1 || x > left + wide;
  for (let x = 0; x < across; x += 1) {
    if (storey.joists.to > storey.joists.from && ends(x)) {
      rest.put(x, place(storey.joists.to));
      if (x % (2 * DASH) === 0) rest.upright(x, place(storey.joists.from), place(storey.joists.to));
    }
    if (x >= left && x < left + wide) beam.upright(x, place(storey.beam.from), place(storey.beam.to));
  }
  return { beam, rest };
}

/** Each label beside its layer, moved down where another stands. */
function drawLabels(
  storey: StoreyView,
  canvas: Canvas,
  picture: Region,
  place: (inches: number) => number,
  glyphs: Glyphs,
): void {
  let next = picture.y;
  const end = picture.y + picture.rows - 1;
  const left = storey.labels.length;
  for (const [at, { at: inches, text, over }] of storey.labels.entries()) {
    const wanted = picture.y + Math.floor(place(inches) / DOTS_DOWN);
    const y = Math.min(Math.max(wanted, next), end - (left - 1 - at));
    canvas.put(
      picture.x + picture.columns + 1,
      y,
      shorten(cells(text), LABELS, glyphs),
      over ? 'governsStrong' : 'plain',
    );
    next = y + 1;
  }
}
