import type { Canvas, Style } from '../draw/canvas.ts';
import type { Glyphs } from '../draw/glyphs.ts';
import type { View } from '../view.ts';
import { type Axis, columnWithin } from './axis.ts';

const NAMES = ['shear', 'bending', 'deflection'] as const;

/**
 * The row of the ruler that shows which power governs where, each in its own line, with the crossovers
 * between. Labels keep clear of
 * the columns in `marks`; the zone that `now` stands in is not dimmed.
 */
export function drawZones(
  view: View,
  canvas: Canvas,
  y: number,
  axis: Axis,
  now: number | null,
  marks: readonly (number | null)[],
  glyphs: Glyphs,
): void {
  const bounds = boundsOf(view, axis);
  if (bounds === null) {
    canvas.put(axis.first, y, glyphs.unknown.repeat(axis.last - axis.first + 1), 'quiet');
    return;
  }
  for (const power of [0, 1, 2] as const) {
    const from = bounds[power];
    const to = bounds[power + 1]!;
    if (to <= from) continue;
    const style: Style = now !== null && now >= from && now < to ? 'plain' : 'quiet';
    canvas.put(from, y, glyphs.powers[power].repeat(to - from), style);
    for (const name of [NAMES[power], '']) {
      const label = ` ${name}${glyphs.superscripts[power]} `;
      const at = labelColumn(from, to, label.length, marks);
      if (at === null) continue;
      canvas.put(at, y, label, style);
      break;
    }
    if (from > axis.first) canvas.put(from, y, glyphs.crossover, 'strong');
  }
}

/** Where shear, bending and deflection begin, and where the axis ends; null when nothing governs anywhere. */
function boundsOf(view: View, axis: Axis): readonly [number, number, number, number] | null {
  const { shearToBending, bendingToDeflection } = view.ruler;
  const end = axis.last + 1;
  const within = (crossover: number): number =>
    crossover >= axis.high ? end : columnWithin(crossover, axis);
  if (shearToBending !== null || bendingToDeflection !== null) {
    const bending = shearToBending === null ? axis.first : within(shearToBending);
    const deflection = bendingToDeflection === null ? end : within(bendingToDeflection);
    return [axis.first, bending, Math.max(bending, deflection), end];
  }
  const only =
    view.gauges.find((gauge) => gauge.governs) ?? view.gauges.find((gauge) => gauge.ratio !== null);
  if (only === undefined) return null;
  return [axis.first, only.power === 1 ? end : axis.first, only.power === 3 ? axis.first : end, end];
}

/** Cells of a zone's own line between its label and a mark, and at its ends, so that its power is seen. */
const CLEAR = 2;
const ENDS = 1;

/**
 * Where a zone's label stands: in its middle, or else at a quarter or three quarters, so that it keeps its
 * place while a mark moves past; failing that, as near the middle as the marks let it. Null without room.
 */
function labelColumn(
  from: number,
  to: number,
  length: number,
  marks: readonly (number | null)[],
): number | null {
  const isClear = (at: number): boolean =>
    at >= from + ENDS &&
    at + length <= to - ENDS &&
    !marks.some((mark) => mark !== null && mark >= at - CLEAR && mark < at + length + CLEAR);
  const at = (part: number): number => Math.round(from + (to - from) * part - length / 2);
  const preferred = [at(1 / 2), at(1 / 4), at(3 / 4)].find(isClear);
  if (preferred !== undefined) return preferred;
  for (let shift = 1; shift < to - from; shift += 1) {
    if (isClear(at(1 / 2) - shift)) return at(1 / 2) - shift;
    if (isClear(at(1 / 2) + shift)) return at(1 / 2) + shift;
  }
  return null;
}
