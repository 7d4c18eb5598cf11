import type { Prepared } from '../../timber/index.ts';
import type { Member } from '../../timber/member.ts';
import type { CheckId } from '../../timber/report.ts';
import { lotsOf, type Rack, sectionOf } from '../rack/rack.ts';
import { type Reach, type ReachFinder, reachFinder } from './reach.ts';

/** The reaches of a rack, each found when it is first asked for. */
export interface Reaches {
  /** Of the size at an index; null where the size is refused. */
  at(index: number): Reach | null;
  /** The reach of the size at an index where it is beyond a span, in; else null, for less work than to find it. */
  beyond(index: number, span: number): Reach | null;
}

/** A hair over the reach's own closeness, so that a size of just this reach is not called longer. */
const HAIR = 1e-8;

export function lazyReaches(
  member: Member,
  rack: Pick<Rack, 'sizes' | 'woods'>,
  only: readonly CheckId[] | null = null,
): Reaches {
  const lots = lotsOf(member, rack.woods);
  // Woods that were searched together have their lengths prepared together.
  const finders = new Map<Prepared, ReachFinder>();
  for (const { prepared, member: own, wood } of lots) {
    if (!finders.has(prepared)) finders.set(prepared, reachFinder(own, wood, only));
  }
  const lotOf = new Map(rack.woods.map((stock, at) => [stock, lots[at]!]));
  const known = new Map<number, Reach | null>();
  const find = (index: number): Reach | null => {
    const { size, refused } = rack.sizes[index]!;
    if (refused !== null) return null;
    const { prepared, wood } = lotOf.get(size.stock)!;
    return finders.get(prepared)!(sectionOf(member, size), wood);
  };
  const at = (index: number): Reach | null => {
    let reach = known.get(index);
    if (reach === undefined) {
      reach = find(index);
      known.set(index, reach);
    }
    return reach;
  };
  const beyond = (index: number, span: number): Reach | null => {
    const { size, refused } = rack.sizes[index]!;
    if (refused !== null) return null;
    const { prepared, wood } = lotOf.get(size.stock)!;
    const further = span * (1 + HAIR);
    if (span > 0 && !finders.get(prepared)!.passes(sectionOf(member, size), further, wood)) return null;
    const reach = at(index);
    return reach !== null && reach.span > span ? reach : null;
  };
  return { at, beyond };
}

/** The reach of each size of a rack, in its order; null where the size is refused. */
export function reachesOf(
  member: Member,
  rack: Pick<Rack, 'sizes' | 'woods'>,
  only: readonly CheckId[] | null = null,
): (Reach | null)[] {
  const reaches = lazyReaches(member, rack, only);
  return rack.sizes.map((_, index) => reaches.at(index));
}
