import { pieceAt } from '../statics/grid.ts';
import { foundPlaces, largestPlace, MOMENT, pieceValue, STRIDE, signChanges } from '../statics/piece.ts';
import { zeros } from '../statics/zeros.ts';
import { type Envelope, pieceUnder } from './envelope.ts';
import type { Pattern } from './patterns.ts';

/** Moments this near to zero against the extreme of their field are zero. */
export const ZERO = 1e-9;

/** A combination under a pattern, with the numbers of its pieces kept as they are asked for. */
export class MomentCase {
  readonly e: Envelope;
  readonly combination: number;
  readonly pattern: Pattern;
  readonly #pieces: number[][] = [];

  constructor(e: Envelope, combination: number, pattern: Pattern) {
    this.e = e;
    this.combination = combination;
    this.pattern = pattern;
  }

  /** Puts the numbers of a piece into NUMBERS, own weight of `w` lb/in among them. */
  load(p: number, w: number): void {
    let numbers = this.#pieces[p];
    if (numbers === undefined) {
      numbers = zeros(6);
      pieceUnder(this.e, this.combination, this.pattern, p, numbers);
      this.#pieces[p] = numbers;
    }
    const { own } = this.e.parts;
    const scale = own === null ? 0 : w * this.e.deadScale[this.combination]!;
    if (scale === 0) for (let i = 0; i < 6; i++) NUMBERS[i] = numbers[i]!;
    else for (let i = 0; i < 6; i++) NUMBERS[i] = numbers[i]! + scale * own!.data[STRIDE * p + i]!;
  }

  /** What 1 lb/in of own weight adds to the moment at a place within a field, lb.in. */
  ownMoment(field: number, x: number): number {
    const { grid, own } = this.e.parts;
    if (own === null) return 0;
    const p = Math.min(Math.max(pieceAt(grid, x), grid.first[field]!), grid.first[field + 1]! - 1);
    const moment = pieceValue(own.data, STRIDE * p, MOMENT, x - grid.edges[p]!);
    return this.e.deadScale[this.combination]! * moment;
  }
}

/** A stretch of moment of one sign between two points of zero moment. */
export interface Stretch {
  /** Its largest moment within the field asked for, lb.in, positive. */
  readonly moment: number;
  /** Place of that, in from the member's left end. */
  readonly at: number;
  readonly from: number;
  readonly to: number;
}

const NUMBERS = zeros(6);

/**
 * The stretches of a field on which `sign` times the moment is positive, at own weight `w`, lb/in (NDS 5.3.6: the
 * length between points of zero moment). They go on over supports, and end at a fixed support and at the member's ends.
 */
export function stretchesOf(one: MomentCase, field: number, sign: number, w: number): Stretch[] {
  const { grid } = one.e.parts;
  const first = grid.first[field]!;
  const end = grid.first[field + 1]!;
  let largest = 0;
  for (let p = first; p < end; p++) {
    one.load(p, w);
    const h = grid.edges[p + 1]! - grid.edges[p]!;
    largest = Math.max(largest, sign * valueAt(largestPlace(NUMBERS, 0, MOMENT, sign, 0, h)));
  }
  const floor = ZERO * largest;
  const found: Stretch[] = [];
  let moment = 0;
  let at = 0;
  let from = Number.NaN;
  const close = (to: number) => {
    if (moment > floor) found.push({ moment, at, from, to });
    moment = 0;
    from = Number.NaN;
  };
  for (let p = first; p < end; p++) {
    const start = grid.edges[p]!;
    const h = grid.edges[p + 1]! - start;
    one.load(p, w);
    const cuts = [...zerosIn(h, floor), h];
    if (p === first && sign * valueAt(0) > floor) {
      from = goesOn(one, sign, w, p, -1, floor);
      one.load(p, w);
    }
    let lo = 0;
    for (const hi of cuts) {
      const t = largestPlace(NUMBERS, 0, MOMENT, sign, lo, hi);
      const value = sign * valueAt(t);
      // On an unloaded stretch there is nothing but rounding.
      if (value > floor) {
        if (Number.isNaN(from)) from = start + lo;
        if (value > moment) {
          moment = value;
          at = start + t;
        }
      }
      if (hi < h || sign * valueAt(h) <= floor) close(start + hi);
      lo = hi;
    }
  }
  if (!Number.isNaN(from)) close(goesOn(one, sign, w, end - 1, 1, floor));
  return found;
}

/** Where a stretch ends that goes on over the left (-1) or right (1) end of a piece. */
function goesOn(
  one: MomentCase,
  sign: number,
  w: number,
  piece: number,
  side: -1 | 1,
  floor: number,
): number {
  const { grid } = one.e.parts;
  let p = piece;
  for (;;) {
    const edge = grid.edges[side > 0 ? p + 1 : p]!;
    p += side;
    if (p < 0 || p >= grid.count || isStop(one.e, edge)) return edge;
    one.load(p, w);
    const h = grid.edges[p + 1]! - grid.edges[p]!;
    const zero = zerosIn(h, floor).at(side > 0 ? 0 : -1);
    if (zero !== undefined) return grid.edges[p]! + zero;
    // A zero that is met exactly at the far edge is no sign change.
    if (sign * valueAt(side > 0 ? h : 0) <= floor) return grid.edges[side > 0 ? p + 1 : p]!;
  }
}

/**
 * Where the moment in NUMBERS changes sign within a piece. Where it only comes up to zero, as at a free end, rounding
 * may take it over by less than `floor`: that is no change.
 */
function zerosIn(h: number, floor: number): number[] {
  const count = signChanges(NUMBERS, 0, MOMENT, 0, h);
  if (count === 0) return [];
  const places = foundPlaces(MOMENT).slice(0, count);
  const isReal = (lo: number, hi: number) =>
    [1, -1].some((sign) => sign * valueAt(largestPlace(NUMBERS, 0, MOMENT, sign, lo, hi)) > floor);
  return places.filter((x, i) => isReal(places[i - 1] ?? 0, x) && isReal(x, places[i + 1] ?? h));
}

/** Whether a support held against rotation stands here. */
export function isStop({ parts }: Envelope, x: number): boolean {
  const { fixed } = parts.loading.beam;
  if (!fixed.left && !fixed.right) return false;
  const { supports } = parts.solution;
  const near = (at: number) => Math.abs(at - x) <= parts.grid.tolerance;
  return (fixed.left && near(supports[0]!)) || (fixed.right && near(supports[supports.length - 1]!));
}

function valueAt(t: number): number {
  return pieceValue(NUMBERS, 0, MOMENT, t);
}
