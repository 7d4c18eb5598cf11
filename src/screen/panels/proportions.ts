import type { Band } from '../../explore/usual-proportions.ts';
import { DOTS_ACROSS, DOTS_DOWN, Dots } from '../../sheet/drawing/dots.ts';
import { dotGlyph } from '../draw/braille.ts';
import type { Canvas } from '../draw/canvas.ts';
import { cells, keepToGlyphs, shorten } from '../draw/cells.ts';
import type { Glyphs } from '../draw/glyphs.ts';
import type { ProportionView } from '../proportion-view.ts';
import { ALL_KEYS, type View } from '../view.ts';
import { type Axis, columnOf, columnWithin, fitAxis, isOn, TICKS } from './axis.ts';
import { showRatio } from './figures.ts';
import { drawKeys } from './foot.ts';
import { heading, isFree, type Region, rule, write } from './region.ts';
import { drawTitle } from './title.ts';

/** The ratios shown, logarithmic: five doublings. */
const LOWEST = 1 / 8;
const HIGHEST = 4;
const OCTAVES = Math.log2(HIGHEST / LOWEST);
const LABELS: readonly (readonly [number, string])[] = [
  [0.25, '.25'],
  [0.5, '.5'],
  [1, '1'],
  [2, '2'],
  [4, '4'],
];
const ABOVE = 2;
/** Axis, its figures, stock depths; the bands; their sources; foot. */
const AXIS_ROWS = 3;
const NOTES = 2;
/** Taller or wider it would say no more. */
const MOST_ROWS = 34;
const MOST_COLUMNS = 132;
/** Dots between two of the limit line. */
const DASH = 3;

/** Shear, bending and deflection as straight lines over l/h, both axes logarithmic, with all that stands along it. */
export function drawProportions(
  screen: Pick<View, 'title'>,
  view: ProportionView,
  canvas: Canvas,
  glyphs: Glyphs,
): void {
  canvas.glyphs.fill(' ');
  canvas.styles.fill(0);
  drawTitle(screen, canvas, { x: 0, y: 0, columns: canvas.columns, rows: 1 }, glyphs);
  const line = { x: 0, y: 1, columns: canvas.columns, rows: 1 };
  rule(canvas, line, glyphs);
  heading(canvas, line, 2, 'proportions: ratio over l/h, both logarithmic', 'strong');

  const columns = Math.min(canvas.columns, MOST_COLUMNS);
  const rows = Math.min(MOST_ROWS, canvas.rows - ABOVE - AXIS_ROWS - view.bands.length - NOTES);
  const axis = fitAxis(view.ruler, { x: 1, y: 0, columns: columns - 2, rows: 1 });
  const plot = { x: axis.first, y: ABOVE, columns: axis.last - axis.first + 1, rows };
  drawLines(view, canvas, plot, axis, glyphs);
  drawMarks(view, canvas, plot, axis, glyphs);
  drawAxis(view, canvas, plot, axis, glyphs);
  const below = plot.y + rows + AXIS_ROWS;
  for (const [at, band] of view.bands.entries()) drawBand(band, canvas, below + at, axis, glyphs);
  write(canvas, 1, below + view.bands.length, cells(view.sources), canvas.columns - 2, 'quiet');
  const foot = [{ keys: 'Esc', does: 'back' }, { keys: 'w', does: 'workings' }, ALL_KEYS];
  drawKeys(foot, canvas, 1, canvas.columns - 1, canvas.rows - 1, glyphs);
  keepToGlyphs(canvas, glyphs);
}

/** Rows of dots from the top of the plot, not rounded. */
function heightOf(ratio: number, rows: number): number {
  const last = rows * DOTS_DOWN - 1;
  return last * (1 - Math.log2(ratio / LOWEST) / OCTAVES);
}

/** l/h at a column of dots. */
function atDot(x: number, axis: Axis, across: number): number {
  return axis.low * (axis.high / axis.low) ** (x / (across - 1));
}

