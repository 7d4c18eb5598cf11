import type { Canvas, Style } from '../draw/canvas.ts';
import { cells, clip, shorten } from '../draw/cells.ts';
import type { Glyphs } from '../draw/glyphs.ts';
import type { RackRowView, RackView, View } from '../view.ts';
import { PASS, showRatio } from './figures.ts';
import { heading, type Region, rule, write, writeRight } from './region.ts';

/** Cells before a size's label: the further mark, the one at hand, the lightest, a blank. */
const MARGIN = 4;
const LABEL_LEAST = 9;
const LABEL_MOST = 22;
/** With the wood behind it: what leaves room for what stops a size on 80 columns. */
const NAMED_MOST = 20;
/** Longest name of a wood, and the blank before it. */
const WOOD_MOST = 14;
const GAP = 1;
const WEIGHT = 5;
const STOPS = 11;
/** Beside a column of woods: "stopped by" and no blank more. */
const STOPS_MIXED = 10;
const STOPS_LEAST = 8;
const STOPS_MOST = 24;
const REACH = 10;
/** Blanks before a price. */
const PRICE_GAP = 2;
const PRICE_MOST = 12;
/** The lit size stands at about this part of the window: most of what is shown is heavier. */
const LIT_AT = 0.35;
const NAMES = ['shear', 'bend', 'defl'] as const;
const PRICE = 'price';

interface Columns {
  readonly label: number;
  /** 0 where the wood has no column of its own: then a label names it where it must. */
  readonly wood: number;
  /** 0 where nothing has a price, or there is no room. */
  readonly price: number;
  /** Cells of one ratio: 7 with its name above, less with its power only. */
  readonly ratio: number;
  /** 0 when there is no room for what stops a size. */
  readonly stops: number;
  readonly reach: boolean;
}

/** The cells the whole rack takes, so that a layout can give it no more. */
export function rackColumns(rack: RackView, reach: boolean): number {
  const { label, wood, price, stops } = widths(rack);
  const first = MARGIN + label + (wood > 0 ? wood + GAP : 0);
  return first + WEIGHT + price + 3 * 7 + 2 + stops + (reach ? REACH : 0) + 2;
}

interface Widths {
  readonly label: number;
  readonly named: number;
  readonly wood: number;
  readonly price: number;
  readonly stops: number;
}

/** Cells that the columns of texts want: of all sizes, so that scrolling moves none of them. */
function widths(rack: RackView): Widths {
  let label = LABEL_LEAST;
  let named = LABEL_LEAST;
  let wood = 0;
  let price = 0;
  let stops = STOPS;
  for (const row of rack.rows) {
    label = Math.max(label, row.label.length);
    named = Math.max(named, (row.named ?? row.label).length);
    wood = Math.max(wood, (row.wood ?? '').length);
    if (row.price !== undefined) price = Math.max(price, PRICE.length, row.price.length);
    stops = Math.max(stops, row.stops.length);
  }
  return {
    label: Math.min(label, LABEL_MOST),
    named: wood > 0 ? Math.min(Math.max(named, label), NAMED_MOST) : Math.min(label, LABEL_MOST),
    wood: Math.min(wood, WOOD_MOST),
    price: price === 0 ? 0 : PRICE_GAP + Math.min(price, PRICE_MOST),
    stops: Math.min(stops, STOPS_MOST),
  };
}

/**
 * The columns that fit: ratios move closer first, then reach goes, then the woods go into the labels, then the prices,
 * then what stops a size, then the label is shortened.
 */
function fitColumns(rack: RackView, width: number, wantsReach: boolean): Columns {
  const { named, price } = widths(rack);
  const fit = fitPriced(rack, width, wantsReach, price) ?? fitPriced(rack, width, wantsReach, 0);
  if (fit !== null) return fit;
  const short = Math.min(named, width - MARGIN - WEIGHT - 3 * 5 - 1);
  return { label: short, wood: 0, price: 0, ratio: 5, stops: 0, reach: false };
}

