import type { Size } from '../../timber/index.ts';
import type { Member } from '../../timber/member.ts';
import { type CheckId, PASS_LIMIT } from '../../timber/report.ts';
import { BY_WEIGHT, type Ranking } from '../rack/best.ts';
import { type Along, alongOf, type Put, type Reading } from './along.ts';
import { CLOSE, turningPoint } from './turning-point.ts';

/** A stretch of a knob along which one size is the best that passes. Segments touch. */
export interface Segment {
  /** Base units of the knob. */
  readonly from: number;
  readonly to: number;
  /** null where nothing on the rack passes. */
  readonly size: Size | null;
}

export interface HandoverOptions {
  readonly ranking?: Ranking;
  readonly only?: readonly CheckId[] | null;
}

/** Readings spread over the range before places are closed in on. */
const READINGS = 17;

/**
 * Which size is the best passing one from where to where as a knob goes from one value to another (base units,
 * from < to); places are found to a ten-millionth. Throws RangeError where the range is empty.
 */
export function handoversOf(
  member: Member,
  put: Put,
  from: number,
  to: number,
  { ranking = BY_WEIGHT, only = null }: HandoverOptions = {},
): Segment[] {
  if (!(from < to)) throw new RangeError('the range must go from less to more');
  const along = alongOf(member, put, ranking, only);
  const turns: { readonly value: number; readonly lit: number }[] = [];
  const readings = spread(along, from, to);
  const seen = [...readings];
  for (let at = 1; at < readings.length; at += 1) {
    let here = readings[at - 1]!;
    const end = readings[at]!;
    while (here.lit !== end.lit) {
      const { after } = turningPoint(along, here, end, seen);
      turns.push({ value: after.value, lit: after.lit });
      here = after;
    }
  }
  return segmentsOf(along, from, to, readings[0]!.lit, turns);
}

function segmentsOf(
  { sizes }: Along,
  from: number,
  to: number,
  first: number,
  turns: readonly { readonly value: number; readonly lit: number }[],
): Segment[] {
  const narrow = narrowest(from, to);
  const segments: Segment[] = [];
  let start = from;
  let lit = first;
  const close = (end: number): void => {
    const size = sizes[lit] ?? null;
    const last = segments[segments.length - 1];
    if (end - start <= narrow && segments.length + turns.length > 0) return;
    if (last !== undefined && last.size === size) segments[segments.length - 1] = { ...last, to: end };
    else segments.push({ from: last?.to ?? from, to: end, size });
  };
  for (const turn of turns) {
    close(turn.value);
    start = turn.value;
    lit = turn.lit;
  }
  close(to);
  // A stretch too narrow to tell from one of its ends is part of its neighbour.
  const last = segments[segments.length - 1]!;
  segments[segments.length - 1] = { ...last, to };
  return segments;
}

/** The narrowest stretch of a range that is told apart from its neighbour. */
function narrowest(from: number, to: number): number {
  return 10 * CLOSE * Math.max(Math.abs(from), Math.abs(to));
}

/**
 * Readings from end to end, with more where a price steps or crosses that of a lit size, and wherever a size might
 * pass, or fail, between two that agree: where its ratio turns round near the limit, as it does where a load helps
 * until it harms.
 */
function spread(along: Along, from: number, to: number): Reading[] {
  const readings = Array.from({ length: READINGS }, (_, at) =>
    along.read(at === READINGS - 1 ? to : from + ((to - from) * at) / (READINGS - 1)),
  );
  const more = new Set<number>();
  for (let at = 1; at < readings.length - 1; at += 1) {
    const [left, here, right] = [readings[at - 1]!, readings[at]!, readings[at + 1]!];
    const upTo = here.lit < 0 ? along.sizes.length - 1 : here.lit;
    for (let index = 0; index <= upTo; index += 1) {
      if (here.lit >= 0 && here.place(index) > here.place(here.lit)) continue;
      const place = turnsRound(left, here, right, index);
      if (place !== null) more.add(place);
    }
  }
  const within = (values: Iterable<number>): Reading[] =>
    [...values].filter((value) => value > from && value < to).map((value) => along.read(value));
  const inOrder = (all: Reading[]): Reading[] => all.sort((a, b) => a.value - b.value);
  const stepped = inOrder([...readings, ...within(more), ...within(along.steps(from, to))]);
  const crossed = stepped
    .slice(1)
    .flatMap((right, at) => pricesCross(along.sizes.length, stepped[at]!, right));
  return crossed.length === 0 ? stepped : inOrder([...stepped, ...within(crossed)]);
}

