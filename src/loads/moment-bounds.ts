import { M0, M1, MOMENT, pieceValue, Q0, Q1, QE, STRIDE } from '../statics/piece.ts';
import type { States } from '../statics/states.ts';
import type { Envelope } from './envelope.ts';
import { isStop } from './zero-moment.ts';

/** A field is looked at in at least this many intervals: the more, the nearer the bounds. */
const INTERVALS = 8;

/** A member cut into short intervals on which bounds of moments are told from the values at their ends. */
export interface Intervals {
  readonly count: number;
  /** Left end of each, in, and its length. */
  readonly start: readonly number[];
  readonly length: readonly number[];
  readonly piece: readonly number[];
  /** Index of the first interval of each field, then their number. */
  readonly first: readonly number[];
  /** Whether a support held against rotation stands at the left end; one entry more for the member's right end. */
  readonly stop: readonly boolean[];
}

/** Moments and loads, times a sign, at the ends of all intervals: WIDTH numbers each, at `LEFT` and so on. */
export type Ends = number[];
export const WIDTH = 4;
/** Moment at the left and right end, lb.in; load there, lb/in. */
const LEFT = 0;
const RIGHT = 1;
const LOAD_LEFT = 2;
const LOAD_RIGHT = 3;

export function intervalsOf(e: Envelope): Intervals {
  const { grid } = e.parts;
  const start: number[] = [];
  const length: number[] = [];
  const piece: number[] = [];
  const first: number[] = [];
  grid.fields.forEach((field, f) => {
    first.push(start.length);
    for (let p = grid.first[f]!; p < grid.first[f + 1]!; p++) {
      const h = grid.edges[p + 1]! - grid.edges[p]!;
      const parts = Math.max(1, Math.ceil((INTERVALS * h) / field.length));
      for (let k = 0; k < parts; k++) {
        start.push(grid.edges[p]! + (k * h) / parts);
        length.push(h / parts);
        piece.push(p);
      }
    }
  });
  first.push(start.length);
  const stop = [...start, grid.edges[grid.count]!].map((x) => isStop(e, x));
  return { count: start.length, start, length, piece, first, stop };
}

/** What some states come to at the ends of all intervals. */
export function endsOf(e: Envelope, intervals: Intervals, { data }: States): Ends {
  const { edges } = e.parts.grid;
  const ends: Ends = [];
  for (let i = 0; i < intervals.count; i++) {
    const p = intervals.piece[i]!;
    const o = STRIDE * p;
    const t = intervals.start[i]! - edges[p]!;
    const next = t + intervals.length[i]!;
    const isLast = intervals.piece[i + 1] !== p;
    const loadAt = (x: number) => data[o + Q0]! + data[o + Q1]! * x;
    ends.push(
      t === 0 ? data[o + M0]! : pieceValue(data, o, MOMENT, t),
      isLast ? data[o + M1]! : pieceValue(data, o, MOMENT, next),
      loadAt(t),
      isLast ? data[o + QE]! : loadAt(next),
    );
  }
  return ends;
}

/** A stretch that a moment above zero may take up at most, and the most that it comes to in a field. */
export interface Reach {
  /** in */
  readonly length: number;
  /** The most at the lighter and at the heavier own weight, lb.in. */
  readonly light: number;
  readonly heavy: number;
}

/**
 * All stretches within a field on which moments of at most `top` plus own weight can be above `floor` at an own weight
 * between `light` and `heavy`. Between the ends of an interval a moment lies at most by the parabola of its larger
 * end load above the chord.
 */
export function reachesOf(
  intervals: Intervals,
  field: number,
  top: Ends,
  own: Ends | null,
  weights: { readonly light: number; readonly heavy: number },
  floor: number,
): Reach[] {
  const { count, first, stop, start, length } = intervals;
  const { light, heavy } = weights;
  const value = (i: number, which: number, w: number) => {
    const at = WIDTH * i + which;
    return own === null || w === 0 ? top[at]! : top[at]! + w * own[at]!;
  };
  const bulge = (i: number, w: number) =>
    (Math.max(0, value(i, LOAD_LEFT, w), value(i, LOAD_RIGHT, w)) * length[i]! ** 2) / 8;
  const most = (i: number, w: number) => peak(value(i, LEFT, w), value(i, RIGHT, w), bulge(i, w));
  const isAbove = (i: number) => most(i, light) > floor || (heavy !== light && most(i, heavy) > floor);
  const larger = (i: number, which: number) =>
    heavy === light ? value(i, which, light) : Math.max(value(i, which, light), value(i, which, heavy));
  /** Part of an interval, from an end that is at zero or below, before the moment can be above zero. */
  const before = (i: number, near: number, far: number) => {
    if (larger(i, near) > floor) return 0;
    const one = rise(value(i, near, light), value(i, far, light), bulge(i, light));
    return heavy === light
      ? one
      : Math.min(one, rise(value(i, near, heavy), value(i, far, heavy), bulge(i, heavy)));
  };

  const found: Reach[] = [];
  const from = first[field]!;
  const to = first[field + 1]!;
  for (let i = from; i < to; i++) {
    if (!isAbove(i)) continue;
    let left = i;
    if (i === from) {
      while (left > 0 && !stop[left]! && larger(left, LEFT) > floor && isAbove(left - 1)) left -= 1;
    }
    let mostLight = most(i, light);
    let mostHeavy = most(i, heavy);
    while (i + 1 < count && !stop[i + 1]! && larger(i, RIGHT) > floor && isAbove(i + 1)) {
      i += 1;
      if (i >= to) continue;
      mostLight = Math.max(mostLight, most(i, light));
      mostHeavy = Math.max(mostHeavy, most(i, heavy));
    }
    const begin = start[left]! + length[left]! * before(left, LEFT, RIGHT);
    const end = start[i]! + length[i]! * (1 - before(i, RIGHT, LEFT));
    found.push({ length: Math.max(0, end - begin), light: mostLight, heavy: mostHeavy });
  }
  return found;
}

/** The largest of a chord from `a` to `b` with a parabola above it, `bulge` high at its middle. */
function peak(a: number, b: number, bulge: number): number {
  const slope = b - a;
  if (Math.abs(slope) >= 4 * bulge) return Math.max(a, b);
  return (a + b) / 2 + bulge + (slope * slope) / (16 * bulge);
}

/** Where, from 0 to 1, such a curve first comes above zero; 1 where it never does. */
function rise(a: number, b: number, bulge: number): number {
  if (a > 0) return 0;
  if (bulge === 0) return b > 0 ? -a / (b - a) : 1;
  // a + (b - a) t + 4 bulge t (1 - t) = 0
  const linear = b - a + 4 * bulge;
  const disc = linear * linear + 16 * bulge * a;
  if (disc <= 0 || linear <= 0) return 1;
  return Math.min(1, (-2 * a) / (linear + Math.sqrt(disc)));
}
