import { PASS } from './figures.ts';

/**
 * The gauges' scale: logarithmic from a quarter to twice the limit, so that a power is a distance and one
 * nudge moves bending twice, deflection three times as far as shear.
 */
export const LOWEST = 1 / 4;
export const HIGHEST = 2;
const OCTAVES = Math.log2(HIGHEST / LOWEST);

/** What is written along the scale. */
export const SCALE_LABELS: readonly (readonly [number, string])[] = [
  [0.25, '.25'],
  [0.5, '.5'],
  [1, '1'],
  [2, '2'],
];

/** A ratio's place along the scale: 0 at a quarter, 1 at twice the limit, beyond either where it lies beyond. */
export function along(ratio: number): number {
  return Math.log2(ratio / LOWEST) / OCTAVES;
}

/** The cell of ratio 1 on a scale of this many cells. */
export function limitCell(cells: number): number {
  return Math.round((cells - 1) * along(1));
}

/**
 * The cell of a ratio, held at the scale's ends. A failing ratio always stands past the limit's cell and a
 * passing one before it, however near they are.
 */
export function cellOf(ratio: number, cells: number): number {
  const cell = Math.max(0, Math.min(cells - 1, Math.round(along(ratio) * (cells - 1))));
  const limit = limitCell(cells);
  return ratio > PASS ? Math.max(cell, limit + 1) : Math.min(cell, limit - 1);
}
