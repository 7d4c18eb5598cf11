import { lineLoadOf, prepare, rate, untiedUplift, woodOf } from '../timber/index.ts';
import type { Member } from '../timber/member.ts';
import { type CheckId, PASS_LIMIT, roomForRatios } from '../timber/report.ts';
import { judge } from './judge.ts';
import { scaleLoads } from './scale.ts';

/** What a member carries before its first check stands at its limit, all applied loads growing in step. */
export interface Capacity {
  /** Times the applied loads; 0 where it fails as it is and under its own weight alone, Infinity where no load makes it fail. */
  readonly factor: number;
  /** The check that stops it; null where none does. */
  readonly stops: CheckId | null;
  /** The applied loads at a glance, lb/in over its length, without own weight: as they are, and as many as it carries. */
  readonly asked: number;
  readonly carries: number;
}

/** The factor is found to this share, on the safe side, where nobody says how near is near enough. */
const CLOSE = 1e-6;
const ROUNDS = 60;
/** More than so many times the loads is never drawn. */
const MOST = 1e6;

export interface CapacityOptions {
  /** How near the factor is to be found, as a share of it. */
  readonly close?: number;
  /** About what it comes to, where that is known. */
  readonly near?: number;
}

/** One look: what the largest ratio comes to at a factor on the loads. */
interface Look {
  readonly factor: number;
  /** Over the limit by so much: the largest ratio less 1, or lb of uplift that nothing holds down. */
  readonly excess: number;
  readonly lifts: boolean;
  readonly lifting: number;
  readonly stops: CheckId | null;
}

/**
 * The capacity of a member. With its own weight as it is the largest ratio is a convex line of pieces over the factor
 * (a piece a check, combination and pattern): chords lead to the limit in a few steps, uplift that nothing holds down
 * by its force. Each look is a full evaluation: no pattern that takes over under more load is missed.
 */
export function capacityOf(member: Member, { close = CLOSE, near = 1 }: CapacityOptions = {}): Capacity {
  const asked = lineLoadOf({ ...member, selfWeight: false });
  const found = (factor: number, stops: CheckId | null): Capacity => ({
    factor,
    stops,
    asked,
    carries: factor * asked,
  });
  const look = lookerOf(member);
  const bare = look(0);
  // Loads may hold down what its own weight alone would lift.
  let low = bare.excess > 0 ? look(1) : bare;
  if (low.excess > 0) return found(0, bare.stops);
  let high = look(Math.max(near, low.factor * SOME_MORE));
  while (high.excess <= 0) {
    const next = beyond(low, high, close);
    if (next > MOST) return found(Number.POSITIVE_INFINITY, null);
    low = high;
    high = look(next);
  }
  /** The one that failed before: a convex line stays above the chord of two that fail. */
  let higher: Look | null = null;
  for (let round = 0; round < ROUNDS && high.factor - low.factor > close * high.factor; round += 1) {
    const here = look(between(low, high, round % 2 === 0 ? null : higher, close));
    if (here.excess <= 0) low = here;
    else [higher, high] = [high, here];
  }
  return found(low.factor, high.stops);
}

function lookerOf(member: Member): (factor: number) => Look {
  const wood = woodOf(member);
  const ratios = roomForRatios();
  return (factor) => {
    const scaled = factor === 1 ? member : scaleLoads(member, factor);
    const prepared = prepare(scaled);
    rate(prepared, wood, member.section, ratios);
    const { worst, governing } = judge(ratios);
    const lifting = untiedUplift(prepared, wood.at.weight);
    const lifts = worst === Number.POSITIVE_INFINITY && lifting > 0;
    return { factor, excess: lifts ? lifting : worst - PASS_LIMIT, lifts, lifting, stops: governing };
  };
}

/** The least and the most that a factor which passes is followed by. */
const SOME_MORE = 1.01;
const MANY_MORE = 10;

/** The next factor where both pass: a hair beyond where the chord meets the limit. */
function beyond(low: Look, high: Look, close: number): number {
  const rise = (high.excess - low.excess) / (high.factor - low.factor);
  const reach = rise > 0 ? high.factor - high.excess / rise : Number.POSITIVE_INFINITY;
  return Math.min(Math.max(reach * (1 + HAIR * close), high.factor * SOME_MORE), high.factor * MANY_MORE);
}

/** Of how near is near enough: a reading aims so much beyond a place, to have it between two. */
const HAIR = 0.4;

/**
 * A factor between one that passes and one that fails: where the chord of the two meets the limit, which a convex line
 * has not reached there, or where the chord of the two that fail does, where it is beyond; each a hair further.
 */
function between(low: Look, high: Look, higher: Look | null, close: number): number {
  const hair = HAIR * close * high.factor;
  const within = (at: number) => Math.min(high.factor - hair, Math.max(low.factor + hair, at));
  const middle = (low.factor + high.factor) / 2;
  if (higher !== null && higher.lifts === high.lifts) {
    const at = meets(high, higher.factor, higher.excess);
    return Number.isFinite(at) ? within(at - hair) : middle;
  }
  const at = meets(high, low.factor, high.lifts ? low.lifting : low.excess);
  return Number.isFinite(at) ? within(at + hair) : middle;
}

/** Where the line through a look and another place of it meets the limit. */
function meets(look: Look, factor: number, excess: number): number {
  return look.factor - (look.excess * (look.factor - factor)) / (look.excess - excess);
}
