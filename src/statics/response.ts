import { type Grid, pieceAt } from './grid.ts';
import { DEFLECTION, largestPlace, MOMENT, type Order, pieceValue, SHEAR, SLOPE, STRIDE } from './piece.ts';
import type { States } from './states.ts';

/** A value and its place, in from the member's left end. */
export interface Extreme {
  readonly value: number;
  readonly at: number;
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
export function responseOf(grid: Grid, states: States): Response {
  const { data } = states;
  const read = (order: Order) => (x: number) => {
    const p = pieceAt(grid, x);
    return pieceValue(data, STRIDE * p, order, x - grid.edges[p]!);
  };
  return {
    grid,
    states,
    reactions: Array.from(states.reactions),
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
