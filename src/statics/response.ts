import { fieldOfPiece, type Grid, pieceAt } from './grid.ts';
import {
  DEFLECTION,
  largestPlace,
  M0,
  M1,
  MOMENT,
  type Order,
  pieceValue,
  Q0,
  Q1,
  S0,
  SHEAR,
  SLOPE,
  STRIDE,
  V0,
  Y0,
} from './piece.ts';
import type { BeamLayout, States } from './states.ts';

/** A value and its place, in from the member's left end. */
export interface Extreme {
  readonly value: number;
  readonly at: number;
}

/** Coefficients of 1, t, t² ... with t from `from`, in; at EI = 1. */
export interface Segment {
  readonly from: number;
  readonly to: number;
  /** Index of the field it lies in. */
  readonly field: number;
  readonly shear: readonly number[];
  readonly moment: readonly number[];
  readonly slope: readonly number[];
  readonly deflection: readonly number[];
}

export type Quantity = 'shear' | 'moment' | 'deflection';

/**
 * What a beam does under loads, at EI = 1: shear lb, moment lb.in (sagging positive), slope lb.in², deflection
 * lb.in³ (positive downward, from the level of the supports; divide by EI).
 */
export interface Response {
  readonly grid: Grid;
  readonly states: States;
  /** Upward force of each support, lb. */
  readonly reactions: readonly number[];
  /** Moment in the beam over each support, in the span beside it (the one to the right, but for the last). */
  supportMoments(): number[];
  /** What each fixed end adds to the beam's moment on passing it from left to right, lb.in; 0 where it is not held. */
  fixedMoments(): { readonly left: number; readonly right: number };
  /** Piecewise polynomials, left to right. */
  segments(): Segment[];
  /** At a jump the value to the right of it, at the member's right end the value before it. */
  shearAt(x: number): number;
  momentAt(x: number): number;
  slopeAt(x: number): number;
  deflectionAt(x: number): number;
  /** Largest and smallest value at their true places, on the whole member or in one field. */
  extremes(quantity: Quantity, field?: number): { readonly max: Extreme; readonly min: Extreme };
}

const ORDER_OF: Readonly<Record<Quantity, Order>> = { shear: SHEAR, moment: MOMENT, deflection: DEFLECTION };

/** A response that reads its values from the states of a grid's pieces. */
export function responseOf(layout: BeamLayout, grid: Grid, states: States): Response {
  const { data } = states;
  const read = (order: Order) => (x: number) => {
    const p = pieceAt(grid, x);
    return pieceValue(data, STRIDE * p, order, x - grid.edges[p]!);
  };
  return {
    grid,
    states,
    reactions: Array.from(states.reactions),
    supportMoments() {
      const left = layout.beam.supports === 'bearings' && grid.fields[0]!.kind === 'overhang' ? 1 : 0;
      return layout.supports.map((_, i) => {
        if (i > 0 && i === layout.supports.length - 1) {
          return data[STRIDE * (grid.first[left + i]! - 1) + M1]!;
        }
        return data[STRIDE * grid.first[left + i]! + M0]!;
      });
    },
    fixedMoments() {
      const { beam, fields } = layout;
      const cantilever = beam.supports === 'cantilever';
      const leading = !cantilever && fields[0]!.kind === 'overhang' ? 1 : 0;
      const atStart = (f: number) => (f < fields.length ? data[STRIDE * grid.first[f]! + M0]! : 0);
      const atEnd = (f: number) => (f < 0 ? 0 : data[STRIDE * (grid.first[f + 1]! - 1) + M1]!);
      const last = leading + beam.spans.length - 1;
      return {
        left: cantilever || beam.fixed.left ? atStart(leading) - atEnd(leading - 1) : 0,
        right: beam.fixed.right ? atStart(last + 1) - atEnd(last) : 0,
      };
    },
    segments() {
      return Array.from({ length: grid.count }, (_, p) => segmentOf(grid, data, p));
    },
    shearAt: read(SHEAR),
    momentAt: read(MOMENT),
    slopeAt: read(SLOPE),
    deflectionAt: read(DEFLECTION),
    extremes(quantity, field) {
      const order = ORDER_OF[quantity];
      const from = field === undefined ? 0 : grid.first[field]!;
      const to = field === undefined ? grid.count : grid.first[field + 1]!;
      return {
        max: extremeIn(grid, data, order, 1, from, to),
        min: extremeIn(grid, data, order, -1, from, to),
      };
    },
  };
}

function extremeIn(
  grid: Grid,
  data: number[],
  order: Order,
  sign: number,
  from: number,
  to: number,
): Extreme {
  let value = Number.NEGATIVE_INFINITY;
  let at = 0;
  for (let p = from; p < to; p++) {
    const o = STRIDE * p;
    const t = largestPlace(data, o, order, sign, 0, grid.edges[p + 1]! - grid.edges[p]!);
    const candidate = sign * pieceValue(data, o, order, t);
    if (candidate > value) {
      value = candidate;
      at = grid.edges[p]! + t;
    }
  }
  return { value: sign * value, at };
}

function segmentOf(grid: Grid, data: number[], p: number): Segment {
  const o = STRIDE * p;
  const q0 = data[o + Q0]!;
  const q1 = data[o + Q1]!;
  const v = data[o + V0]!;
  const m = data[o + M0]!;
  const s = data[o + S0]!;
  return {
    from: grid.edges[p]!,
    to: grid.edges[p + 1]!,
    field: fieldOfPiece(grid, p),
    shear: [v, -q0, -q1 / 2],
    moment: [m, v, -q0 / 2, -q1 / 6],
    slope: [s, -m, -v / 2, q0 / 6, q1 / 24],
    deflection: [data[o + Y0]!, s, -m / 2, -v / 6, q0 / 24, q1 / 120],
  };
}
