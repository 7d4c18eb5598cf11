/** What a column would like to have, and the least at which its words stay whole. */
export interface Wish {
  readonly wanted: number;
  readonly least: number;
}

const STEPS = 50;

/**
 * Widths of columns that come to no more than `room`: those that want much give way, down to a level that is the same
 * for all, but not below their words; where even the words are too much, the widest of those give way in the same manner.
 */
export function columnWidths(wishes: readonly Wish[], room: number): number[] {
  const at = (level: number) => wishes.map(({ wanted, least }) => Math.max(least, Math.min(wanted, level)));
  const words = (level: number) => wishes.map(({ least }) => Math.min(least, level));
  return sum(at(0)) > room ? atLevel(words, room) : atLevel(at, room);
}

/** The widths at the highest level that they fit at; whole where they fit at any. */
function atLevel(widths: (level: number) => number[], room: number): number[] {
  const whole = widths(Number.POSITIVE_INFINITY);
  if (sum(whole) <= room) return whole;
  let low = 0;
  let high = Math.max(...whole);
  for (let step = 0; step < STEPS; step += 1) {
    const middle = (low + high) / 2;
    if (sum(widths(middle)) <= room) low = middle;
    else high = middle;
  }
  return widths(low);
}

function sum(values: readonly number[]): number {
  return values.reduce((total, value) => total + value, 0);
}
