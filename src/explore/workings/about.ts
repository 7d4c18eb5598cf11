import type { Units } from '../../quantity/index.ts';
import type { Member } from '../../timber/member.ts';
import type { DiagramPlace } from '../../timber/workings/index.ts';
import { BY_WEIGHT, type Ranking } from '../rack/best.ts';

/** What pages go by beside the member itself. */
export interface About {
  readonly ranking: Ranking;
  /** Key of the knob that handovers and charts go along. */
  readonly knob: string;
  /** Every member that is bought together; empty where the member stands alone. */
  readonly job: readonly { readonly member: Member }[];
  /** The design that a change is counted from; null where none is asked about. */
  readonly before: Member | null;
  /** Where the diagrams are read; null where they are not asked about. */
  readonly place: DiagramPlace | null;
}

/** A member that nobody compares with another, the lightest size the best. */
export const ALONE: About = { ranking: BY_WEIGHT, knob: 'spans.0', job: [], before: null, place: null };

/** What a page is written of. */
export interface Asked extends About {
  readonly member: Member;
  readonly units: Units;
}
