import type { Beam, Field } from './beam.ts';

/** A beam laid out: its fields and the places of its supports. */
export interface BeamLayout {
  readonly beam: Beam;
  readonly fields: readonly Field[];
  /** in from the member's left end */
  readonly supports: readonly number[];
}

/** What a beam does under loads: the numbers of every piece (see piece.ts), and the forces of its supports. */
export interface States {
  readonly data: number[];
  /** Upward force of each support, lb. */
  readonly reactions: number[];
}
