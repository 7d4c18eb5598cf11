import {
  DEFLECTION,
  M0,
  M1,
  MOMENT,
  type Order,
  pieceValue,
  Q0,
  QE,
  S0,
  S1,
  SHEAR,
  STRIDE,
  V0,
  V1,
} from '../statics/piece.ts';
import { type Quantity, responseOf } from '../statics/response.ts';
import type { States } from '../statics/states.ts';
import type { Combination } from './combinations.ts';
import { LOAD_KINDS, type LoadKind } from './kinds.ts';
import type { Loading } from './loading.ts';
import { add, type KindStates, type LoadParts, scaled, solveParts } from './parts.ts';
import { PARTIAL_SNOW } from './patterns.ts';
import { slopeStretch } from './slope.ts';

/** What one kind of load brings to a demand. */
export interface Share {
  readonly kind: LoadKind | 'own weight';
  /** The factor it enters with. */
  readonly factor: number;
  /** Of the load without its factor, the pattern applied; lb, lb.in or lb.in³, positive where it adds to the demand. */
  readonly value: number;
}

export interface MakeUp {
  /** Place of the demand at this own weight, in from the member's left end. */
  readonly at: number;
  readonly shares: readonly Share[];
}

/** The demand to take apart. */
export interface Demanded {
  readonly quantity: Quantity | 'reaction';
  /** A magnitude, as the checks have it: lb, lb.in or lb.in³. */
  readonly value: number;
  /** Index of the field, or of the support (reaction). */
  readonly place: number;
  /** Where it is without own weight, in. */
  readonly at: number;
  readonly combination: Combination;
  /** Multiplies dead load, own weight included: 1 for strength. */
  readonly deadFactor: number;
}

const ORDER: Readonly<Record<Quantity, Order>> = { shear: SHEAR, moment: MOMENT, deflection: DEFLECTION };
/** The shares must add up to the demand this closely, or they are not given. */
const SAME = 1e-9;
/** The place moves with the pattern and the pattern with the place: they settle at once or after a step. */
const STEPS = 4;

/** What a demand is made of by load kind at own weight `w`, lb/in; null where it cannot be told apart. */
export function makeUp(loading: Loading, w: number, demand: Demanded): MakeUp | null {
  const parts = solveParts(loading);
  for (const sign of [1, -1]) {
    let { at } = demand;
    for (let step = 0; step < STEPS; step += 1) {
      for (const read of readersAt(parts, demand, at)) {
        const shares = sharesOf(parts, w, demand, sign, read);
        const sum = sumOf(shares);
        if (Math.abs(sum - demand.value) <= SAME * Math.abs(demand.value)) return { at, shares };
      }
      const next = placeUnder(parts, w, demand, sign, at);
      if (next === null || next === at) break;
      at = next;
    }
  }
  return null;
}

/** A value of a curve to take apart. */
export interface DemandedAt extends Pick<Demanded, 'combination' | 'deadFactor'> {
  readonly quantity: Quantity;
  /** in from the member's left end */
  readonly at: number;
  /** 1: the largest value there, -1: the smallest. */
  readonly sign: 1 | -1;
}

/** A value of a curve, and what each kind of load brings to it: signed as the curve is. */
export interface MadeUpAt {
  readonly value: number;
  readonly shares: readonly Share[];
}

/**
 * The largest or smallest value of a curve at one place under one combination and the pattern that is worst there, and
 * what it is made of. At a jump of shear the side that tells more. What is but rounding is left out: what is nothing at
 * a support or a free end comes out as nothing.
 */
export function makeUpAt(loading: Loading, w: number, demand: DemandedAt): MadeUpAt {
  const parts = solveParts(loading);
  const { sign } = demand;
  let made: MadeUpAt = { value: 0, shares: [] };
  let most = Number.NEGATIVE_INFINITY;
  for (let place = 0; place < parts.grid.first.length - 1; place += 1) {
    const rounding = ROUNDING * sumOf(sharesOf(parts, w, demand, 1, sizeIn(parts, demand.quantity, place)));
    for (const read of readersAt(parts, { ...demand, place }, demand.at)) {
      const shares = sharesOf(parts, w, demand, sign, read).filter(({ value }) => Math.abs(value) > rounding);
      const sum = sumOf(shares);
      const told = Math.abs(sum) > rounding ? sum : 0;
      if (told <= most) continue;
      most = told;
      made = {
        value: told === 0 ? 0 : sign * told,
        shares: shares.map((share) => ({ ...share, value: sign * share.value })),
      };
    }
  }
  return made;
}

function sumOf(shares: readonly Share[]): number {
  return shares.reduce((total, { factor, value }) => total + factor * value, 0);
}

/** As a share of what a number is summed from: rounding stays under a hundredth of it. */
const ROUNDING = 1e-13;

