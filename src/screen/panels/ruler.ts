import type { Canvas, Style } from '../draw/canvas.ts';
import { cells } from '../draw/cells.ts';
import type { Glyphs } from '../draw/glyphs.ts';
import type { RulerView, View } from '../view.ts';
import { type Axis, columnOf, columnWithin, fitAxis, isOn, TICKS } from './axis.ts';
import { isFree, type Region } from './region.ts';
import { drawZones } from './zones.ts';

/** Rows of the ruler: labels of the marks, zones, figures, stock depths. */
export const RULER_ROWS = 4;

/** The columns of what stands on the axis; null where it is absent or off the axis. */
interface Marks {
  readonly now: number | null;
  readonly ghost: number | null;
  readonly wall: number | null;
}

/**
 * The l/h axis, zoned by the power that governs, with the crossovers, the wall where the member stops
 * standing, now and its ghost, and the stock depths at this span: those left of the wall pass.
 */
export function drawRuler(view: View, canvas: Canvas, region: Region, glyphs: Glyphs): void {
  const { ruler } = view;
  const { x, y } = region;
  const axis = fitAxis(ruler, region);
  const marks = placeMarks(ruler, axis);

  canvas.put(x + 1, y + 1, 'l/h', 'quiet');
  canvas.put(x + 1, y + 3, 'stock', 'quiet');
  const taken = [marks.now, marks.ghost, marks.wall];
  drawZones(view, canvas, y + 1, axis, marks.now, taken, glyphs);
  if (marks.wall !== null) {
    for (let row = y; row < y + RULER_ROWS; row += 1) {
      canvas.put(marks.wall, row, glyphs.limit, 'governsStrong');
    }
  }
  if (marks.ghost !== null) canvas.put(marks.ghost, y + 1, glyphs.ghost);
  if (marks.now !== null) {
    canvas.put(marks.now, y + 1, bead(ruler.now, axis, glyphs), 'nowStrong');
    canvas.put(marks.now, y + 3, glyphs.pointer, 'nowStrong');
  }

  drawWallLabel(ruler, canvas, region, axis, marks, glyphs);
  if (marks.now !== null) drawNowLabel(ruler, canvas, region, marks.now);
  drawTicks(canvas, region, y + 2, axis);
  drawStock(ruler, canvas, region, y + 3, axis, marks.now);
}

function stands(ruler: RulerView): boolean {
  return ruler.standsTo !== null && ruler.now <= ruler.standsTo;
}

/** However near they are, a member that stands is drawn left of the wall and one that does not right of it. */
function placeMarks(ruler: RulerView, axis: Axis): Marks {
  const ghost = isOn(ruler.ghost, axis) ? columnOf(ruler.ghost, axis) : null;
  const wall = isOn(ruler.standsTo, axis) ? columnOf(ruler.standsTo, axis) : null;
  if (!Number.isFinite(ruler.now)) return { now: null, ghost, wall };
  const now = columnWithin(ruler.now, axis);
  if (wall === null) return { now, ghost, wall };
  return { now: stands(ruler) ? Math.min(now, wall - 1) : Math.max(now, wall + 1), ghost, wall };
}

function bead(now: number, axis: Axis, glyphs: Glyphs): string {
  if (now > axis.high) return glyphs.offRight;
  return now < axis.low ? glyphs.offLeft : glyphs.now;
}

/** Puts text at the first of these columns where it is free of all else; leaves it out when none is. */
function putFree(
  canvas: Canvas,
  region: Region,
  y: number,
  text: string,
  columns: readonly number[],
  style: Style,
): void {
  const column = columns.find((at) => isFree(canvas, region, at, y, text.length));
  if (column !== undefined) canvas.put(column, y, text, style);
}

