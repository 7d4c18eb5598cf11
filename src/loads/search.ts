import { fieldOfPiece } from '../statics/grid.ts';
import {
  DEFLECTION,
  M0,
  M1,
  MOMENT,
  type Order,
  Q0,
  Q1,
  QE,
  SHEAR,
  STRIDE,
  V0,
  V1,
  Y0,
  Y1,
} from '../statics/piece.ts';
import type { States } from '../statics/solve.ts';
import { Bar, type Found, kept } from './bar.ts';
import { type Envelope, worstPattern } from './envelope.ts';
import { refine } from './refine.ts';

/** Where a quantity stands among the numbers of a piece: at its start, at its end. */
const AT_START: Partial<Record<Order, number>> = { [SHEAR]: V0, [MOMENT]: M0, [DEFLECTION]: Y0 };
const AT_END: Partial<Record<Order, number>> = { [SHEAR]: V1, [MOMENT]: M1, [DEFLECTION]: Y1 };

/** Terms for the largest of `sign` times one single number of the states, whichever of the signs. */
export function searchNumber(
  e: Envelope,
  combinations: readonly number[],
  signs: readonly number[],
  read: (states: States) => number,
  where: { readonly at: number; readonly place: number; readonly piece: number },
  heaviest: number,
): Found[] {
  const bar = new Bar(e, SHEAR, heaviest);
  const found: Found[] = [];
  const own = e.parts.own ? read(e.parts.own) : 0;
  for (const c of combinations) {
    for (const sign of signs) {
      const base = sign * read(sign > 0 ? e.hi[c]! : e.lo[c]!);
      const perWeight = sign * own * e.deadScale[c]!;
      if (base <= 0 && base + heaviest * perWeight <= 0) continue;
      if (bar.covers(base, base + heaviest * perWeight)) continue;
      const pattern = worstPattern(e, c, sign, read);
      const { at, place, piece } = where;
      const term: Found = { base, perWeight, valueAt: null, combination: c, pattern, at, place, piece };
      bar.owned(bar.raise(base, perWeight), term);
      found.push(term);
    }
  }
  return kept(found, bar);
}

/**
 * Terms for the largest of `sign` times shear, moment or deflection over the pieces [from, to), whichever of the
 * signs, over the given combinations and all their patterns. First the values at the ends of all pieces set the bar;
 * then only pieces whose upper bound exceeds it are worked out exactly. The bound: a function on [0, h] is at most
 * its larger end value plus its largest downward curvature times h²/8.
 */
export function searchPieces(
  e: Envelope,
  order: Order,
  signs: readonly number[],
  combinations: readonly number[],
  from: number,
  to: number,
  heaviest: number,
): Found[] {
  const bar = new Bar(e, order, heaviest);
  const found: Found[] = [];
  const start = AT_START[order]!;
  const end = AT_END[order]!;
  const own = e.parts.own?.data ?? null;
  raiseByEnds(e, start, end, signs, combinations, from, to, bar, found);
  const { edges } = e.parts.grid;
  for (const c of combinations) {
    const scale = own ? e.deadScale[c]! : 0;
    for (const sign of signs) {
      const data = (sign > 0 ? e.hi[c]! : e.lo[c]!).data;
      for (let p = from; p < to; p++) {
        const o = STRIDE * p;
        const h = edges[p + 1]! - edges[p]!;
        const a = sign * data[o + start]!;
        const b = sign * data[o + end]!;
        let bound0 = Math.max(a, b) + bulge(data, o, order, sign, h, null, 0);
        let boundH = bound0;
        if (scale !== 0 && heaviest !== 0) {
          const by = heaviest * scale;
          const aH = a + sign * by * own![o + start]!;
          const bH = b + sign * by * own![o + end]!;
          boundH = Math.max(aH, bH) + bulge(data, o, order, sign, h, own, by);
        }
        if (bound0 <= 0) bound0 = 0;
        if (boundH <= 0) boundH = 0;
        if (!bar.covers(bound0, boundH)) refine(e, order, sign, c, p, bar, found, 0, h);
      }
    }
  }
  return kept(found, bar);
}

