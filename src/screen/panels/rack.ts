import type { Canvas, Style } from '../draw/canvas.ts';
import { cells, shorten } from '../draw/cells.ts';
import type { Glyphs } from '../draw/glyphs.ts';
import type { RackRowView, RackView, View } from '../view.ts';
import { PASS, showRatio } from './figures.ts';
import { heading, type Region, rule, write, writeRight } from './region.ts';

/** Cells before a size's label: the further mark, the one at hand, the lightest, a blank. */
const MARGIN = 4;
const LABEL_LEAST = 9;
const LABEL_MOST = 22;
const WEIGHT = 5;
const STOPS = 11;
const STOPS_LEAST = 8;
const STOPS_MOST = 24;
const REACH = 10;
/** The lit size stands at about this part of the window: most of what is shown is heavier. */
const LIT_AT = 0.35;
const NAMES = ['shear', 'bend', 'defl'] as const;

interface Columns {
  readonly label: number;
  /** Cells of one ratio: 7 with its name above, less with its power only. */
  readonly ratio: number;
  /** 0 when there is no room for what stops a size. */
  readonly stops: number;
  readonly reach: boolean;
}

/** The cells the whole rack takes, so that a layout can give it no more. */
export function rackColumns(rack: RackView, reach: boolean): number {
  const { label, stops } = widths(rack);
  return MARGIN + label + WEIGHT + 3 * 7 + 2 + stops + (reach ? REACH : 0) + 2;
}

/** Cells that labels and what stops them want: of all sizes, so that scrolling moves no column. */
function widths(rack: RackView): { label: number; stops: number } {
  let label = LABEL_LEAST;
  let stops = STOPS;
  for (const row of rack.rows) {
    label = Math.max(label, row.label.length);
    stops = Math.max(stops, row.stops.length);
  }
  return { label: Math.min(label, LABEL_MOST), stops: Math.min(stops, STOPS_MOST) };
}

/** The columns that fit: ratios move closer first, then reach goes, then what stops a size, then the label is shortened. */
function fitColumns(rack: RackView, width: number, wantsReach: boolean): Columns {
  const { label, stops } = widths(rack);
  const fixed = MARGIN + label + WEIGHT;
  for (const reach of wantsReach ? [true, false] : [false]) {
    for (const ratio of [7, 6, 5]) {
      const rest = width - fixed - 3 * ratio - (reach ? REACH : 0) - 2;
      if (rest >= STOPS) return { label, ratio, stops: Math.min(rest, stops), reach };
    }
  }
  const tight = width - fixed - 3 * 5 - 2;
  if (tight >= STOPS_LEAST) return { label, ratio: 5, stops: tight, reach: false };
  const short = Math.min(label, width - MARGIN - WEIGHT - 3 * 5 - 1);
  return { label: short, ratio: 5, stops: 0, reach: false };
}

/**
 * The stock sizes, lightest first, in a window about the lit size and the one at hand; a size at hand
 * outside the window is held at its edge. `ruled` lays the heading into a rule.
 */
export function drawRack(
  view: View,
  canvas: Canvas,
  region: Region,
  glyphs: Glyphs,
  options: { readonly reach: boolean; readonly ruled: boolean },
): void {
  const { rack } = view;
  const columns = fitColumns(rack, region.columns, options.reach);
  drawHeading(rack, canvas, region, columns, options.ruled, glyphs);
  const rows = Math.min(region.rows - 1, rack.rows.length);
  if (rows < 1) return;
  const start = firstShown(rack, rows);
  for (let place = 0; place < rows; place += 1) {
    let index = start + place;
    let further = '';
    if (place === 0 && rack.current >= 0 && rack.current < start) {
      index = rack.current;
      further = glyphs.further[0];
    } else if (place === rows - 1 && rack.current >= start + rows && rack.current < rack.rows.length) {
      index = rack.current;
      further = glyphs.further[1];
    }
    drawRow(rack, index, further, canvas, region, region.y + 1 + place, columns, glyphs);
  }
}

