import type { Canvas } from '../draw/canvas.ts';
import { cells, shorten } from '../draw/cells.ts';
import type { Glyphs } from '../draw/glyphs.ts';
import type { View } from '../view.ts';
import { PASS, showRatio } from './figures.ts';
import { drawBar, gaugeLine } from './gauges.ts';
import { type Region, write } from './region.ts';

/** Cells of a check's name before its bar. */
const LABEL = 11;
const GAP = 3;

/**
 * The remaining checks, worst first, so that nothing fails unseen: on one row in words with the load; on
 * more rows the worst of them as gauges of their own, and the rest in words below.
 */
export function drawOthers(view: View, canvas: Canvas, region: Region, glyphs: Glyphs): void {
  const line = gaugeLine(region);
  const bars = Math.min(region.rows - 1, view.others.length);
  for (let index = 0; index < bars; index += 1) {
    const other = view.others[index]!;
    const label = shorten(cells(other.label), LABEL, glyphs);
    const bar = { ratio: other.ratio, ghost: null, governs: other.governs };
    drawBar(bar, label, canvas, region, region.y + index, line, glyphs);
  }
  const left = bars > 0 ? line.bar : region.x + 1;
  drawWords(view, bars, canvas, left, region.x + region.columns - 2, region.y + bars, glyphs);
}

/** "bearing 0.25   slenderness 0.22   216 plf": the worst and the load first of all, then as many as fit. */
function drawWords(
  view: View,
  from: number,
  canvas: Canvas,
  left: number,
  end: number,
  y: number,
  glyphs: Glyphs,
): void {
  const load = cells(view.load);
  const kept = load === '' ? 0 : load.length + GAP;
  let x = left;
  for (let index = from; index < view.others.length; index += 1) {
    const other = view.others[index]!;
    const text = `${cells(other.label)} ${showRatio(other.ratio, glyphs)}`;
    const failing = other.ratio > PASS;
    const style = failing ? 'governsStrong' : other.governs ? 'governs' : 'plain';
    const room = end - x + 1 - (index === 0 || failing ? 0 : kept);
    if (!write(canvas, x, y, text, room, style)) break;
    x += text.length + GAP;
  }
  write(canvas, x, y, load, end - x + 1, 'quiet');
}
