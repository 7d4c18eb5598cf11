import type { RulerView } from '../view.ts';
import type { Region } from './region.ts';

/** The l/h axis of the ruler: logarithmic from `low` to `high` over the columns `first` to `last`. */
export interface Axis {
  readonly low: number;
  readonly high: number;
  readonly first: number;
  readonly last: number;
}

/** The axis runs from the one to the other unless now lies outside; then it reaches to the next step. */
const LOW = 4;
const HIGH = 40;
const LOWER = [3, 2, 1.5, 1, 0.5, 0.25];
const HIGHER = [50, 60, 80, 100, 150, 200, 400, 1000];
/** Figures along the axis, those of most worth first: later ones stand where there is room. */
export const TICKS: readonly number[] = [
  [1, 4, 10, 20, 40, 100, 200, 400, 1000],
  [0.25, 0.5, 2, 5, 15, 30, 60],
  [8, 12, 6, 25, 50, 80, 150, 1.5, 3],
  [7, 9, 14, 16, 18, 35, 22, 28, 70],
].flat();
/** Cells left of the axis, for what the row is; cells right of it, for the half of the last figure. */
const BEFORE = 8;
const AFTER = 2;

export function fitAxis(ruler: RulerView, region: Region): Axis {
  const lower = ruler.now < LOW ? LOWER.find((step) => step <= ruler.now) : LOW;
  const higher = ruler.now > HIGH ? HIGHER.find((step) => step >= ruler.now) : HIGH;
  return {
    low: lower ?? LOWER[LOWER.length - 1]!,
    high: higher ?? HIGHER[HIGHER.length - 1]!,
    first: region.x + BEFORE,
    last: region.x + region.columns - 1 - AFTER,
  };
}

/** The column of a span-to-depth ratio; beyond the axis for one that is not on it. */
export function columnOf(spanToDepth: number, axis: Axis): number {
  const part = Math.log(spanToDepth / axis.low) / Math.log(axis.high / axis.low);
  return axis.first + Math.round(part * (axis.last - axis.first));
}

export function isOn(spanToDepth: number | null, axis: Axis): spanToDepth is number {
  return spanToDepth !== null && spanToDepth >= axis.low && spanToDepth <= axis.high;
}

/** The same held at the axis's ends. */
export function columnWithin(spanToDepth: number, axis: Axis): number {
  if (!(spanToDepth > axis.low)) return axis.first;
  if (spanToDepth >= axis.high) return axis.last;
  return columnOf(spanToDepth, axis);
}