/** Reads what the values of a quantity in one field are summed from, in its unit: rounding goes by that. */
function sizeIn({ grid, loading }: LoadParts, quantity: Quantity, place: number): Read {
  const [from, to] = [grid.first[place]!, grid.first[place + 1]!];
  const length = grid.edges[to]! - grid.edges[from]!;
  const stretch = quantity === 'deflection' ? slopeStretch(loading.slope) ** 2 : 1;
  return ({ data, reactions }) => {
    const largest = (...items: readonly number[]): number => {
      let most = 0;
      for (let p = from; p < to; p += 1)
        for (const item of items) most = Math.max(most, Math.abs(data[STRIDE * p + item]!));
      return most;
    };
    // A point load at a support shows in its reaction alone.
    let force = largest(V0, V1) + reactions.reduce((sum, reaction) => sum + Math.abs(reaction), 0);
    for (let p = from; p < to; p += 1) {
      const even = Math.max(Math.abs(data[STRIDE * p + Q0]!), Math.abs(data[STRIDE * p + QE]!));
      force += even * (grid.edges[p + 1]! - grid.edges[p]!);
    }
    const bending = largest(M0, M1) + length * force;
    if (quantity === 'shear') return bending / length;
    if (quantity === 'moment') return bending;
    return stretch * length * (largest(S0, S1) + length * bending);
  };
}

type Read = (states: States) => number;

/** Readers at a place in the demand's field: before and after where pieces meet, for shear jumps there. */
function readersAt(
  parts: LoadParts,
  { quantity, place }: Pick<Demanded, 'quantity' | 'place'>,
  at: number,
): Read[] {
  if (quantity === 'reaction') return [(states) => states.reactions[place]!];
  const { grid } = parts;
  const stretch = quantity === 'deflection' ? slopeStretch(parts.loading.slope) ** 2 : 1;
  const readers: Read[] = [];
  for (let p = grid.first[place]!; p < grid.first[place + 1]!; p += 1) {
    const t = at - grid.edges[p]!;
    const h = grid.edges[p + 1]! - grid.edges[p]!;
    if (t < -grid.tolerance || t > h + grid.tolerance) continue;
    readers.push((states) => stretch * pieceValue(states.data, STRIDE * p, ORDER[quantity], t));
  }
  return readers;
}

function sharesOf(
  parts: LoadParts,
  w: number,
  demand: Pick<Demanded, 'combination' | 'deadFactor'>,
  sign: number,
  read: Read,
): Share[] {
  const { factors } = demand.combination;
  const shares: Share[] = [];
  const dead = demand.deadFactor * (factors.dead ?? 0);
  if (dead !== 0) {
    if (parts.dead !== null) shares.push({ kind: 'dead', factor: dead, value: sign * read(parts.dead) });
    if (parts.own !== null)
      shares.push({ kind: 'own weight', factor: dead, value: sign * w * read(parts.own) });
  }
  for (const kind of LOAD_KINDS) {
    const states = parts.kinds.filter((each) => each.kind === kind);
    const factor = factors[kind] ?? 0;
    if (states.length === 0 || factor === 0) continue;
    const worst = states.reduce((sum, each) => sum + read(worstOf(parts, each, sign, read)), 0);
    shares.push({ kind, factor, value: sign * worst });
  }
  return shares;
}

/** The states of a kind with the pattern that makes `sign` times a number largest. */
function worstOf(
  parts: LoadParts,
  { kind, lifts, whole, parts: each }: KindStates,
  sign: number,
  read: Read,
): States {
  if (each === null) return whole;
  const sum = scaled(whole, 0);
  if (kind === 'snow' && !lifts) {
    let most = Number.NEGATIVE_INFINITY;
    let best = parts.snow[0]!.full;
    for (const { full } of parts.snow) {
      let value = 0;
      each.forEach((part, f) => {
        if (part !== null) value += sign * snowFactor(full, f) * read(part);
      });
      if (value > most) [most, best] = [value, full];
    }
    each.forEach((part, f) => {
      if (part !== null) add(sum, part, snowFactor(best, f));
    });
    return sum;
  }
  for (const part of each) if (part !== null && sign * read(part) > 0) add(sum, part, 1);
  return sum;
}

function snowFactor(full: number, field: number): number {
  return full & (1 << field) ? 1 : PARTIAL_SNOW;
}

/** Where the demand is largest in its field under the pattern that is worst at `at`. */
function placeUnder(parts: LoadParts, w: number, demand: Demanded, sign: number, at: number): number | null {
  const { quantity, place, combination, deadFactor } = demand;
  const read = readersAt(parts, demand, at)[0];
  if (quantity === 'reaction' || read === undefined) return null;
  const some = parts.own ?? parts.dead ?? parts.kinds[0]?.whole;
  if (some === undefined) return null;
  const sum = scaled(some, 0);
  const dead = deadFactor * (combination.factors.dead ?? 0);
  if (parts.dead !== null) add(sum, parts.dead, dead);
  if (parts.own !== null) add(sum, parts.own, dead * w);
  for (const states of parts.kinds) {
    const factor = combination.factors[states.kind] ?? 0;
    if (factor !== 0) add(sum, worstOf(parts, states, sign, read), factor);
  }
  const { max, min } = responseOf(parts.grid, sum).extremes(quantity, place);
  return sign > 0 ? max.at : min.at;
}
