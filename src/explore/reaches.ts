import type { Prepared } from '../timber/index.ts';
import type { Member } from '../timber/member.ts';
import type { CheckId } from '../timber/report.ts';
import { lotsOf, type Rack, sectionOf } from './rack.ts';
import { type Reach, reachFinder } from './reach.ts';

/** The reach of each size of a rack, in its order; null where the size is refused. */
export function reachesOf(
  member: Member,
  rack: Rack,
  only: readonly CheckId[] | null = null,
): (Reach | null)[] {
  const lots = lotsOf(member, rack.woods);
  // Woods that were searched together have their lengths prepared together.
  const finders = new Map<Prepared, ReturnType<typeof reachFinder>>();
  for (const { prepared, member: own, wood } of lots) {
    if (!finders.has(prepared)) finders.set(prepared, reachFinder(own, wood, only));
  }
  const lotOf = new Map(rack.woods.map((stock, at) => [stock, lots[at]!]));
  return rack.sizes.map(({ size, refused }) => {
    if (refused !== null) return null;
    const { prepared, wood } = lotOf.get(size.stock)!;
    return finders.get(prepared)!(sectionOf(member, size), wood);
  });
}
