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
import type { States } from '../statics/states.ts';
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
  const dead = e.dead ? read(e.dead) : 0;
  for (const c of combinations) {
    for (const sign of signs) {
      const base = sign * (read(sign > 0 ? e.hi[c]! : e.lo[c]!) + e.deadScale[c]! * dead);
      const perWeight = sign * own * e.deadScale[c]!;
      if (base <= 0 && base + heaviest * perWeight <= 0) continue;
      if (bar.covers(base, base + heaviest * perWeight)) continue;
      const pattern = worstPattern(e, c, sign, read);
      const { at, place, piece } = where;
      const term: Found = {
        base,
        perWeight,
        valueAt: null,
        placeAt: null,
        combination: c,
        pattern,
        at,
        place,
        piece,
      };
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
  const dead = e.dead?.data ?? null;
  raiseByEnds(e, order, signs, combinations, from, to, bar, found);
  const { edges } = e.parts.grid;
  for (const c of combinations) {
    const deadBy = dead ? e.deadScale[c]! : 0;
    const ownBy = own ? heaviest * e.deadScale[c]! : 0;
    for (const sign of signs) {
      const data = (sign > 0 ? e.hi[c]! : e.lo[c]!).data;
      for (let p = from; p < to; p++) {
        const o = STRIDE * p;
        const h = edges[p + 1]! - edges[p]!;
        const bulge0 = bulge(data, o, order, sign, h, dead, deadBy, null, 0);
        const bulgeH = ownBy === 0 ? bulge0 : bulge(data, o, order, sign, h, dead, deadBy, own, ownBy);
        // The ends themselves have set the bar already, but only at no own weight and at the heaviest.
        if (ownBy === 0 && bulge0 === 0) continue;
        let a = data[o + start]!;
        let b = data[o + end]!;
        if (deadBy !== 0) {
          a += deadBy * dead![o + start]!;
          b += deadBy * dead![o + end]!;
        }
        const bound0 = (sign > 0 ? Math.max(a, b) : -Math.min(a, b)) + bulge0;
        let boundH = bound0;
        if (ownBy !== 0) {
          a += ownBy * own![o + start]!;
          b += ownBy * own![o + end]!;
          boundH = (sign > 0 ? Math.max(a, b) : -Math.min(a, b)) + bulgeH;
        }
        if (bound0 <= 0 && boundH <= 0) continue;
        if (!bar.covers(Math.max(0, bound0), Math.max(0, boundH)))
          refine(e, order, sign, c, p, bar, found, 0, h);
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

/** How far a quantity can rise above its end values within a piece; numbers are data + deadBy dead + ownBy own. */
function bulge(
  data: readonly number[],
  o: number,
  order: Order,
  sign: number,
  h: number,
  dead: readonly number[] | null,
  deadBy: number,
  own: readonly number[] | null,
  ownBy: number,
): number {
  if (order === SHEAR) {
    const curve = sign * blend(data, o + Q1, dead, deadBy, own, ownBy);
    return curve > 0 ? (curve * h * h) / 8 : 0;
  }
  const q0 = sign * blend(data, o + Q0, dead, deadBy, own, ownBy);
  const q1 = sign * blend(data, o + QE, dead, deadBy, own, ownBy);
  const load = Math.max(0, q0, q1);
  if (order === MOMENT) return (load * h * h) / 8;
  const m0 = sign * blend(data, o + M0, dead, deadBy, own, ownBy);
  const m1 = sign * blend(data, o + M1, dead, deadBy, own, ownBy);
  const moment = Math.max(m0, m1) + (load * h * h) / 8;
  return moment > 0 ? (moment * h * h) / 8 : 0;
}

function blend(
  data: readonly number[],
  i: number,
  dead: readonly number[] | null,
  deadBy: number,
  own: readonly number[] | null,
  ownBy: number,
): number {
  let value = data[i]!;
  if (deadBy !== 0) value += deadBy * dead![i]!;
  if (ownBy !== 0) value += ownBy * own![i]!;
  return value;
}

/** Sets the bar by the best end of a piece at no own weight and at the heaviest, and notes both as terms. */
function raiseByEnds(
  e: Envelope,
  order: Order,
  signs: readonly number[],
  combinations: readonly number[],
  from: number,
  to: number,
  bar: Bar,
  found: Found[],
): void {
  const start = AT_START[order]!;
  const end = AT_END[order]!;
  const own = e.parts.own?.data ?? null;
  const dead = e.dead?.data ?? null;
  const h = bar.heaviest;
  // The end of one piece and the start of the next differ in shear, and in moment where a held support has an overhang.
  const { fixed } = e.parts.loading.beam;
  const jumps = order === SHEAR || fixed.left || fixed.right;
  let best0 = -1;
  let bestH = -1;
  let c0 = 0;
  let cH = 0;
  let sign0 = 1;
  let signH = 1;
  for (const c of combinations) {
    const deadBy = dead ? e.deadScale[c]! : 0;
    const ownBy = own ? e.deadScale[c]! : 0;
    for (const sign of signs) {
      const data = (sign > 0 ? e.hi[c]! : e.lo[c]!).data;
      for (let p = from; p < to; p++) {
        const sides = jumps || p === to - 1 ? 2 : 1;
        for (let side = 0; side < sides; side++) {
          const i = STRIDE * p + (side === 0 ? start : end);
          const base = sign * (deadBy === 0 ? data[i]! : data[i]! + deadBy * dead![i]!);
          const slope = ownBy === 0 ? 0 : sign * ownBy * own![i]!;
          if (base <= 0 && base + h * slope <= 0) continue;
          const raised = bar.raise(base, slope);
          if (raised === 0) continue;
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
    base:
      sign * ((sign > 0 ? e.hi[c]! : e.lo[c]!).data[i]! + (e.dead ? e.deadScale[c]! * e.dead.data[i]! : 0)),
    perWeight: e.parts.own ? sign * e.deadScale[c]! * e.parts.own.data[i]! : 0,
    valueAt: null,
    placeAt: null,
    combination: c,
    pattern: worstPattern(e, c, sign, (states) => states.data[i]!),
    at: e.parts.grid.edges[atStart ? piece : piece + 1]!,
    place: fieldOfPiece(e.parts.grid, piece),
    piece,
  };
}
