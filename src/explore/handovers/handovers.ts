import type { Size } from '../../timber/index.ts';
import type { Member } from '../../timber/member.ts';
import type { CheckId } from '../../timber/report.ts';
import { BY_WEIGHT, type Ranking } from '../rack/best.ts';
import { type Along, alongOf, type Put, type Reading } from './along.ts';
import { pricesCross, turnsRound } from './more-places.ts';
import { beginClosing, CLOSE, type Closing, closer, nextValue, turningPoint } from './turning-point.ts';

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
  options: HandoverOptions = {},
): Segment[] {
  const all = onward(beginSearch(member, put, from, to, options), Number.POSITIVE_INFINITY);
  return segmentsFound(all);
}

/** A search for handovers that can be gone on with a few readings at a time. It is a value: going on makes another. */
export interface HandoverSearch {
  readonly along: Along;
  readonly from: number;
  readonly to: number;
  /** What is done now: the range is read from end to end, then where a ratio may turn or a price steps, then where prices cross, and places are closed in on. */
  readonly stage: 'ends' | 'turns' | 'prices' | 'places';
  /** Values still to be read in this stage. */
  readonly due: readonly number[];
  /** The readings that places are closed in on between, in order of their values once they are all taken. */
  readonly readings: readonly Reading[];
  /** These and all that was read on the way to a place. */
  readonly seen: readonly Reading[];
  /** Up to here handovers are found; null before the last stage. */
  readonly here: Reading | null;
  /** Index of the reading that `here` goes towards. */
  readonly next: number;
  /** The place after `here` that is being closed in on; null between two. */
  readonly closing: Closing | null;
  readonly turns: readonly { readonly value: number; readonly lit: number }[];
}

/** The search of `handoversOf`, with nothing read yet. Throws RangeError where the range is empty. */
export function beginSearch(
  member: Member,
  put: Put,
  from: number,
  to: number,
  { ranking = BY_WEIGHT, only = null }: HandoverOptions = {},
): HandoverSearch {
  if (!(from < to)) throw new RangeError('the range must go from less to more');
  const due = Array.from({ length: READINGS }, (_, at) =>
    at === READINGS - 1 ? to : from + ((to - from) * at) / (READINGS - 1),
  );
  const along = alongOf(member, put, ranking, only);
  return {
    along,
    from,
    to,
    stage: 'ends',
    due,
    readings: [],
    seen: [],
    here: null,
    next: 1,
    closing: null,
    turns: [],
  };
}

/** The search gone on with for so many readings of the rack, or to its end. */
export function onward(search: HandoverSearch, readings: number): HandoverSearch {
  const until = search.seen.length + readings;
  let now = search;
  while (!isFound(now) && now.seen.length < until) now = stepped(now);
  return now;
}

/** True where nothing is left to read. */
export function isFound({ here, next, readings }: HandoverSearch): boolean {
  return here !== null && next === readings.length;
}

/** How much of the range its handovers are found of, 0 to 1. */
export function shareFound({ here, from, to }: HandoverSearch): number {
  return here === null ? 0 : (here.value - from) / (to - from);
}

/** The stretches of a search that is at its end. */
export function segmentsFound({ along, from, to, readings, turns }: HandoverSearch): Segment[] {
  return segmentsOf(along, from, to, readings[0]!.lit, turns);
}

/** One step on: a reading more, or what comes after the last one begun. */
function stepped(search: HandoverSearch): HandoverSearch {
  const { along, from, to, stage, due, readings, seen, here, next, closing, turns } = search;
  if (due.length > 0) {
    const reading = along.read(due[0]!);
    return { ...search, due: due.slice(1), readings: [...readings, reading], seen: [...seen, reading] };
  }
  if (here === null) {
    const inOrder = readings.toSorted((a, b) => a.value - b.value);
    const within = (values: readonly number[]) => values.filter((value) => value > from && value < to);
    const staged = { ...search, readings: inOrder, seen: inOrder };
    if (stage === 'ends') {
      const values = [...turnsRound(along, inOrder), ...along.steps(from, to)];
      return { ...staged, stage: 'turns', due: within(values) };
    }
    if (stage === 'turns') return { ...staged, stage: 'prices', due: within(pricesCross(along, inOrder)) };
    return { ...staged, stage: 'places', here: inOrder[0]! };
  }
  const end = readings[next]!;
  if (here.lit === end.lit) return { ...search, here: end, next: next + 1 };
  if (closing === null) return { ...search, closing: beginClosing(here, end, seen) };
  const value = nextValue(closing, seen);
  if (value !== null) {
    const reading = along.read(value);
    return { ...search, seen: [...seen, reading], closing: closer(closing, reading) };
  }
  const { after } = closing;
  const turn = { value: after.value, lit: after.lit };
  return { ...search, here: after, closing: null, turns: [...turns, turn] };
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
