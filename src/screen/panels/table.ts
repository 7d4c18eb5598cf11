import type { Canvas, Style } from '../draw/canvas.ts';
import { cells, shorten } from '../draw/cells.ts';
import type { Glyphs } from '../draw/glyphs.ts';
import { heading, type Region } from './region.ts';

/** A column of a table that takes the width of the screen. */
export interface TableColumn {
  readonly head: string;
  readonly align: 'left' | 'right';
  /** Where there is no room those with the greatest number go first, texts with a `least` once they are as short as that; absent: it always stands. */
  readonly spare?: number;
  /** Of text: to no fewer cells is it shortened as long as another column may go; absent: to 16. */
  readonly least?: number;
}

export interface TableRow {
  /** One text a column. */
  readonly cells: readonly string[];
  readonly style: Style;
  /** Of single cells, by column, in place of the row's. */
  readonly styles?: Readonly<Record<number, Style>>;
  /** In the margin: the glyph of what the row is. */
  readonly mark?: string;
}

/** Where a column stands. */
export interface PlacedColumn {
  readonly index: number;
  readonly x: number;
  readonly cells: number;
}

const GAP = 2;
/** Texts are shortened to this before a column goes, unless it says otherwise, and to the lesser once none is left that may. */
const SHORT_TEXT = 16;
const LEAST_TEXT = 8;

/** The columns that fit into so many cells, each as wide as what it holds. */
export function placeColumns(
  columns: readonly TableColumn[],
  rows: readonly TableRow[],
  x: number,
  width: number,
): PlacedColumn[] {
  const needed = columns.map(({ head }, at) =>
    Math.max(cells(head).length, ...rows.map((row) => cells(row.cells[at] ?? '').length)),
  );
  let shown = columns.map((_, at) => at);
  const total = () => shown.reduce((sum, at) => sum + needed[at]! + GAP, -GAP);
  const isText = (at: number) => {
    const { align, spare, least } = columns[at]!;
    return align === 'left' && (spare === undefined || least !== undefined);
  };
  const shortest = () =>
    shown.reduce(
      (sum, at) =>
        sum + (isText(at) ? Math.min(needed[at]!, columns[at]!.least ?? SHORT_TEXT) : needed[at]!) + GAP,
      -GAP,
    );
  while (shortest() > width) {
    const spare = shown.filter((at) => columns[at]!.spare !== undefined);
    if (spare.length === 0) break;
    const first = spare.reduce((a, b) => (columns[b]!.spare! > columns[a]!.spare! ? b : a));
    shown = shown.filter((at) => at !== first);
  }
  while (total() > width) {
    const longer = (least: (at: number) => number) =>
      shown.filter((at) => isText(at) && needed[at]! > least(at));
    const spared = longer((at) => columns[at]!.least ?? SHORT_TEXT);
    const texts = spared.length > 0 ? spared : longer(() => LEAST_TEXT);
    if (texts.length === 0) break;
    const widest = texts.reduce((a, b) => (needed[b]! > needed[a]! ? b : a));
    needed[widest]! -= 1;
  }
  let at = x;
  return shown.map((index) => {
    const placed = { index, x: at, cells: needed[index]! };
    at += needed[index]! + GAP;
    return placed;
  });
}

/** The heads, let into the rule that the region is. */
export function drawHeads(
  columns: readonly TableColumn[],
  placed: readonly PlacedColumn[],
  canvas: Canvas,
  region: Region,
): void {
  for (const { index, x, cells: width } of placed) {
    const { head, align } = columns[index]!;
    const text = cells(head);
    heading(canvas, region, align === 'right' ? x + width - text.length : x, text);
  }
}

export function drawTableRow(
  row: TableRow,
  columns: readonly TableColumn[],
  placed: readonly PlacedColumn[],
  canvas: Canvas,
  y: number,
  end: number,
  glyphs: Glyphs,
): void {
  for (const { index, x, cells: width } of placed) {
    const text = shorten(cells(row.cells[index] ?? ''), width, glyphs);
    const at = columns[index]!.align === 'right' ? x + width - text.length : x;
    if (at + text.length > end) continue;
    canvas.put(at, y, text, row.styles?.[index] ?? row.style);
  }
}

/** The first row of a window of so many rows that keeps the one in hand in sight, near its middle. */
export function windowStart(rows: number, shown: number, inHand: number): number {
  return Math.max(0, Math.min(inHand - Math.floor(shown / 2), rows - shown));
}