/** With so many cells for prices; null where what stops a size has no room. */
function fitPriced(rack: RackView, width: number, wantsReach: boolean, price: number): Columns | null {
  const { label, named, wood, stops } = widths(rack);
  const room = width - MARGIN - WEIGHT - price - 2;
  for (const woods of wood > 0 ? [wood, 0] : [0]) {
    const first = woods > 0 ? label + GAP + woods : named;
    const least = wood > 0 ? STOPS_MIXED : STOPS;
    for (const reach of wantsReach ? [true, false] : [false]) {
      for (const ratio of [7, 6, 5]) {
        const rest = room - first - 3 * ratio - (reach ? REACH : 0);
        if (rest < least) continue;
        return { label: first, wood: woods, price, ratio, stops: Math.min(rest, stops), reach };
      }
    }
  }
  const tight = room - named - 3 * 5;
  return tight < STOPS_LEAST ? null : { label: named, wood: 0, price, ratio: 5, stops: tight, reach: false };
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
  const figuresEnd = weightEnd + columns.price;
  if (columns.price > 0) put(figuresEnd, PRICE);
  for (const [power, name] of NAMES.entries()) {
    const text = columns.ratio < 7 ? glyphs.superscripts[power]! : name + glyphs.superscripts[power];
    put(figuresEnd + (power + 1) * columns.ratio, text);
  }
  const stopsAt = figuresEnd + 3 * columns.ratio + 3;
  const stops = columns.stops < STOPS_MIXED ? 'stops' : 'stopped by';
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
  else if (row.nonDominated) canvas.put(x + 2, y, glyphs.nonDominated, row.lacking ? 'quiet' : 'plain');
  const own = columns.wood > 0 ? columns.label - GAP - columns.wood : columns.label;
  const label = columns.wood > 0 ? row.label : (row.named ?? row.label);
  canvas.put(x + MARGIN, y, clip(cells(label), own, glyphs), style);
  const wood = shorten(cells(row.wood ?? ''), columns.wood, glyphs);
  if (columns.wood > 0) canvas.put(x + MARGIN + own + GAP, y, wood, style);

  const weightEnd = x + MARGIN + columns.label + WEIGHT - 1;
  writeRight(canvas, x + MARGIN + columns.label, weightEnd, y, cells(row.weight), style);
  const figuresEnd = weightEnd + columns.price;
  writeRight(
    canvas,
    weightEnd + PRICE_GAP,
    figuresEnd,
    y,
    columns.price > 0 ? cells(row.price ?? '') : '',
    style,
  );
  const worst = Math.max(...row.ratios.map((ratio) => ratio ?? 0));
  for (const [power, ratio] of row.ratios.entries()) {
    const end = figuresEnd + (power + 1) * columns.ratio;
    const fails = ratio !== null && ratio > PASS && ratio === worst;
    writeRight(canvas, end - 4, end, y, showRatio(ratio, glyphs), fails ? 'governs' : style);
  }
  const stopsAt = figuresEnd + 3 * columns.ratio + 3;
  if (columns.stops > 0) {
    const stops = narrowed(cells(isLit ? (rack.litWord ?? 'lightest') : row.stops), columns.stops);
    canvas.put(stopsAt, y, clip(stops, columns.stops, glyphs), style);
  }
  if (columns.reach) {
    const end = stopsAt + columns.stops + REACH - 2;
    write(canvas, end - row.reach.length + 1, y, cells(row.reach), REACH - 2, style);
  }
}

/** Words for a column too narrow for the usual ones, so that none is cut. */
const NARROW: Readonly<Record<string, string>> = {
  deflection: 'defl.',
  'total defl.': 'total',
  slenderness: 'slender',
  'not in yard': 'no yard',
};

function narrowed(stops: string, width: number): string {
  return stops.length <= width ? stops : (NARROW[stops] ?? stops.replace(/^over by /, 'over '));
}

/** The size at hand in the accent of now, the lit one strong, those that fail dimmed. */
function rowStyle(row: RackRowView, isCurrent: boolean, isLit: boolean): Style {
  if (isCurrent) return 'nowStrong';
  if (isLit) return 'strong';
  return row.passes && !row.lacking ? 'plain' : 'quiet';
}
