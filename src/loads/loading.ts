import type { Beam, BeamLoad } from '../statics/beam.ts';
import type { LoadKind } from './kinds.ts';

/** Editions whose load combinations are known. */
export const COMBINATION_SETS = ['ASCE 7-16', 'ASCE 7-22'] as const;
export type CombinationSet = (typeof COMBINATION_SETS)[number];

/** A line or point load of one kind. */
export type AppliedLoad = BeamLoad & { readonly kind: LoadKind };

/** ASCE 7 §4.7: tributary area AT, in², and live-load element factor KLL. */
export interface LiveReduction {
  readonly area: number;
  readonly KLL: number;
}

/** Which support of a member a link takes the reaction of: that at an end, or one by its index from the left. */
export type LinkEnd = 'left' | 'right' | number;

/**
 * What a support bears by kind, lb, downward on what carries it: the largest and the smallest over the kind's own load
 * patterns; one figure twice where it has none.
 */
export type Borne = Readonly<Partial<Record<LoadKind, { readonly max: number; readonly min: number }>>>;

/**
 * A load that is the reaction of another member: once at a place, or one every so many inches between two places,
 * spread evenly. Places and spacing in in, on plan.
 */
export type Link = {
  /** Name of the member whose reaction it is. */
  readonly member: string;
  readonly end: LinkEnd;
  /** What that member brings as it stands; null while that has not been worked out. Not in the file. */
  readonly bears: Borne | null;
} & (
  | { readonly type: 'point'; readonly at: number }
  | {
      readonly type: 'line';
      readonly every: number;
      /** `every` is the spacing that the other member stands at, and follows it. Absent: it was typed. */
      readonly bySpacing?: true;
      readonly from: number;
      readonly to: number;
    }
);

/** Where a load or a link stands or runs, in from the member's left end. */
export type Placed =
  | { readonly type: 'point'; readonly at: number }
  | { readonly type: 'line'; readonly from: number; readonly to: number };

/** A beam and all that it carries, in base units (lb, in, psi, lb/in). */
export interface Loading {
  readonly beam: Beam;
  /** Width of floor or roof that the member carries, in. */
  readonly tributary: number;
  /** Area loads by kind, psi. */
  readonly area: Readonly<Record<LoadKind, number>>;
  /** Line and point loads on top of the area loads. */
  readonly loads: readonly AppliedLoad[];
  /** Loads that are reactions of other members. Absent: none. */
  readonly links?: readonly Link[];
  readonly selfWeight: boolean;
  readonly combinations: CombinationSet;
  readonly liveReduction: LiveReduction | null;
  /** Rise over run of a sloped member, 0 when level. */
  readonly slope: number;
  /** Bearing length along the member at each support, in; a support's face is half of it from its centre. */
  readonly bearing: readonly number[];
  readonly shearAt: 'support' | 'd';
}