function drawLines(view: ProportionView, canvas: Canvas, plot: Region, axis: Axis, glyphs: Glyphs): void {
  const { columns, rows } = plot;
  const across = columns * DOTS_ACROSS;
  const ratiosAt = (x: number) =>
    view.laws.map(({ power, ratio }) =>
      ratio === null ? Number.NaN : ratio * (atDot(x, axis, across) / view.ruler.now) ** power,
    );
  const envelope = new Dots(columns, rows);
  const quiet = new Dots(columns, rows);
  const heights = view.laws.map(() => new Array<number>(across).fill(Number.NaN));
  const highest = new Array<number>(across).fill(Number.NaN);
  for (let x = 0; x < across; x += 1) {
    const ratios = ratiosAt(x);
    const worst = Math.max(...ratios.filter((ratio) => !Number.isNaN(ratio)));
    for (const [law, ratio] of ratios.entries()) {
      if (!(ratio >= LOWEST && ratio <= HIGHEST)) continue;
      const y = Math.round(heightOf(ratio, rows));
      heights[law]![x] = y;
      if (ratio === worst) highest[x] = y;
    }
    if (x % DASH === 0) quiet.put(x, Math.round(heightOf(1, rows)));
  }
  for (const each of heights) quiet.through(each);
  envelope.through(highest);
  for (let row = 0; row < rows; row += 1) {
    for (let column = 0; column < columns; column += 1) {
      const [strong, faint] = [envelope.cell(column, row), quiet.cell(column, row)];
      if ((strong | faint) === 0) continue;
      const bits = glyphs.kind === 'ascii' && strong !== 0 ? strong : strong | faint;
      canvas.put(plot.x + column, plot.y + row, dotGlyph(bits, glyphs), strong !== 0 ? 'strong' : 'quiet');
    }
  }
  labelLines(view, heights, canvas, plot, glyphs);
}

/** Places along a line where its name may stand, from its right end. */
const NAME_AT = [0.93, 0.85, 0.75, 0.65, 0.55, 0.45, 0.35, 0.25, 0.15, 0.05];

/** The name of each law beside its line, where no other stands: the whole, else its power. */
function labelLines(
  view: ProportionView,
  heights: readonly (readonly number[])[],
  canvas: Canvas,
  plot: Region,
  glyphs: Glyphs,
): void {
  for (const [law, each] of heights.entries()) {
    const power = glyphs.superscripts[view.laws[law]!.power - 1]!;
    const first = each.findIndex((height) => !Number.isNaN(height));
    const last = each.findLastIndex((height) => !Number.isNaN(height));
    if (first < 0) continue;
    const spots = [view.laws[law]!.label + power, power].flatMap((text) =>
      NAME_AT.flatMap((share) => {
        const dot = Math.round(first + (last - first) * share);
        const x = plot.x + Math.floor(dot / DOTS_ACROSS);
        const y = plot.y + Math.floor(each[dot]! / DOTS_DOWN);
        // Lines rise to the right: above to the left and below to the right there is room.
        return [
          { text, x: x - text.length - 1, y: y - 1 },
          { text, x: x + 2, y: y + 1 },
        ];
      }),
    );
    const spot = spots.find(
      ({ text, x, y }) => y >= plot.y && y < plot.y + plot.rows && isFree(canvas, plot, x, y, text.length),
    );
    if (spot !== undefined) canvas.put(spot.x, spot.y, spot.text, 'strong');
  }
}

/** Crossovers, where the member stands to, pins and now. */
function drawMarks(view: ProportionView, canvas: Canvas, plot: Region, axis: Axis, glyphs: Glyphs): void {
  const { ruler } = view;
  const upright = (spanToDepth: number | null, glyph: string, style: 'quiet' | 'now' | 'governs'): void => {
    if (!isOn(spanToDepth, axis)) return;
    const x = columnOf(spanToDepth, axis);
    for (let y = plot.y; y < plot.y + plot.rows; y += 1) {
      if (canvas.glyphs[y * canvas.columns + x] === ' ') canvas.put(x, y, glyph, style);
    }
  };
  upright(ruler.shearToBending, glyphs.crossover, 'quiet');
  upright(ruler.bendingToDeflection, glyphs.crossover, 'quiet');
  upright(ruler.standsTo, glyphs.limit, 'governs');
  const rowOf = (ratio: number) =>
    plot.y +
    Math.floor(Math.round(heightOf(Math.max(LOWEST, Math.min(HIGHEST, ratio)), plot.rows)) / DOTS_DOWN);
  for (const pin of view.pins) {
    if (isOn(pin.spanToDepth, axis))
      canvas.put(columnOf(pin.spanToDepth, axis), rowOf(pin.worst), pin.label, 'nowStrong');
  }
  if (isOn(ruler.now, axis))
    canvas.put(columnOf(ruler.now, axis), rowOf(view.worst), glyphs.now, 'nowStrong');
}

