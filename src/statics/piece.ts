import { zeros } from './zeros.ts';

/**
 * One piece of a beam between neighbouring places where anything changes, as numbers in a flat array.
 * With t from the start of the piece, at EI = 1, deflection and load positive downward, sagging moment positive:
 *   q = q0 + q1 t                       load, lb/in
 *   V = V0 - q0 t - q1 t²/2             shear, lb
 *   M = M0 + V0 t - q0 t²/2 - q1 t³/6   moment, lb.in
 *   s' = -M, y' = s                     slope lb.in², deflection lb.in³
 * All numbers of a piece are linear in the loads, so combining load cases is adding arrays.
 */
export const STRIDE = 11;
/** At the start of the piece. */
export const Q0 = 0;
export const Q1 = 1;
export const V0 = 2;
export const M0 = 3;
export const S0 = 4;
export const Y0 = 5;
/** At the end of the piece. */
export const V1 = 6;
export const M1 = 7;
export const S1 = 8;
export const Y1 = 9;
export const QE = 10;

/** What is asked of a piece; each is the integral of the one before it. */
export const LOAD = 0;
export const SHEAR = 1;
export const MOMENT = 2;
export const SLOPE = 3;
export const DEFLECTION = 4;
export type Order = 0 | 1 | 2 | 3 | 4;

/** Numbers laid out as above, from index `o` on. */
export type Numbers = readonly number[];

export function pieceValue(c: Numbers, o: number, order: Order, t: number): number {
  const q0 = c[o + Q0]!;
  const q1 = c[o + Q1]!;
  if (order === LOAD) return q0 + q1 * t;
  const v = c[o + V0]!;
  if (order === SHEAR) return v - t * (q0 + (t * q1) / 2);
  const m = c[o + M0]!;
  if (order === MOMENT) return m + t * (v - (t / 2) * (q0 + (t * q1) / 3));
  const s = c[o + S0]!;
  if (order === SLOPE) return s - t * (m + (t / 2) * (v - (t / 3) * (q0 + (t * q1) / 4)));
  return c[o + Y0]! + t * (s - (t / 2) * (m + (t / 3) * (v - (t / 4) * (q0 + (t * q1) / 5))));
}

/** Places found last, one list an order: each level of the recursion below has its own. */
const FOUND = [0, 1, 2, 3, 4].map(() => zeros(8));

/** The places that `signChanges` of this order found last; good until it is called again. */
export function foundPlaces(order: Order): number[] {
  return FOUND[order]!;
}

/**
 * Finds where a quantity changes sign strictly between `lo` and `hi`; returns how many, ascending in `foundPlaces`.
 * Its derivative's sign changes bound the stretches on which it is monotone, so that none is missed.
 */
export function signChanges(c: Numbers, o: number, order: Order, lo: number, hi: number): number {
  const out = FOUND[order]!;
  const q1 = c[o + Q1]!;
  if (order === LOAD) return quadratic(c[o + Q0]!, q1, 0, lo, hi, out);
  if (order === SHEAR) return quadratic(c[o + V0]!, -c[o + Q0]!, -q1 / 2, lo, hi, out);
  if (order === MOMENT && q1 === 0) return quadratic(c[o + M0]!, c[o + V0]!, -c[o + Q0]! / 2, lo, hi, out);
  const below = (order - 1) as Order;
  const turns = signChanges(c, o, below, lo, hi);
  const edges = FOUND[below]!;
  let count = 0;
  let a = lo;
  let fa = pieceValue(c, o, order, a);
  for (let i = 0; i <= turns; i++) {
    const b = i < turns ? edges[i]! : hi;
    const fb = pieceValue(c, o, order, b);
    if ((fa < 0 && fb > 0) || (fa > 0 && fb < 0)) out[count++] = rootBetween(c, o, order, a, fa, b, fb);
    a = b;
    fa = fb;
  }
  return count;
}

/** Sign changes of c0 + c1 t + c2 t² strictly between lo and hi, ascending. */
function quadratic(c0: number, c1: number, c2: number, lo: number, hi: number, out: number[]): number {
  let r1 = Number.NaN;
  let r2 = Number.NaN;
  if (c2 === 0) {
    if (c1 !== 0) r1 = -c0 / c1;
  } else {
    const disc = c1 * c1 - 4 * c2 * c0;
    if (disc > 0) {
      // The form that does not subtract nearly equal numbers.
      const u = c1 >= 0 ? -(c1 + Math.sqrt(disc)) / 2 : (-c1 + Math.sqrt(disc)) / 2;
      r1 = u / c2;
      r2 = c0 / u;
      if (r1 > r2) {
        const swap = r1;
        r1 = r2;
        r2 = swap;
      }
    }
  }
  let count = 0;
  if (r1 > lo && r1 < hi) out[count++] = r1;
  if (r2 > lo && r2 < hi) out[count++] = r2;
  return count;
}

const DERIVATIVE_SIGN = [0, -1, 1, -1, 1] as const;

/** The one root between a and b, where the quantity is monotone and its signs differ: Newton, kept in the bracket. */
function rootBetween(
  c: Numbers,
  o: number,
  order: Order,
  a: number,
  fa: number,
  b: number,
  fb: number,
): number {
  const below = (order - 1) as Order;
  const sign = DERIVATIVE_SIGN[order];
  // Rounding noise of the end values: below this a value is zero for all we can know.
  const floor = 1e-16 * Math.max(Math.abs(fa), Math.abs(fb));
  let lo = a;
  let hi = b;
  let t = (a + b) / 2;
  for (let i = 0; i < 80; i++) {
    const f = pieceValue(c, o, order, t);
    if (Math.abs(f) <= floor) return t;
    if (f < 0 === fa < 0) lo = t;
    else hi = t;
    const slope = sign * pieceValue(c, o, below, t);
    let next = t - f / slope;
    if (!(next > lo && next < hi)) next = (lo + hi) / 2;
    if (Math.abs(next - t) <= 1e-15 * b || next === lo || next === hi) return next;
    t = next;
  }
  return t;
}

/** Place in [lo, hi] at which `sign` times the quantity (shear, moment or deflection) is largest. */
export function largestPlace(
  c: Numbers,
  o: number,
  order: Order,
  sign: number,
  lo: number,
  hi: number,
): number {
  let best = lo;
  let value = sign * pieceValue(c, o, order, lo);
  const turns = signChanges(c, o, (order - 1) as Order, lo, hi);
  const places = FOUND[order - 1]!;
  for (let i = 0; i <= turns; i++) {
    const t = i < turns ? places[i]! : hi;
    const candidate = sign * pieceValue(c, o, order, t);
    if (candidate > value) {
      value = candidate;
      best = t;
    }
  }
  return best;
}
