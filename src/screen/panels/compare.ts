import type { CompareRow, CompareView } from '../compare-view.ts';
import type { Canvas } from '../draw/canvas.ts';
import { cells, keepToGlyphs, shorten } from '../draw/cells.ts';
import type { Glyphs } from '../draw/glyphs.ts';
import { ALL_KEYS, type View } from '../view.ts';
import { drawKeys } from './foot.ts';
import type { EntryPlace } from './knobs.ts';
import { heading, rule } from './region.ts';
import { drawTitle } from './title.ts';

/** Title, heads, notes; note in full, foot. */
const ABOVE = 2;
const BELOW = 2;
/** The mark that a row differs. */
const MARGIN = 3;
const LABEL_MOST = 12;
const LABEL_WIDE = 16;
const WIDE = 100;
const COLUMN = { least: 9, most: 22 } as const;
const NOTE = 'note';

/** What the view is asked to show. */
export interface CompareShown {
  /** Index of the design in hand. */
  readonly design: number;
  readonly scroll: number;
  /** A note is being typed on the design in hand. */
  readonly typing: boolean;
}

/** A line of the table; a row whose values are too long for their columns takes a second one. */
type Line = { readonly title: string } | { readonly row: CompareRow; readonly rest: boolean };

function linesOf(view: CompareView, width: number): Line[] {
  return view.sections.flatMap(({ title, rows }): Line[] => [
    { title },
    ...rows.flatMap((row): Line[] => {
      const long = row.values.some((value) => broken(value, width)[1] !== '');
      return long
        ? [
            { row, rest: false },
            { row, rest: true },
          ]
        : [{ row, rest: false }];
    }),
  ]);
}

/** A value on two lines where it is too long for one: broken at a blank or behind the cross of a size. */
function broken(value: string, width: number): readonly [string, string] {
  const text = cells(value);
  if (text.length <= width) return [text, ''];
  const at = Math.max(text.lastIndexOf(' ', width), text.lastIndexOf('x', width - 1) + 1);
  return at > 0 ? [text.slice(0, at).trimEnd(), text.slice(at).trimStart()] : [text, ''];
}

/** Where the columns stand on a screen of this width. */
function placesOf(view: CompareView, design: number, columns: number) {
  const all = view.sections.flatMap((section) => section.rows);
  const most = columns >= WIDE ? LABEL_WIDE : LABEL_MOST;
  const label = Math.min(most, Math.max(...all.map((row) => cells(row.label).length)));
  const first = MARGIN + label + 2;
  return { label, first, ...columnsOf(view, all, design, columns - first - 1) };
}

/** The furthest that the lines can be scrolled. */
export function lastCompareScroll(view: CompareView, columns: number, rows: number): number {
  const { width } = placesOf(view, 0, columns);
  return Math.max(0, linesOf(view, width).length - (rows - ABOVE - BELOW));
}