/** As `searchPieces` between two places, in from the member's left end, without the search by bounds. */
export function searchStretch(
  e: Envelope,
  order: Order,
  signs: readonly number[],
  combinations: readonly number[],
  lo: number,
  hi: number,
  heaviest: number,
): Found[] {
  const bar = new Bar(e, order, heaviest);
  const found: Found[] = [];
  const { edges, count } = e.parts.grid;
  for (let p = 0; p < count; p++) {
    const from = Math.max(0, lo - edges[p]!);
    const to = Math.min(edges[p + 1]!, hi) - edges[p]!;
    if (from >= to) continue;
    for (const c of combinations) {
      for (const sign of signs) refine(e, order, sign, c, p, bar, found, from, to);
    }
  }
  return kept(found, bar);
}

/** How far a quantity can rise above its end values within a piece. */
function bulge(
  data: Float64Array,
  o: number,
  order: Order,
  sign: number,
  h: number,
  own: Float64Array | null,
  by: number,
): number {
  let curve: number;
  if (order === SHEAR) curve = sign * (data[o + Q1]! + (own ? by * own[o + Q1]! : 0));
  else if (order === MOMENT) curve = loadPeak(data, o, sign, own, by);
  else {
    const a = sign * (data[o + M0]! + (own ? by * own[o + M0]! : 0));
    const b = sign * (data[o + M1]! + (own ? by * own[o + M1]! : 0));
    curve = Math.max(a, b) + (Math.max(0, loadPeak(data, o, sign, own, by)) * h * h) / 8;
  }
  return curve > 0 ? (curve * h * h) / 8 : 0;
}

function loadPeak(data: Float64Array, o: number, sign: number, own: Float64Array | null, by: number): number {
  const a = sign * (data[o + Q0]! + (own ? by * own[o + Q0]! : 0));
  const b = sign * (data[o + QE]! + (own ? by * own[o + QE]! : 0));
  return Math.max(a, b);
}

/** Sets the bar by the best end of a piece at no own weight and at the heaviest, and notes both as terms. */
function raiseByEnds(
  e: Envelope,
  start: number,
  end: number,
  signs: readonly number[],
  combinations: readonly number[],
  from: number,
  to: number,
  bar: Bar,
  found: Found[],
): void {
  const own = e.parts.own?.data ?? null;
  const h = bar.heaviest;
  let best0 = -1;
  let bestH = -1;
  let c0 = 0;
  let cH = 0;
  let sign0 = 1;
  let signH = 1;
  for (const c of combinations) {
    const scale = own ? e.deadScale[c]! : 0;
    for (const sign of signs) {
      const data = (sign > 0 ? e.hi[c]! : e.lo[c]!).data;
      for (let p = from; p < to; p++) {
        for (let side = 0; side < 2; side++) {
          const i = STRIDE * p + (side === 0 ? start : end);
          const base = sign * data[i]!;
          const slope = scale === 0 ? 0 : sign * scale * own![i]!;
          if (base <= 0 && base + h * slope <= 0) continue;
          const raised = bar.raise(base, slope);
          if (raised & 1) {
            best0 = i;
            c0 = c;
            sign0 = sign;
          }
          if (raised & 2) {
            bestH = i;
            cH = c;
            signH = sign;
          }
        }
      }
    }
  }
  const same = bestH === best0 && cH === c0 && signH === sign0;
  if (best0 >= 0) {
    const term = endTerm(e, best0, start, c0, sign0);
    bar.owned(same ? 3 : 1, term);
    found.push(term);
  }
  if (bestH >= 0 && !same) {
    const term = endTerm(e, bestH, start, cH, signH);
    bar.owned(2, term);
    found.push(term);
  }
}

function endTerm(e: Envelope, i: number, start: number, c: number, sign: number): Found {
  const piece = Math.floor(i / STRIDE);
  const atStart = i - STRIDE * piece === start;
  return {
    base: sign * (sign > 0 ? e.hi[c]! : e.lo[c]!).data[i]!,
    perWeight: e.parts.own ? sign * e.deadScale[c]! * e.parts.own.data[i]! : 0,
    valueAt: null,
    combination: c,
    pattern: worstPattern(e, c, sign, (states) => states.data[i]!),
    at: e.parts.grid.edges[atStart ? piece : piece + 1]!,
    place: fieldOfPiece(e.parts.grid, piece),
    piece,
  };
}
