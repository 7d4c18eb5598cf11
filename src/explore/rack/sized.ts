import type { Units } from '../../quantity/index.ts';
import { prepare, prepareLike, reportMember } from '../../timber/index.ts';
import type { Member } from '../../timber/member.ts';
import type { MemberReport } from '../../timber/report.ts';
import { type RackSize, rackOf, takeSize } from './rack.ts';

/** A member with the size found for it. */
export interface Sized {
  /** The lightest stock size that passes; null where none does. */
  readonly lightest: RackSize | null;
  /** That, else the size that comes nearest to passing; null where the wood has no stock sizes that count. */
  readonly nearest: RackSize | null;
  /** The member of that size, or as it was. */
  readonly member: Member;
  readonly report: MemberReport;
}

/** Sizes a member over the rack of its woods; words in `units`. */
export function sized(member: Member, units: Units): Sized {
  const rack = rackOf(member);
  const lightest = rack.sizes[rack.lightest] ?? null;
  const nearest = lightest ?? nearestOf(rack.sizes);
  const taken = nearest === null ? member : takeSize(member, nearest.size);
  // The rack has searched the loads already.
  const ready = prepareLike(prepare(member), taken);
  return { lightest, nearest, member: taken, report: reportMember(taken, units, ready) };
}

/** The size with the fewest ratios that nothing can meet and the least worst of the others; the lightest of equals. */
function nearestOf(sizes: readonly RackSize[]): RackSize | null {
  let nearest: RackSize | null = null;
  let least: readonly [number, number] = [Number.POSITIVE_INFINITY, Number.POSITIVE_INFINITY];
  for (const size of sizes) {
    if (size.refused !== null) continue;
    const unmet = size.ratios.filter((ratio) => ratio === Number.POSITIVE_INFINITY).length;
    const worst = size.ratios.reduce(
      (most, ratio) => (Number.isFinite(ratio) ? Math.max(most, ratio) : most),
      0,
    );
    if (unmet > least[0] || (unmet === least[0] && worst >= least[1])) continue;
    nearest = size;
    least = [unmet, worst];
  }
  return nearest;
}
