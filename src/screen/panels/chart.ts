import type { Canvas } from '../draw/canvas.ts';
import { cells } from '../draw/cells.ts';
import type { Glyphs, LineSymbols } from '../draw/glyphs.ts';
import { curveRows, heightAt, resample } from '../draw/plot.ts';
import type { ChartSeries, ChartView, View } from '../view.ts';
import { heading, isFree, type Region, rule } from './region.ts';
import { along, HIGHEST, SCALE_LABELS } from './scale.ts';

/** Cells left of the plot: a blank, the ratio's figures, the axis. */
const BEFORE = 7;
/** Cells right of it, where a curve says its power. */
const AFTER = 2;
/** Rows that are not the plot: heading, axis, labels. */
const AROUND = 3;

/** How figures stand along the axis: 0 at its foot, 1 at its head. */
interface FigureScale {
  along(figure: number): number;
  readonly labels: readonly (readonly [number, string])[];
}

const LOGARITHMIC: FigureScale = { along, labels: SCALE_LABELS };
const EVEN: FigureScale = {
  along: (ratio) => ratio / HIGHEST,
  labels: [
    [0, '0'],
    [0.5, '.5'],
    [1, '1'],
    [1.5, '1.5'],
    [2, '2'],
  ],
};

/** Fewer rows of plot are noise: a layout that has only less shows reach in the rack instead. */
export const LEAST_CHART_ROWS = 9 + AROUND;

/** The scale of an axis of figures, or that of ratios. */
function scaleOf({ axis, linear }: ChartView): FigureScale {
  if (axis === undefined) return linear === true ? EVEN : LOGARITHMIC;
  const { from, to, even, marks } = axis;
  const doublings = Math.log2(to / from);
  return {
    along: (figure) => (even ? (figure - from) / (to - from) : Math.log2(figure / from) / doublings),
    labels: marks,
  };
}

/**
 * The chart's lines against the knob in hand, each in its own style, with a bead on each at now: the ratios of the
 * three powers with their limit and crossovers, or figures on an axis of their own. `ruled` lays the heading into a
 * rule.
 */
export function drawChart(
  view: View,
  canvas: Canvas,
  region: Region,
  glyphs: Glyphs,
  options: { readonly ruled: boolean },
): void {
  if (options.ruled) rule(canvas, region, glyphs);
  const { chart } = view;
  if (chart === null) return;
  const key = keyOf(chart, region.columns - BEFORE - AFTER, glyphs);
  const above = key === null ? 1 : 2;
  const plot: Region = {
    x: region.x + BEFORE,
    y: region.y + above,
    columns: region.columns - BEFORE - AFTER,
    rows: region.rows - AROUND + 1 - above,
  };
  if (plot.rows < 2 || plot.columns < 8) return;
  const title = cells(chart.title);
  if (options.ruled) heading(canvas, region, plot.x, title);
  else if (title.length <= plot.columns) canvas.put(plot.x, region.y, title, 'quiet');

  if (key !== null) canvas.put(plot.x, region.y + 1, key, 'quiet');

  const scale = scaleOf(chart);
  // Figures without an axis of their own are ratios, unless a sentence stands in their place.
  const isOfRatios = chart.axis === undefined && chart.key === undefined;
  if (chart.axis !== undefined || isOfRatios) drawFigureAxis(scale, isOfRatios, canvas, plot, glyphs);
  drawKnobAxis(chart, canvas, plot, region, glyphs);
  const now = plot.x + Math.floor(Math.max(0, Math.min(1, chart.now)) * (plot.columns - 1));
  const beads: number[] = [];
  for (const { power, ratios, now: figure } of chart.series) {
    const heights = ratios.map(scale.along);
    const places = resample(heights, plot.columns, plot.rows);
    const curve = curveRows(places, plot.rows, symbolsOf(power, glyphs));
    for (const { column, row, text } of curve) overlay(canvas, plot.x + column, plot.y + row, text);
    const at = figure === undefined ? heightAt(heights, chart.now) : scale.along(figure);
    const height = at * (plot.rows - 1);
    if (height > -0.5 && height < plot.rows - 0.5) beads.push(plot.y + plot.rows - 1 - Math.round(height));
    if (chart.axis === undefined && typeof power === 'number')
      labelEnds(places, canvas, plot, glyphs.superscripts[power - 1]!);
  }
  for (const [at, figure] of chart.crossovers ?? []) drawCrossover(at, figure, scale, canvas, plot, glyphs);
  for (const y of beads) canvas.put(now, y, glyphs.now, 'nowStrong');
  canvas.put(now, plot.y + plot.rows, glyphs.pointer, 'nowStrong');
}