/** Designs side by side, the one at hand always first; says where the note being typed stands. */
export function drawCompare(
  screen: Pick<View, 'title'>,
  view: CompareView,
  { design, scroll, typing }: CompareShown,
  canvas: Canvas,
  glyphs: Glyphs,
): EntryPlace | null {
  canvas.glyphs.fill(' ');
  canvas.styles.fill(0);
  const { columns, rows } = canvas;
  drawTitle(screen, canvas, { x: 0, y: 0, columns, rows: 1 }, glyphs);
  const { label, first, width, shown } = placesOf(view, design, columns);
  const lines = linesOf(view, width);
  const x = (place: number) => first + place * (width + 1);

  const region = { x: 0, y: 1, columns, rows: 1 };
  rule(canvas, region, glyphs);
  shown.forEach((index, place) => {
    const head = view.heads[index]!;
    const inHand = index === design;
    const text = inHand ? `${glyphs.hand} ${head}` : head;
    heading(canvas, region, x(place) + width - text.length, text, inHand ? 'nowStrong' : 'strong');
  });
  const room = rows - ABOVE - BELOW;
  const offset = Math.max(0, Math.min(scroll, lines.length - room));
  lines.slice(offset, offset + room).forEach((line, at) => {
    const y = ABOVE + at;
    if ('title' in line) {
      canvas.put(1, y, line.title, 'quiet');
      return;
    }
    const { row, rest } = line;
    if (row.differs && !rest) canvas.put(1, y, glyphs.differs, 'now');
    if (!rest) canvas.put(MARGIN, y, shorten(cells(row.label), label, glyphs));
    shown.forEach((index, place) => {
      const value = shorten(broken(row.values[index]!, width)[rest ? 1 : 0], width, glyphs);
      const other = index > 0 && row.values[index] !== row.values[0];
      const style = index === design ? 'nowStrong' : other ? 'strong' : row.differs ? 'plain' : 'quiet';
      const none = rest ? '' : glyphs.none;
      canvas.putRight(x(place) + width - 1, y, value === '' ? none : value, style);
    });
  });
  if (offset > 0) canvas.put(0, ABOVE, glyphs.further[0], 'quiet');
  if (offset + room < lines.length) canvas.put(0, ABOVE + room - 1, glyphs.further[1], 'quiet');
  const place = drawNote(view, design, typing, canvas, glyphs);
  drawKeys(footOf(view, design, typing), canvas, 1, columns - 1, rows - 1, glyphs);
  keepToGlyphs(canvas, glyphs);
  return place;
}

/** As many designs as fit, the one at hand first, the one in hand always among them. */
function columnsOf(
  view: CompareView,
  rows: readonly CompareRow[],
  design: number,
  room: number,
): { readonly width: number; readonly shown: readonly number[] } {
  const count = view.heads.length;
  const longest = Math.max(...rows.flatMap((row) => row.values.map((value) => cells(value).length)));
  const even = Math.floor((room + 1) / count) - 1;
  const width = Math.min(COLUMN.most, Math.max(COLUMN.least, Math.min(longest, even)));
  const fit = Math.max(2, Math.floor((room + 1) / (width + 1)));
  const from = Math.max(1, design - fit + 2);
  return {
    width,
    shown: [0, ...view.heads.keys()].filter(
      (at, place) => place === 0 || (at >= from && at < from + fit - 1),
    ),
  };
}

function drawNote(
  view: CompareView,
  design: number,
  typing: boolean,
  canvas: Canvas,
  glyphs: Glyphs,
): EntryPlace | null {
  const y = canvas.rows - BELOW;
  if (view.heads.length === 1) {
    canvas.put(1, y, 'Nothing is pinned yet: p in the explorer sets the design at hand aside.', 'quiet');
    return null;
  }
  if (design === 0) return null;
  const head = `${NOTE} of pin ${design}`;
  canvas.put(1, y, head, typing ? 'governsStrong' : 'quiet');
  const column = 1 + head.length + 2;
  const width = canvas.columns - column - 1;
  if (typing) return { row: y, column, width };
  canvas.put(column, y, shorten(cells(view.notes[design]!) || glyphs.none, width, glyphs));
  return null;
}

function footOf(view: CompareView, design: number, typing: boolean) {
  if (typing) {
    return [
      { keys: 'Enter', does: 'keep the note' },
      { keys: 'Esc', does: 'leave it' },
    ];
  }
  const onPin = design > 0;
  return [
    ...(view.heads.length > 1 ? [{ keys: '←→', does: 'design' }] : []),
    ...(onPin ? [{ keys: 'Enter', does: 'go back to it' }] : []),
    ...(onPin ? [{ keys: 'n', does: 'note' }] : []),
    ...(onPin ? [{ keys: 'Delete', does: 'drop' }] : []),
    { keys: '↑↓', does: 'scroll' },
    { keys: 'Esc', does: 'back' },
    { keys: 'w', does: 'workings' },
    ALL_KEYS,
  ];
}
