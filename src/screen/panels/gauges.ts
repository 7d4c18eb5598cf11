import type { Canvas, Style } from '../draw/canvas.ts';
import { cells as safe, shorten } from '../draw/cells.ts';
import type { Glyphs } from '../draw/glyphs.ts';
import type { GaugeView, View } from '../view.ts';
import { PASS, showChange, showRatio } from './figures.ts';
import { heading, type Region, rule, write, writeRight } from './region.ts';
import { cellOf, HIGHEST, LOWEST, limitCell, SCALE_LABELS } from './scale.ts';

/** Cells of a gauge's label: "deflection³" and a blank. */
const LABEL = 12;
/** Cells right of the bar: the ratio and its change. */
const FIGURES = 15;
/** A longer bar would be stretched thin. */
const LONGEST = 110;

/** Where the bar of a gauge stands in its region, and where the figures behind it end. */
export interface GaugeLine {
  readonly bar: number;
  readonly cells: number;
  readonly ratioEnd: number;
  readonly changeEnd: number;
}

/** The columns of a gauge in this region; the others' gauges share them. */
export function gaugeLine(region: Region): GaugeLine {
  const bar = region.x + 1 + LABEL;
  const cells = Math.min(LONGEST, region.columns - 1 - LABEL - FIGURES);
  return { bar, cells, ratioEnd: bar + cells + 6, changeEnd: bar + cells + 13 };
}

/** The three powers under a heading with the scale: one row each, or two with demand, capacity and reach in l/h. */
export function drawGauges(view: View, canvas: Canvas, region: Region, glyphs: Glyphs): void {
  const line = gaugeLine(region);
  rule(canvas, region, glyphs);
  // At the screen's edge the heading stands in from it, as that of the knobs does.
  heading(canvas, region, region.x === 0 ? 4 : region.x + 1, 'powers');
  for (const [ratio, label] of SCALE_LABELS) {
    const cell = Math.round((Math.log2(ratio / LOWEST) / Math.log2(HIGHEST / LOWEST)) * (line.cells - 1));
    const x = ratio === HIGHEST ? line.bar + cell - label.length + 1 : line.bar + cell;
    heading(canvas, region, x, label);
  }
  heading(canvas, region, line.ratioEnd - 4, 'ratio');
  heading(canvas, region, line.changeEnd - 4, 'nudge');

  const step = region.rows - 1 >= view.gauges.length * 2 ? 2 : 1;
  let y = region.y + 1;
  for (const gauge of view.gauges) {
    if (y >= region.y + region.rows) return;
    drawGauge(gauge, canvas, region, y, line, glyphs);
    if (step === 2) drawDemand(gauge, canvas, line, y + 1);
    y += step;
  }
}

function drawGauge(
  gauge: GaugeView,
  canvas: Canvas,
  region: Region,
  y: number,
  line: GaugeLine,
  glyphs: Glyphs,
): void {
  const label = shorten(safe(gauge.label), LABEL - 2, glyphs) + glyphs.superscripts[gauge.power - 1];
  drawBar(gauge, label, canvas, region, y, line, glyphs);
  writeRight(canvas, line.ratioEnd + 2, line.changeEnd, y, showChange(gauge.nudge, glyphs));
}

/** "fb 1151 of 900 psi, D+L" below the bar, and at its end the l/h to which this check alone would stand. */
function drawDemand(gauge: GaugeView, canvas: Canvas, line: GaugeLine, y: number): void {
  const room = line.changeEnd - line.bar + 1;
  const demand = [gauge.demand, gauge.brief ?? ''].map(safe).find((text) => text.length <= room) ?? '';
  if (!write(canvas, line.bar, y, demand, room, 'quiet')) return;
  writeRight(canvas, line.bar + demand.length + 3, line.changeEnd, y, safe(gauge.alone), 'quiet');
}

/** What a bar shows, of a power or of any other check. */
export interface BarView {
  readonly ratio: number | null;
  readonly ghost: number | null;
  readonly began?: number | null;
  readonly band?: readonly [number, number] | null;
  readonly governs: boolean;
}

/** One row: label, bar and ratio. Filled up to the bead at now; beyond the limit filled otherwise. */
export function drawBar(
  view: BarView,
  label: string,
  canvas: Canvas,
  region: Region,
  y: number,
  line: GaugeLine,
  glyphs: Glyphs,
): void {
  const { ratio, ghost, governs, began = null, band = null } = view;
  const known = ratio !== null && !Number.isNaN(ratio);
  const fails = known && ratio > PASS;
  const named: Style = governs ? (fails ? 'governsStrong' : 'governs') : 'plain';
  canvas.put(region.x + 1, y, label, known ? named : 'quiet');
  writeRight(canvas, line.bar + line.cells + 1, line.ratioEnd, y, showRatio(ratio, glyphs), named);

  const { bar, cells } = line;
  if (cells < 4) return;
  const limit = limitCell(cells);
  const now = known ? cellOf(ratio, cells) : -1;
  if (now > 0) canvas.put(bar, y, glyphs.fill.repeat(Math.min(now, limit)));
  if (now > limit) canvas.put(bar + limit + 1, y, glyphs.beyond.repeat(now - limit - 1), 'governs');
  canvas.put(bar + now + 1, y, glyphs.empty.repeat(cells - now - 1), 'quiet');
  if (known && band !== null) drawBand(band, canvas, bar, cells, y);
  canvas.put(
    bar + limit,
    y,
    now > limit ? glyphs.limitCrossed : glyphs.limit,
    fails ? 'governsStrong' : 'strong',
  );
  if (began !== null && !Number.isNaN(began))
    canvas.put(bar + cellOf(began, cells), y, glyphs.began, 'strong');
  if (ghost !== null && !Number.isNaN(ghost)) {
    canvas.put(bar + cellOf(ghost, cells), y, glyphs.ghost, 'plain');
  }
  if (known) canvas.put(bar + now, y, bead(ratio, glyphs), 'nowStrong');
}

/** The ends of a band that lie on the scale. */
function drawBand(
  band: readonly [number, number],
  canvas: Canvas,
  bar: number,
  cells: number,
  y: number,
): void {
  for (const [end, ratio] of band.entries()) {
    if (ratio >= LOWEST && ratio <= HIGHEST)
      canvas.put(bar + cellOf(ratio, cells), y, BAND_ENDS[end]!, 'now');
  }
}

const BAND_ENDS = ['[', ']'] as const;

/** The bead, or the mark that the ratio lies off the scale. */
function bead(ratio: number, glyphs: Glyphs): string {
  if (ratio > HIGHEST) return glyphs.offRight;
  return ratio < LOWEST ? glyphs.offLeft : glyphs.now;
}
