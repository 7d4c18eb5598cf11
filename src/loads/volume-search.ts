import type { States } from '../statics/states.ts';
import type { Envelope } from './envelope.ts';
import {
  type Ends,
  endsOf,
  type Intervals,
  intervalsOf,
  type Reach,
  reachesOf,
  WIDTH,
} from './moment-bounds.ts';
import { liftBit, PARTIAL_SNOW, type Pattern } from './patterns.ts';
import { type Line, VolumeBar } from './volume-bar.ts';
import { MomentCase, stretchesOf, ZERO } from './zero-moment.ts';

/** Whose moments are looked for: a field, the sign they bend it with, the combinations that may bring them. */
export interface MomentPlace {
  readonly field: number;
  readonly sign: 1 | -1;
  readonly combinations: readonly number[];
}

/** Own weights from and to, lb/in. */
export interface Weights {
  readonly light: number;
  readonly heavy: number;
}

/** A part of a load that may be there or not. */
interface FreePart {
  readonly ends: Ends;
  /** The pattern with the part in it. */
  readonly put: (pattern: Pattern) => Pattern;
}

/** A combination: own weight of 1 lb/in; the most by arrangement of snow, all that may be there counted; that itself. */
interface LaidOut {
  readonly own: Ends | null;
  readonly tops: readonly { readonly top: Ends; readonly snow: number }[];
  readonly free: readonly FreePart[];
}

/** A case with the most that it may come to, lb.in times a root of in: no more than the line between its two values. */
export interface VolumeCase extends Line {
  readonly one: MomentCase;
}

const NEARLY = 1e-9;

const NOTHING: Pattern = { live: 0, roofLive: 0, snow: -1, lifts: 0 };

/**
 * Finds the load cases whose moment times a root of its length between zero moments is the largest at some own weight
 * (`M L^(1/root)`: what the volume factor makes of a moment, NDS 5.3.6). Patterns are tried by branch and bound: one
 * part of a load after the other is put on and left off, those that do most first, and a branch is given up as soon as
 * the largest moment and the longest stretch that its undecided parts allow come to no more than a known case.
 */
export class VolumeSearch {
  readonly #e: Envelope;
  readonly #intervals: Intervals;
  readonly #ends = new Map<States, Ends>();
  readonly #sagging: LaidOut[] = [];
  readonly #hogging: LaidOut[] = [];

  constructor(e: Envelope) {
    this.#e = e;
    this.#intervals = intervalsOf(e);
  }

  /** The cases that can be the largest at an own weight within `weights`; `known` are good ones to begin with. */
  cases(place: MomentPlace, root: number, weights: Weights, known: readonly MomentCase[]): VolumeCase[] {
    const { edges, count } = this.#e.parts.grid;
    const bar = new VolumeBar(root, edges[count]!);
    // A little less than they come to, so that the search finds them too.
    for (const one of known) this.#raise(bar, place, weights, one, 1 - NEARLY);
    const found: { readonly one: MomentCase; readonly reaches: readonly Reach[] }[] = [];
    for (const combination of place.combinations) {
      const { own, tops, free } = this.#laidOut(place.sign, combination);
      const parts = this.#nearestFirst(place.field, free);
      const visit = (top: Ends, pattern: Pattern, next: number): void => {
        const floor = ZERO * bar.leastMoment;
        const reaches = reachesOf(this.#intervals, place.field, top, own, weights, floor);
        if (reaches.every((reach) => bar.covers(reach))) return;
        const part = parts[next];
        if (part === undefined) {
          const one = new MomentCase(this.#e, combination, pattern);
          this.#raise(bar, place, weights, one, 1);
          found.push({ one, reaches });
          return;
        }
        const put = () => visit(plus(top, part.ends, worsened), part.put(pattern), next + 1);
        const leave = () => visit(plus(top, part.ends, withdrawn), pattern, next + 1);
        const adds = this.#inField(place.field, part.ends) > 0;
        if (adds) put();
        leave();
        if (!adds) put();
      };
      for (const { top, snow } of tops) visit(top, { ...NOTHING, snow }, 0);
    }
    return found
      .filter(({ reaches }) => !reaches.every((reach) => bar.isAbove(reach)))
      .map(({ one, reaches }) => {
        const most = reaches.map((reach) => bar.most(reach));
        return {
          one,
          light: Math.max(...most.map(({ light }) => light)),
          heavy: Math.max(...most.map(({ heavy }) => heavy)),
        };
      })
      .sort((a, b) => b.light + b.heavy - a.light - a.heavy);
  }

  /** Raises the bar to `part` of what a case is sure to come to at every own weight within `weights`. */
  #raise(
    bar: VolumeBar,
    { field, sign }: MomentPlace,
    weights: Weights,
    one: MomentCase,
    part: number,
  ): void {
    const light = stretchesOf(one, field, sign, weights.light);
    const heavy = weights.heavy === weights.light ? light : stretchesOf(one, field, sign, weights.heavy);
    const gain = sign * (weights.heavy - weights.light);
    for (const a of light) {
      for (const b of heavy) {
        // A moment that is above zero at both weights is so between them, for it is a line in own weight.
        const from = Math.max(a.from, b.from);
        const to = Math.min(a.to, b.to);
        const raise = (here: number, there: number) => bar.raise(part * here, part * there, to - from);
        if (a.at >= from && a.at <= to) raise(a.moment, a.moment + gain * one.ownMoment(field, a.at));
        if (b.at >= from && b.at <= to) raise(b.moment - gain * one.ownMoment(field, b.at), b.moment);
      }
    }
  }

  /** The loads of a combination, their moments times a sign. */
  #laidOut(sign: number, c: number): LaidOut {
    const known = sign > 0 ? this.#sagging : this.#hogging;
    known[c] ??= this.#layOut(sign, c);
    return known[c];
  }