function drawAxis(view: ProportionView, canvas: Canvas, plot: Region, axis: Axis, glyphs: Glyphs): void {
  const { ruler } = view;
  for (let y = plot.y; y < plot.y + plot.rows; y += 1)
    canvas.put(plot.x - 1, y, glyphs.chart.upright, 'quiet');
  for (const [ratio, label] of LABELS) {
    canvas.putRight(
      plot.x - 2,
      plot.y + Math.floor(Math.round(heightOf(ratio, plot.rows)) / DOTS_DOWN),
      label,
      'quiet',
    );
  }
  const y = plot.y + plot.rows;
  const end = axis.last + 2;
  canvas.put(plot.x - 1, y, glyphs.chart.tick + glyphs.chart.level.repeat(plot.columns), 'quiet');
  for (const crossover of [ruler.shearToBending, ruler.bendingToDeflection]) {
    if (isOn(crossover, axis)) canvas.put(columnOf(crossover, axis), y, glyphs.crossover, 'strong');
  }
  canvas.put(1, y + 1, 'l/h', 'quiet');
  const row: Region = { x: axis.first - 1, y: y + 1, columns: end - axis.first + 1, rows: 1 };
  const centred = (
    spanToDepth: number,
    text: string,
    at: number,
    style: 'quiet' | 'nowStrong' | 'plain' | 'governsStrong',
  ) => {
    const x = columnOf(spanToDepth, axis) - Math.floor(text.length / 2);
    if (isFree(canvas, { ...row, y: at }, x, at, text.length)) canvas.put(x, at, text, style);
  };
  if (isOn(ruler.now, axis)) centred(ruler.now, `now ${ruler.now.toFixed(1)}`, y + 1, 'nowStrong');
  if (isOn(ruler.standsTo, axis))
    centred(ruler.standsTo, `to ${ruler.standsTo.toFixed(1)}`, y + 1, 'governsStrong');
  for (const crossover of [ruler.shearToBending, ruler.bendingToDeflection]) {
    if (isOn(crossover, axis)) centred(crossover, crossover.toFixed(1), y + 1, 'plain');
  }
  for (const tick of TICKS) {
    if (isOn(tick, axis)) centred(tick, String(tick), y + 1, 'quiet');
  }
  canvas.put(1, y + 2, 'stock', 'quiet');
  if (isOn(ruler.now, axis)) canvas.put(columnOf(ruler.now, axis), y + 2, glyphs.pointer, 'nowStrong');
  for (const { label, spanToDepth } of ruler.stock) {
    if (isOn(spanToDepth, axis)) centred(spanToDepth, label, y + 2, 'plain');
  }
  const worst = `worst ${showRatio(view.worst, glyphs)}${view.pins.length > 0 ? ', pins by number' : ''}`;
  heading(canvas, { x: 0, y: 1, columns: canvas.columns, rows: 1 }, canvas.columns - worst.length - 3, worst);
}

/** A row with the stretch of l/h that is usual, its ends in figures where there is room. */
function drawBand(band: Band, canvas: Canvas, y: number, axis: Axis, glyphs: Glyphs): void {
  const from = columnWithin(Math.max(band.from, axis.low), axis);
  const to = columnWithin(Math.min(band.to, axis.high), axis);
  canvas.put(
    axis.first - 1 - band.label.length < 1 ? 0 : 1,
    y,
    shorten(cells(band.label), axis.first - 1, glyphs),
    'quiet',
  );
  if (band.to <= axis.low || band.from >= axis.high) return;
  canvas.put(from, y, glyphs.band.repeat(to - from + 1), 'quiet');
  const text = band.from === 0 ? `to ${band.to}` : `${band.from} to ${band.to}`;
  write(canvas, to + 2, y, text, axis.last - to - 1, 'quiet');
}