/** The first row of the window: the lit size a third down, moved to take in the size at hand where both fit. */
function firstShown(rack: RackView, rows: number): number {
  const { lightest, current } = rack;
  const last = Math.max(0, rack.rows.length - rows);
  const centre = lightest >= 0 ? lightest - Math.floor(rows * LIT_AT) : current - Math.floor(rows / 2);
  let start = Math.max(0, Math.min(centre, last));
  if (lightest < 0 || current < 0) return start;
  if (current < start && lightest - current < rows) start = current;
  if (current >= start + rows && current - lightest < rows) start = current - rows + 1;
  // Held at the edge, the size at hand must not hide the lit one.
  if (current < start && lightest === start && start > 0 && rows > 1) start -= 1;
  if (current >= start + rows && lightest === start + rows - 1 && start < last && rows > 1) start += 1;
  return start;
}

function drawHeading(
  rack: RackView,
  canvas: Canvas,
  region: Region,
  columns: Columns,
  ruled: boolean,
  glyphs: Glyphs,
): void {
  const { x, y } = region;
  if (ruled) rule(canvas, region, glyphs);
  const put = (end: number, text: string): void => {
    if (ruled) heading(canvas, region, end - text.length + 1, text);
    else canvas.put(end - text.length + 1, y, text, 'quiet');
  };
  const weightEnd = x + MARGIN + columns.label + WEIGHT - 1;
  const unit = cells(rack.weightUnit);
  const woodAt = ruled ? x + 2 : x + 1;
  const wood = shorten(cells(rack.wood), weightEnd - unit.length - woodAt - 1, glyphs);
  put(woodAt + wood.length - 1, wood);
  put(weightEnd, unit);
  for (const [power, name] of NAMES.entries()) {
    const text = columns.ratio < 7 ? glyphs.superscripts[power]! : name + glyphs.superscripts[power];
    put(weightEnd + (power + 1) * columns.ratio, text);
  }
  const stopsAt = weightEnd + 3 * columns.ratio + 3;
  const stops = columns.stops < STOPS ? 'stops' : 'stopped by';
  if (columns.stops > 0) put(stopsAt + stops.length - 1, stops);
  if (columns.reach) put(stopsAt + columns.stops + REACH - 2, 'reach');
}

function drawRow(
  rack: RackView,
  index: number,
  further: string,
  canvas: Canvas,
  region: Region,
  y: number,
  columns: Columns,
  glyphs: Glyphs,
): void {
  const row = rack.rows[index]!;
  const { x } = region;
  const isCurrent = index === rack.current;
  const isLit = index === rack.lightest;
  const style = rowStyle(row, isCurrent, isLit);
  canvas.put(x, y, further, 'quiet');
  if (isCurrent) canvas.put(x + 1, y, glyphs.current, 'nowStrong');
  if (isLit) canvas.put(x + 2, y, glyphs.lightest, 'strong');
  canvas.put(x + MARGIN, y, shorten(cells(row.label), columns.label, glyphs), style);

  const weightEnd = x + MARGIN + columns.label + WEIGHT - 1;
  writeRight(canvas, x + MARGIN + columns.label, weightEnd, y, cells(row.weight), style);
  const worst = Math.max(...row.ratios.map((ratio) => ratio ?? 0));
  for (const [power, ratio] of row.ratios.entries()) {
    const end = weightEnd + (power + 1) * columns.ratio;
    const fails = ratio !== null && ratio > PASS && ratio === worst;
    writeRight(canvas, end - 4, end, y, showRatio(ratio, glyphs), fails ? 'governs' : style);
  }
  const stopsAt = weightEnd + 3 * columns.ratio + 3;
  if (columns.stops > 0) {
    const stops = isLit ? 'lightest' : cells(row.stops);
    canvas.put(stopsAt, y, shorten(stops, columns.stops, glyphs), style);
  }
  if (columns.reach) {
    const end = stopsAt + columns.stops + REACH - 2;
    write(canvas, end - row.reach.length + 1, y, cells(row.reach), REACH - 2, style);
  }
}

/** The size at hand in the accent of now, the lit one strong, those that fail dimmed. */
function rowStyle(row: RackRowView, isCurrent: boolean, isLit: boolean): Style {
  if (isCurrent) return 'nowStrong';
  if (isLit) return 'strong';
  return row.passes ? 'plain' : 'quiet';
}