/** The longest of the key's texts that fits whole; null where none is told, or none fits. */
function keyOf({ key }: ChartView, columns: number, glyphs: Glyphs): string | null {
  const drawn = (text: string) => cells(text).replace(/[─═┄•]/g, (line) => LINE_OF[line]!(glyphs));
  return key?.map(drawn).find((text) => text.length <= columns) ?? null;
}

/** The lines that a key speaks of, as they are drawn. */
const LINE_OF: Readonly<Record<string, (glyphs: Glyphs) => string>> = {
  '─': ({ powers }) => powers[0],
  '═': ({ powers }) => powers[1],
  '┄': ({ chart }) => chart.limit,
  '•': ({ extreme }) => extreme,
};

/** The line of a power, of checks outside the powers, of a limit. */
function symbolsOf(power: ChartSeries['power'], glyphs: Glyphs): LineSymbols {
  if (power === 'other') return alike(glyphs.extreme);
  return power === 'limit' ? alike(glyphs.chart.limit) : glyphs.chart.lines[power - 1]!;
}

function alike(glyph: string): LineSymbols {
  return Array<string>(LINE_SYMBOLS).fill(glyph) as unknown as LineSymbols;
}

const LINE_SYMBOLS = 10;

/** From the place where another power comes to govern down to the knob's axis, behind whatever stands there. */
function drawCrossover(
  at: number,
  figure: number,
  scale: FigureScale,
  canvas: Canvas,
  plot: Region,
  glyphs: Glyphs,
): void {
  const top = rowOf(figure, scale, plot);
  if (!(at >= 0 && at <= 1) || top < plot.y) return;
  const x = plot.x + Math.round(at * (plot.columns - 1));
  for (let y = top + 1; y < plot.y + plot.rows; y += 1) {
    if (canvas.glyphs[y * canvas.columns + x] === ' ') canvas.put(x, y, glyphs.crossover, 'quiet');
  }
}

function rowOf(figure: number, scale: FigureScale, plot: Region): number {
  return plot.y + plot.rows - 1 - Math.round(scale.along(figure) * (plot.rows - 1));
}

/** The figures at the left and, of ratios, the line at the limit. */
function drawFigureAxis(
  scale: FigureScale,
  limited: boolean,
  canvas: Canvas,
  plot: Region,
  glyphs: Glyphs,
): void {
  const axis = plot.x - 1;
  for (let y = plot.y; y < plot.y + plot.rows; y += 1) canvas.put(axis, y, glyphs.chart.upright, 'quiet');
  for (const [ratio, label] of scale.labels)
    canvas.putRight(axis - 1, rowOf(ratio, scale, plot), label, 'quiet');
  if (limited) canvas.put(plot.x, rowOf(1, scale, plot), glyphs.chart.limit.repeat(plot.columns), 'quiet');
}

/** The knob's axis below the plot, with a tick and a label at each quarter as far as there is room. */
function drawKnobAxis(chart: ChartView, canvas: Canvas, plot: Region, region: Region, glyphs: Glyphs): void {
  const y = plot.y + plot.rows;
  canvas.put(plot.x - 1, y, glyphs.chart.tick + glyphs.chart.level.repeat(plot.columns), 'quiet');
  const labels = chart.labels;
  const inner = { ...region, x: region.x + 1, columns: region.columns - 1 };
  // The ends are placed first, then the middle, then the rest.
  const last = labels.length - 1;
  const order = [0, last, last / 2, ...labels.keys()].filter((index) => Number.isInteger(index));
  for (const index of new Set(order)) {
    const label = labels[index];
    if (label === undefined) continue;
    const column = index === 0 ? plot.x - 1 : plot.x + Math.round((index / last) * (plot.columns - 1));
    canvas.put(column, y, glyphs.chart.tick, 'quiet');
    const text = cells(label);
    const middle = column - Math.floor(text.length / 2);
    const at = Math.min(middle, region.x + region.columns - text.length);
    if (isFree(canvas, inner, at, y + 1, text.length)) canvas.put(at, y + 1, text, 'quiet');
  }
}

/** Draws a curve's row over what stands there; its blanks cover nothing. */
function overlay(canvas: Canvas, x: number, y: number, text: string): void {
  for (let index = 0; index < text.length; index += 1) {
    if (text[index] !== ' ') canvas.put(x + index, y, text[index]!);
  }
}

/** The power at the right of where its curve leaves the plot, where no other curve stands. */
function labelEnds(places: readonly number[], canvas: Canvas, plot: Region, power: string): void {
  const seen = (place: number): boolean => place > -0.5 && place < plot.rows - 0.5;
  let last = places.length - 1;
  while (last >= 0 && !seen(places[last]!)) last -= 1;
  if (last < 1) return;
  const y = plot.y + plot.rows - 1 - Math.round(places[last]!);
  const x = plot.x + last;
  const there = canvas.glyphs[y * canvas.columns + x];
  if (there === ' ' || x >= plot.x + plot.columns) canvas.put(x, y, power, 'strong');
}