/** "stands to 14.1" beside the wall, on the side away from now; at the axis's end when the wall is off it. */
function drawWallLabel(
  ruler: RulerView,
  canvas: Canvas,
  region: Region,
  axis: Axis,
  { wall }: Marks,
  glyphs: Glyphs,
): void {
  const { y } = region;
  const { standsTo } = ruler;
  if (standsTo === null || Number.isNaN(standsTo)) {
    putFree(canvas, region, y, 'stands nowhere', [axis.first], 'governs');
    return;
  }
  const text = Number.isFinite(standsTo) ? `stands to ${roundDown(standsTo).toFixed(1)}` : 'stands to any';
  if (wall !== null) {
    const before = wall - 1 - text.length;
    const after = wall + 2;
    putFree(canvas, region, y, text, stands(ruler) ? [after, before] : [before, after], 'governs');
  } else if (standsTo > axis.high) {
    putFree(canvas, region, y, `${text} ${glyphs.offRight}`, [axis.last - text.length - 1], 'governs');
  } else putFree(canvas, region, y, `${glyphs.offLeft} ${text}`, [axis.first], 'governs');
}

/** "now 16.0" from the bead on, on the side away from the wall. */
function drawNowLabel(ruler: RulerView, canvas: Canvas, region: Region, bead: number): void {
  const text = `now ${showNow(ruler)}`;
  const ends = bead - text.length + 1;
  const atLeft = region.x + 1;
  const atRight = region.x + region.columns - 1 - text.length;
  const columns = stands(ruler)
    ? [ends, ends - 1, atLeft, bead, bead + 1]
    : [bead, bead + 1, atRight, ends, ends - 1];
  putFree(canvas, region, region.y, text, columns, 'now');
}

/** The tenth below, as spans shown to people are rounded down. */
function roundDown(value: number): number {
  return Math.floor(value * 10 + 1e-6) / 10;
}

/** l/h with one decimal, rounded so that it never contradicts the wall beside it. */
function showNow({ now, standsTo }: RulerView): string {
  const shown = now.toFixed(1);
  if (standsTo === null) return shown;
  const wall = roundDown(standsTo);
  if (now <= standsTo) return Number(shown) > wall ? wall.toFixed(1) : shown;
  return Number(shown) <= wall ? (wall + 0.1).toFixed(1) : shown;
}

/** Figures along the axis, two blanks apart at least. */
function drawTicks(canvas: Canvas, region: Region, y: number, axis: Axis): void {
  for (const value of TICKS) {
    if (!isOn(value, axis)) continue;
    const text = value < 1 ? value.toString().slice(1) : value.toString();
    const column = columnOf(value, axis) - Math.floor((text.length - 1) / 2);
    if (isFree(canvas, region, column - 1, y, text.length + 2)) canvas.put(column, y, text, 'quiet');
  }
}

/** The stock depths by nominal size, those nearest to now first; a cell or two off where two would meet. */
function drawStock(
  ruler: RulerView,
  canvas: Canvas,
  region: Region,
  y: number,
  axis: Axis,
  now: number | null,
): void {
  const from = now ?? axis.first;
  const all = ruler.stock
    .filter(({ spanToDepth }) => isOn(spanToDepth, axis))
    .map(({ label, spanToDepth }) => ({ label: cells(label), column: columnOf(spanToDepth, axis) }))
    .sort((a, b) => Math.abs(a.column - from) - Math.abs(b.column - from));
  for (const { label, column } of all) {
    if (now !== null && Math.abs(column - now) <= 1 && putAtPointer(canvas, region, y, label, now)) continue;
    const middle = column - Math.floor((label.length - 1) / 2);
    putFree(canvas, region, y, label, [middle, middle + 1, middle - 1, middle + 2, middle - 2], 'plain');
  }
}

/** The depth at hand stands against the pointer itself: right of it, or left of it when the wall is right. */
function putAtPointer(canvas: Canvas, region: Region, y: number, label: string, now: number): boolean {
  const width = label.length;
  const right = { ...region, x: now + 1, columns: Math.max(0, region.x + region.columns - now - 1) };
  const left = { ...region, columns: now - region.x };
  if (isFree(canvas, right, now + 1, y, width)) canvas.put(now + 1, y, label, 'now');
  else if (isFree(canvas, left, now - width, y, width)) canvas.put(now - width, y, label, 'now');
  else return false;
  return true;
}
