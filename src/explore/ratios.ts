import { type Prepared, prepare, prepareLike, rate, type Wood, woodOf } from '../timber/index.ts';
import type { Member } from '../timber/member.ts';
import { roomForRatios } from '../timber/report.ts';

/** Ratios of every check of a member, in the order of CHECK_IDS; NaN where a check does not apply. */
export function ratiosOf(member: Member): readonly number[] {
  return ratiosLike(member)(member);
}

/**
 * The same for members that are like this one (another section, load or span): what need not be worked out again
 * for them is kept. `how` prepares the like member where the caller knows better.
 */
export function ratiosLike(
  member: Member,
): (like: Member, how?: (prepared: Prepared) => Prepared) => readonly number[] {
  const prepared: Prepared = prepare(member);
  const wood: Wood = woodOf(member);
  return (like, how) => {
    const ratios = roomForRatios();
    const own = like === member ? prepared : how === undefined ? prepareLike(prepared, like) : how(prepared);
    rate(own, sameWood(member, like) ? wood : woodOf(like), like.section, ratios);
    return ratios;
  };
}

const WOOD_KEYS = ['stock', 'service', 'temperature', 'incised', 'repetitive', 'typedFactors'] as const;

function sameWood(one: Member, other: Member): boolean {
  return WOOD_KEYS.every((key) => one[key] === other[key]);
}
