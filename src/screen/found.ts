import type { Around, Segment } from '../explore/handovers/handovers.ts';
import type { Moves } from '../explore/moves/index.ts';
import type { Ranking } from '../explore/rack/best.ts';
import type { Units } from '../quantity/index.ts';
import type { Member } from '../timber/member.ts';

/** What was found along a knob after the frame, and of what: shown only while that is what is at hand. */
export interface FoundAround {
  readonly member: Member;
  readonly ranking: Ranking;
  readonly knob: string;
  readonly around: Around;
}

/** The moves that were found after the frame, and of what: shown only while that is what is at hand. */
export interface FoundMoves {
  readonly member: Member;
  readonly ranking: Ranking;
  readonly units: Units;
  readonly moves: Moves;
}

/** A strip of handovers: which size is best from where to where along one knob. */
export interface Strip {
  readonly label: string;
  readonly from: number;
  readonly to: number;
  readonly now: number;
  /** The stretches by line: one each, but neighbours of which both ends show the same figure share one. */
  readonly groups: readonly (readonly Segment[])[];
  show(value: number): string;
}
