import type { Canvas } from '../draw/canvas.ts';
import { cells, shorten } from '../draw/cells.ts';
import type { Glyphs } from '../draw/glyphs.ts';
import type { View } from '../view.ts';
import { showExponent } from './figures.ts';
import { type Region, write, writeRight } from './region.ts';

const LABEL = 12;
const COLUMN = 9;
const KNOBS = ['span', 'depth', 'width', 'load'];
/** Cells the table takes without the column of reasons. */
export const EXPONENT_COLUMNS = 1 + LABEL + KNOBS.length * COLUMN + 1;

/** Local exponents: by how many per cent each ratio moves for one per cent of each quantity, and what bends the law. */
export function drawExponents(view: View, canvas: Canvas, region: Region, glyphs: Glyphs): void {
  if (view.exponents.length === 0) return;
  const left = region.x + 1;
  const why = left + LABEL + KNOBS.length * COLUMN + 4;
  const end = region.x + region.columns - 2;
  canvas.put(left, region.y, 'nudge of 1 %', 'quiet');
  for (const [index, knob] of KNOBS.entries()) {
    writeRight(canvas, left, left + LABEL + (index + 1) * COLUMN - 1, region.y, knob, 'quiet');
  }
  write(canvas, why, region.y, 'why not whole', end - why + 1, 'quiet');

  let y = region.y + 1;
  for (const row of view.exponents) {
    if (y >= region.y + region.rows) return;
    const label = shorten(cells(row.label), LABEL - 2, glyphs) + glyphs.superscripts[row.power - 1];
    canvas.put(left, y, label);
    for (const [index, exponent] of row.local.entries()) {
      writeRight(
        canvas,
        left + LABEL,
        left + LABEL + (index + 1) * COLUMN - 1,
        y,
        showExponent(exponent, glyphs),
      );
    }
    write(canvas, why, y, cells(row.why), end - why + 1, 'quiet');
    y += 1;
  }
}
