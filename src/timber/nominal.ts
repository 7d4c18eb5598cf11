/**
 * Half a millimetre: a dressed size given in whole millimetres (38 x 286 mm) is the same piece of lumber as the
 * one in inches (1 1/2 x 11 1/4 in).
 */
export const SIZE_TOLERANCE = 0.5 / 25.4;

/** Dressed sizes of lumber, in, by nominal size (PS 20; NDS Supplement Table 1B). */
export const DRESSED: readonly (readonly [nominal: number, dressed: number])[] = [
  [2, 1.5],
  [3, 2.5],
  [4, 3.5],
  [5, 4.5],
  [6, 5.5],
  [8, 7.25],
  [10, 9.25],
  [12, 11.25],
  [14, 13.25],
  [16, 15.25],
];

/** Lumber deeper than 16 in nominal is dressed 3/4 in off. */
const DEEP_DRESSING = 0.75;

/** Timbers, 5 in and thicker, are dressed 1/2 in off in both ways (NDS Supplement Table 1B). */
export const TIMBER_DRESSING = 0.5;

/** Nominal size of a dressed one, in; a size off the stock takes the next larger nominal. */
export function nominalUp(size: number): number {
  // Plain indexing: this stands in the innermost loop of rating sizes.
  for (let at = 0; at < DRESSED.length; at += 1) {
    const pair = DRESSED[at]!;
    if (size <= pair[1] + SIZE_TOLERANCE) return pair[0];
  }
  return Math.ceil(size + DEEP_DRESSING - SIZE_TOLERANCE);
}

/** Nominal size of a dressed one, in; a size off the stock takes the next smaller nominal, at least 1. */
export function nominalDown(size: number): number {
  let found = 1;
  for (let at = 0; at < DRESSED.length; at += 1) {
    const pair = DRESSED[at]!;
    if (size >= pair[1] - SIZE_TOLERANCE) found = pair[0];
  }
  return found;
}

/** The nominal size that is dressed to just this, in; null for a size off the stock. */
export function nominalOf(size: number): number | null {
  for (const [nominal, dressed] of DRESSED) {
    if (Math.abs(size - dressed) <= SIZE_TOLERANCE) return nominal;
  }
  return null;
}

/** The nominal size of a timber's side, in whole inches from 5; null for a size off the stock. */
export function timberNominalOf(size: number): number | null {
  const nominal = Math.round(size + TIMBER_DRESSING);
  const near = Math.abs(size + TIMBER_DRESSING - nominal) <= SIZE_TOLERANCE;
  return near && (nominal === 5 || (nominal > 5 && nominal % 2 === 0)) ? nominal : null;
}
