import {
  prepare,
  rackSizesOf,
  rate,
  refusal,
  type Size,
  sectionWeight,
  standingDepth,
  standingWidth,
  woodOf,
} from '../timber/index.ts';
import type { Member, Section } from '../timber/member.ts';
import { CHECK_IDS, type CheckId } from '../timber/report.ts';
import { type Judgement, judge } from './judge.ts';

/** One stock size under the loads of a member. */
export interface RackSize extends Judgement {
  readonly size: Size;
  /** lb/in */
  readonly weight: number;
  /** In the order of CHECK_IDS; empty where the size is refused. */
  readonly ratios: Float64Array;
  /** The rule that forbids the size, or the limit that it is over; null when it counts. */
  readonly refused: string | null;
}

export interface Rack {
  /** Lightest first; equal weights: shallower first, then fewer plies. */
  readonly sizes: readonly RackSize[];
  /** Index of the lightest size that passes; -1 when none does. */
  readonly lightest: number;
}

const NO_RATIOS = new Float64Array(0);

/** The stock sizes of the member's wood under its loads, lightest first. */
export function rackOf(member: Member, only: readonly CheckId[] | null = null): Rack {
  const prepared = prepare(member);
  const wood = woodOf(member);
  const sizes = rackSizesOf(member.stock).map((size): RackSize => {
    const section = sectionOf(member, size);
    const weight = sectionWeight(member, section);
    const refused = refusal(member, section) ?? overLimit(member, section);
    if (refused !== null) {
      return {
        size,
        weight,
        ratios: NO_RATIOS,
        refused,
        passes: false,
        governing: null,
        worst: Number.POSITIVE_INFINITY,
      };
    }
    const ratios = new Float64Array(CHECK_IDS.length);
    rate(prepared, wood, section, ratios);
    const judgement = judge(ratios, only);
    return { size, weight, ratios, refused, ...judgement, passes: judgement.passes && prepared.loaded };
  });
  return { sizes, lightest: sizes.findIndex((each) => each.passes) };
}

function overLimit(member: Member, section: Section): string | null {
  const { maxDepth, maxWidth } = member;
  if (maxDepth !== null && standingDepth(section) > maxDepth) return 'too deep';
  if (maxWidth !== null && standingWidth(section) > maxWidth) return 'too wide';
  return null;
}

/** The section a member would have with a stock size; laid as it is now. */
export function sectionOf(member: Member, size: Size): Section {
  return { width: size.width, depth: size.depth, plies: size.plies, flat: member.section.flat };
}

/** True where the member has this stock size. */
export function hasSize(member: Member, size: Size): boolean {
  const { width, depth, plies } = member.section;
  return size.width === width && size.depth === depth && size.plies === plies;
}

/** The member with a stock size in place of its own. */
export function takeSize(member: Member, size: Size): Member {
  return { ...member, section: sectionOf(member, size) };
}

/** The lightest size that passes; null when none does. */
export function lightestOf(member: Member): Size | null {
  const rack = rackOf(member);
  return rack.sizes[rack.lightest]?.size ?? null;
}
