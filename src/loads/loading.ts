import type { Beam, BeamLoad } from '../statics/beam.ts';
import type { LoadKind } from './kinds.ts';

export type CombinationSet = 'ASCE 7-16' | 'ASCE 7-22';

/** A line or point load of one kind. */
export type AppliedLoad = BeamLoad & { readonly kind: LoadKind };

/** ASCE 7 §4.7: tributary area AT, in², and live-load element factor KLL. */
export interface LiveReduction {
  readonly area: number;
  readonly KLL: number;
}

/** A beam and all that it carries, in base units (lb, in, psi, lb/in). */
export interface Loading {
  readonly beam: Beam;
  /** Width of floor or roof that the member carries, in. */
  readonly tributary: number;
  /** Area loads by kind, psi. */
  readonly area: Readonly<Record<LoadKind, number>>;
  /** Line and point loads on top of the area loads. */
  readonly loads: readonly AppliedLoad[];
  readonly selfWeight: boolean;
  readonly combinations: CombinationSet;
  readonly liveReduction: LiveReduction | null;
  /** Rise over run of a sloped member, 0 when level. */
  readonly slope: number;
  /** Bearing length along the member at each support, in; a support's face is half of it from its centre. */
  readonly bearing: readonly number[];
  readonly shearAt: 'support' | 'd';
}