  #layOut(sign: number, c: number): LaidOut {
    const { parts, deadScale, list } = this.#e;
    const { factors } = list[c]!;
    const top: Ends = new Array<number>(WIDTH * this.#intervals.count).fill(0);
    if (parts.dead) add(top, this.#scaled(parts.dead, sign * deadScale[c]!), whole);
    const free = this.#freeParts(sign, c);
    for (const { ends } of free) add(top, ends, helpful);
    let snowy: readonly (Ends | null)[] | null = null;
    for (const { kind, lifts, parts: each, whole: states } of parts.kinds) {
      const factor = factors[kind];
      if (!factor) continue;
      if (!each) add(top, this.#scaled(states, sign * factor), whole);
      else if (kind === 'snow' && !lifts)
        snowy = each.map((part) => part && this.#scaled(part, sign * factor));
    }
    const own = parts.own && this.#scaled(parts.own, sign * deadScale[c]!);
    if (snowy === null) return { own, tops: [{ top, snow: -1 }], free };
    for (const part of snowy) if (part) add(top, part, partial);
    const tops = parts.snow.map(({ full }) => {
      const arranged = top.slice();
      snowy!.forEach((part, f) => {
        if (part && full & (1 << f)) add(arranged, part, remainder);
      });
      return { top: arranged, snow: full };
    });
    return { own, tops, free };
  }

  /** The parts of a combination that patterns may leave off. */
  #freeParts(sign: number, c: number): FreePart[] {
    const free: FreePart[] = [];
    for (const { kind, lifts, parts } of this.#e.parts.kinds) {
      const factor = this.#e.list[c]!.factors[kind];
      if (!factor || !parts || (kind === 'snow' && !lifts)) continue;
      parts.forEach((part, f) => {
        if (part === null) return;
        const put = (pattern: Pattern): Pattern => {
          if (lifts) return { ...pattern, lifts: pattern.lifts | liftBit(kind, f) };
          const of = kind as 'live' | 'roofLive';
          return { ...pattern, [of]: pattern[of] | (1 << f) };
        };
        free.push({ ends: this.#scaled(part, sign * factor), put });
      });
    }
    return free;
  }

  /** Those that do most to a field first. */
  #nearestFirst(field: number, free: readonly FreePart[]): FreePart[] {
    return free
      .map((part) => ({ part, most: Math.abs(this.#inField(field, part.ends)) }))
      .sort((a, b) => b.most - a.most)
      .map(({ part }) => part);
  }

  /** What a part comes to in a field where that is largest, with its sign. */
  #inField(field: number, ends: Ends): number {
    const { first } = this.#intervals;
    let most = 0;
    for (let i = WIDTH * first[field]!; i < WIDTH * first[field + 1]!; i += WIDTH)
      if (Math.abs(ends[i]!) > Math.abs(most)) most = ends[i]!;
    return most;
  }

  #scaled(states: States, factor: number): Ends {
    let ends = this.#ends.get(states);
    if (ends === undefined) {
      ends = endsOf(this.#e, this.#intervals, states);
      this.#ends.set(states, ends);
    }
    return ends.map((value) => factor * value);
  }
}

const whole = (value: number) => value;
const partial = (value: number) => PARTIAL_SNOW * value;
const remainder = (value: number) => (1 - PARTIAL_SNOW) * value;
/** Of a part that is undecided, what may add. */
const helpful = (value: number) => Math.max(0, value);
/** What changes when such a part is put on, and when it is left off. */
const worsened = (value: number) => Math.min(0, value);
const withdrawn = (value: number) => -Math.max(0, value);

function plus(ends: Ends, others: Ends, of: (value: number) => number): Ends {
  const sum = ends.slice();
  add(sum, others, of);
  return sum;
}

function add(ends: Ends, others: Ends, of: (value: number) => number): void {
  for (let i = 0; i < ends.length; i++) ends[i]! += of(others[i]!);
}
