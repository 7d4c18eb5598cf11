import type { Combination } from './combinations.ts';

export type { Combination } from './combinations.ts';

/**
 * One candidate for the largest value of a demand: `base + perWeight * w`, w the own weight in lb/in.
 * Where the place of the extreme moves with w the sum is not affine and `valueAt` is given: use it then.
 */
export interface Term {
  readonly base: number;
  readonly perWeight: number;
  readonly valueAt: ((w: number) => number) | null;
  /** The place at own weight w, given with `valueAt`. */
  readonly placeAt: ((w: number) => number) | null;
  /** Index into `Effects.combinations` (strength) or `Effects.deflectionCombinations`. */
  readonly combination: number;
  /** Index into `Effects.patterns`. */
  readonly pattern: number;
  /** Place of the extreme, in from the member's left end (at w = 0 when it moves). */
  readonly at: number;
  /** As in the group: index of the field or of the support. Shear groups hold the terms of all fields. */
  readonly place: number;
}

/** Cases of NDS Table 3.3.3 for the effective length of a laterally unbraced member. */
export type LateralCase = 'uniform' | 'point at mid-span' | 'other';

/** Terms that meet one capacity: the demand of the group is the largest of its terms. */
export interface TermGroup {
  /** CD of all its terms; 1 where duration does not matter (bearing, uplift, deflection). */
  readonly duration: number;
  /** Index of the field (moments, deflections) or of the support (end shear, bearing, uplift); -1 for shear. */
  readonly place: number;
  /** Moments only, null elsewhere: what their lengths between points of zero moment ask (NDS 5.3.6). */
  readonly volume: VolumeMoments | null;
  /** Moments only, 'other' elsewhere: how the loads of these combinations lie. Own weight counts as a uniform load. */
  readonly lateralCase: LateralCase;
  readonly terms: readonly Term[];
}

/** A moment with the length between the points of zero moment on either side of it. */
export interface VolumeMoment {
  /** lb.in */
  readonly moment: number;
  /** in, along a sloped member */
  readonly length: number;
  /** Place of the moment, in from the member's left end. */
  readonly at: number;
  /** Its combination and pattern. */
  readonly term: Term;
}

/**
 * Moments of a group judged by the volume factor, which falls with a root of the length between points of zero moment:
 * the case that asks most need not be the one with the largest moment.
 */
export interface VolumeMoments {
  /** No length is longer, in. */
  readonly longest: number;
  /**
   * The largest `moment length^(1/root)` over all combinations and patterns of the group at own weight `w`, lb/in; null
   * where none is more than `over` (0 where it is not given).
   */
  worst(root: number, w: number, over?: number): VolumeMoment | null;
  /** The moment of one of the group's terms, by its index. */
  of(term: number, w: number): VolumeMoment | null;
}

/**
 * The demands of a member, all combinations and load patterns searched, for any own weight from 0 to `heaviest`.
 * Terms that can never be the largest in that range are left out. Demands are magnitudes (positive):
 * shear lb, moments lb.in, bearing and uplift lb, deflections lb.in^3 (divide by E I to get in).
 * A sloped member's deflections are square to it: judge them against the sloped length (slope.ts).
 */
export interface Effects {
  readonly combinations: readonly Combination[];
  /** Entry i belongs to combination i; wind alone stands at 0.42W (IBC Table 1604.3 note f). */
  readonly deflectionCombinations: readonly Combination[];
  /** Names of load patterns, "all spans" first. */
  readonly patterns: readonly string[];
  readonly shear: readonly TermGroup[];
  /** Shear at the member's two ends where they are supports (place: support index), for end notches. */
  readonly endShear: readonly TermGroup[];
  readonly sagging: readonly TermGroup[];
  readonly hogging: readonly TermGroup[];
  readonly bearing: readonly TermGroup[];
  readonly uplift: readonly TermGroup[];
  readonly deflectionLive: readonly TermGroup[];
  readonly deflectionTotal: readonly TermGroup[];
  /**
   * Where shear is taken at d from the face (NDS 3.4.3.1): the largest by duration for a member this deep (in) and
   * heavy (lb/in), uniform loads within d of a face left out, point loads within d scaled x/d. Null where shear is
   * taken at the support.
   */
  readonly shearAtDepth: ((depth: number, w: number) => ShearAtDepth[]) | null;
}

export interface ShearAtDepth {
  readonly duration: number;
  /** lb, at the depth and own weight asked for: base + perWeight w of the term. */
  readonly value: number;
  /** Good for this depth, and for own weights near the one asked for. */
  readonly term: Term;
}
