import { type Size, standingDepth } from '../../timber/index.ts';
import type { Member } from '../../timber/member.ts';
import type { CheckId } from '../../timber/report.ts';
import { buyPiece, pieceLength } from '../buying/buying.ts';
import { clearHeight, overDepth } from '../headroom.ts';
import { type Best, BY_WEIGHT, type Ranking } from './best.ts';
import { markNonDominated } from './non-dominated.ts';
import { type Rack, type RackSize, rackOf, sectionOf } from './rack.ts';

/** A size of the rack with what it takes to choose between sizes. */
export interface RankedSize extends RackSize {
  /** As it stands, in. */
  readonly depth: number;
  /** It passes, and no other that passes is both as light and as shallow. */
  readonly nonDominated: boolean;
  /** Whether the yard has it long enough; null where there is no yard list. */
  readonly inYard: boolean | null;
  /** One member of it; null where it has no price. */
  readonly price: number | null;
  /** Clear height that it leaves, in; null where the member states no headroom. */
  readonly clear: number | null;
  /** How much too deep it is, in; 0 where it fits. */
  readonly over: number;
}

export interface RankedRack extends Rack {
  /** Best first. */
  readonly sizes: readonly RankedSize[];
  readonly best: Best;
  /** Index of the best size that passes and can be had; -1 when none does. The lightest that passes is `lightest`. */
  readonly lit: number;
}

/**
 * The rack in the order of what counts as best. Sizes without the figure that it goes by (board feet of glulam, no
 * price) stand after those that have it; what is equal stands lightest first. A size that the yard lacks stays in its
 * place and is not lit.
 */
export function rankedRack(
  member: Member,
  ranking: Ranking = BY_WEIGHT,
  only: readonly CheckId[] | null = null,
): RankedRack {
  return rank(member, rackOf(member, only), ranking);
}

/** The best size that passes and can be had; null where there is none. */
export function bestOf(member: Member, ranking: Ranking): Size | null {
  const { sizes, lit } = rankedRack(member, ranking);
  return sizes[lit]?.size ?? null;
}

/** The same of a rack that has been rated. */
export function rank(member: Member, rack: Rack, ranking: Ranking): RankedRack {
  const { best, shop } = ranking;
  const needed = pieceLength(member);
  const front = markNonDominated(rack.sizes, (each) => depthOf(member, each.size));
  const sizes = rack.sizes.map((each, at): RankedSize => {
    const { size, weight, ratios, refused, passes, governing, worst } = each;
    const bought = shop === null ? null : buyPiece(shop, size, needed);
    const depth = depthOf(member, size);
    return {
      size,
      weight,
      ratios,
      refused,
      passes,
      governing,
      worst,
      depth,
      nonDominated: front[at]!,
      inYard: bought?.inYard == null ? null : bought.inYard && bought.length !== null,
      price: bought?.price == null ? null : bought.price * size.plies,
      clear: member.headroom == null ? null : clearHeight(member.headroom, depth),
      over: overDepth(member, sectionOf(member, size)),
    };
  });
  if (best !== 'weight') sizes.sort((a, b) => compare(measureOf(best, a), measureOf(best, b)));
  const lit = sizes.findIndex((each) => each.passes && each.inYard !== false);
  const lightestSize = rack.sizes[rack.lightest]?.size;
  const lightest = best === 'weight' ? rack.lightest : sizes.findIndex((each) => each.size === lightestSize);
  return { woods: rack.woods, sizes, best, lit, lightest };
}

function depthOf(member: Member, size: Size): number {
  return standingDepth(sectionOf(member, size));
}

/** What a choice has of what the user wants least of; null where that is not known. */
export function measureOf(
  best: Best,
  of: {
    readonly weight: number;
    readonly depth: number;
    readonly price: number | null;
  } & ({ readonly size: Size } | { readonly boardFeet: number | null }),
): number | null {
  switch (best) {
    case 'weight':
      return of.weight;
    case 'depth':
      return of.depth;
    case 'boardFeet':
      return 'boardFeet' in of ? of.boardFeet : of.size.boardFeet;
    case 'price':
      return of.price;
  }
}

/** Less first, what is not known last. */
export function compare(one: number | null, other: number | null): number {
  if (one === null || other === null) return one === other ? 0 : one === null ? 1 : -1;
  return one - other;
}