/**
 * Where between two readings the price of a size comes to be less than that of a lit one, or ceases to be: prices go
 * evenly with the length from one step to the next.
 */
function pricesCross(sizes: number, left: Reading, right: Reading): number[] {
  const places: number[] = [];
  for (const lit of new Set([left.lit, right.lit])) {
    if (lit < 0) continue;
    for (let index = 0; index < sizes; index += 1) {
      const [before, after] = [dearerBy(left, index, lit), dearerBy(right, index, lit)];
      if (before === null || after === null || before * after >= 0) continue;
      const share = before / (before - after);
      // On both sides of it, so that the size that is the cheaper for a short stretch is met.
      for (const aside of [-JUST_ASIDE, JUST_ASIDE])
        places.push(left.value + (share + aside) * (right.value - left.value));
    }
  }
  return places;
}

/** As a share of the way from one reading to the next. */
const JUST_ASIDE = 1e-7;

function dearerBy(reading: Reading, index: number, than: number): number | null {
  const [one, other] = [reading.price(index), reading.price(than)];
  return one === null || other === null ? null : one - other;
}

/** A ratio that turns round nearer than this to the limit may cross it between two readings. */
const NEAR = 0.1;

/** Where the ratio of a size is least (of one that fails) or greatest (of one that passes) by its parabola; null where it is far. */
function turnsRound(left: Reading, here: Reading, right: Reading, index: number): number | null {
  const middle = here.worst(index);
  if (!Number.isFinite(middle)) return null;
  const fails = middle > PASS_LIMIT;
  if (Math.abs(middle - 1) > 2 * NEAR + 1) return null;
  const [a, b] = [left.worst(index), right.worst(index)];
  if (!Number.isFinite(a) || !Number.isFinite(b)) return null;
  const turns = fails ? a > middle && b > middle : a < middle && b < middle;
  if (!turns) return null;
  const bend = a - 2 * middle + b;
  const shift = (a - b) / (2 * bend);
  const extreme = middle - ((a - b) * shift) / 4;
  if (Math.abs(extreme - 1) > NEAR) return null;
  return here.value + shift * (right.value - here.value);
}

/** The lit size with its neighbours along a knob. */
export interface Around {
  readonly size: Size | null;
  /** Where it takes over, and from which size (null: none passes); null where it does so nowhere before the end. */
  readonly below: Neighbour | null;
  /** Where it hands over, and to which size. */
  readonly above: Neighbour | null;
}

export interface Neighbour {
  /** Base units of the knob. */
  readonly at: number;
  readonly size: Size | null;
}

/** First step outward, as a share of the value; each is so much longer than the one before. */
const FIRST = 1 / 32;
const LONGER = 1.6;

/**
 * From where to where the size lit now stays the best as one knob moves between its ends, and what comes next. What is
 * lit at an end alone, as nothing is where the last load goes, is no neighbour.
 */
export function aroundOf(
  member: Member,
  knob: { readonly put: Put; readonly least: number; readonly most: number },
  now: number,
  { ranking = BY_WEIGHT, only = null }: HandoverOptions = {},
): Around {
  const along = alongOf(member, knob.put, ranking, only);
  const here = along.read(now);
  const seen = [here];
  const narrow = narrowest(knob.least, knob.most);
  const next = (end: number, by: 1 | -1): Neighbour | null => {
    let last = here;
    let step = FIRST * Math.max(Math.abs(now), (knob.most - knob.least) * CLOSE);
    while (by > 0 ? last.value < end : last.value > end) {
      const value = by > 0 ? Math.min(end, last.value + step) : Math.max(end, last.value - step);
      const steps = along.steps(last.value, value).sort((a, b) => by * (a - b));
      for (const place of [...steps, value]) {
        const reading = along.read(place);
        if (reading.lit !== here.lit) {
          const { after } = turningPoint(along, last, reading, seen);
          if (Math.abs(end - after.value) <= narrow) return null;
          return { at: after.value, size: along.sizes[after.lit] ?? null };
        }
        last = reading;
        seen.push(reading);
      }
      step *= LONGER;
    }
    return null;
  };
  return {
    size: along.sizes[here.lit] ?? null,
    below: now > knob.least ? next(knob.least, -1) : null,
    above: now < knob.most ? next(knob.most, 1) : null,
  };
}
