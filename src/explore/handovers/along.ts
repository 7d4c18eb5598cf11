import { type Prepared, prepareLike, rate, type Size, sameStock, untiedUplift } from '../../timber/index.ts';
import type { Member, Section } from '../../timber/member.ts';
import { type CheckId, PASS_LIMIT, roomForRatios } from '../../timber/report.ts';
import { buyPiece, pieceLength, stockedLengths } from '../buying/buying.ts';
import { judge } from '../judge.ts';
import { overLimit } from '../limits.ts';
import type { Ranking } from '../rack/best.ts';
import { lotsOf } from '../rack/rack.ts';
import { compare, rankedRack } from '../rack/ranked.ts';

/** The rack at one value of a knob. */
export interface Reading {
  readonly value: number;
  /** Index into the sizes of the best that passes and can be had; -1 where none does. */
  readonly lit: number;
  /** Place of a size in the order of what is best. */
  place(index: number): number;
  /** Largest ratio of a size; Infinity where it does not count. */
  worst(index: number): number;
  /** Upward reaction of a size at a support that nothing holds down, lb: negative where it presses, -Infinity where nothing lifts. */
  lifting(index: number): number;
  /** Of one member of a size; null where it has no price or price does not count. */
  price(index: number): number | null;
}

/** The rack of one member, to be read at any value of a knob. */
export interface Along {
  readonly sizes: readonly Size[];
  read(value: number): Reading;
  /** Values between two at which the next stocked length has to be bought, each with one just beyond it. */
  steps(from: number, to: number): number[];
}

/** How a member takes a value of the knob. */
export type Put = (member: Member, value: number) => Member;

/**
 * Reads the rack along a knob. Sizes are rated in the order of what is best and only until one passes; the search
 * over loads is done once a value.
 */
export function alongOf(
  member: Member,
  put: Put,
  ranking: Ranking,
  only: readonly CheckId[] | null = null,
): Along {
  // By price the order goes with the length of the pieces, and what costs the same stands lightest first.
  const rack = rankedRack(member, ranking.best === 'price' ? { ...ranking, best: 'weight' } : ranking, only);
  const sizes = rack.sizes.map((each) => each.size);
  const lots = lotsOf(member, rack.woods);
  const lotOf = sizes.map((size) => rack.woods.findIndex((wood) => sameStock(wood, size.stock)));
  const sections = sizes.map(
    ({ width, depth, plies }): Section => ({ width, depth, plies, flat: member.section.flat }),
  );
  const shelf = shelfOf(sizes, ranking);
  const ratios = roomForRatios();

  const read = (value: number): Reading => {
    const changed = put(member, value);
    const prepared = new Map<Prepared, Prepared>();
    const { order, places, prices, has } = shelf(pieceLength(changed));
    const known = new Map<number, number>();
    const worst = (index: number): number => {
      const seen = known.get(index);
      if (seen !== undefined) return seen;
      const found = has(index) ? rated(index) : Number.POSITIVE_INFINITY;
      known.set(index, found);
      return found;
    };
    const loadsOn = (index: number): Prepared => {
      const lot = lots[lotOf[index]!]!;
      let here = prepared.get(lot.prepared);
      if (here === undefined) {
        here = prepareLike(lot.prepared, put(lot.member, value));
        prepared.set(lot.prepared, here);
      }
      return here;
    };
    const rated = (index: number): number => {
      const section = sections[index]!;
      const lot = lots[lotOf[index]!]!;
      if (overLimit(changed, section) !== null) return Number.POSITIVE_INFINITY;
      const here = loadsOn(index);
      rate(here, lot.wood, section, ratios);
      const judgement = judge(ratios, only);
      return here.loaded ? judgement.worst : Number.POSITIVE_INFINITY;
    };
    const lit = order.findIndex((index) => worst(index) <= PASS_LIMIT);
    return {
      value,
      lit: lit < 0 ? -1 : order[lit]!,
      place: (index) => places[index]!,
      worst,
      lifting: (index) => untiedUplift(loadsOn(index), rack.sizes[index]!.weight),
      price: (index) => prices?.[index] ?? null,
    };
  };
  const steps = (from: number, to: number): number[] => {
    if (ranking.shop === null) return [];
    const needed = (value: number) => pieceLength(put(member, value));
    const [least, most] = [needed(from), needed(to)];
    // The length of a piece goes evenly with any length of the beam, and with nothing else.
    return stockedLengths(ranking.shop)
      .filter((length) => (length - least) * (length - most) < 0)
      .map((length) => from + ((to - from) * (length - least)) / (most - least))
      .flatMap((value) => [value, value + JUST_BEYOND * Math.abs(value)]);
  };
  return { sizes, read, steps };
}

/** As a share of a value: nearer than handovers are told apart. */
const JUST_BEYOND = 5e-10;

/** The order in which sizes are looked at for pieces of one length, and whether each can be had. */
interface Shelf {
  /** Indices into the sizes. */
  readonly order: readonly number[];
  /** By size, its place in the order. */
  readonly places: readonly number[];
  /** By size, where the order goes by price. */
  readonly prices: readonly (number | null)[] | null;
  has(index: number): boolean;
}

/** Sizes come in the ranking's order at the member as it is; only prices and what can be had go with the length. */
function shelfOf(sizes: readonly Size[], { best, shop }: Ranking): (needed: number) => Shelf {
  const asIs = sizes.map((_, index) => index);
  if (shop === null) return () => ({ order: asIs, places: asIs, prices: null, has: () => true });
  let last: { readonly needed: number; readonly shelf: Shelf } | null = null;
  return (needed) => {
    if (last !== null && last.needed === needed) return last.shelf;
    const bought = sizes.map((size) => buyPiece(shop, size, needed));
    const has = (index: number) =>
      bought[index]!.inYard === null || (bought[index]!.inYard && bought[index]!.length !== null);
    let order = asIs;
    let prices: (number | null)[] | null = null;
    if (best === 'price') {
      const all = sizes.map(({ plies }, index) => {
        const each = bought[index]!.price;
        return each === null ? null : each * plies;
      });
      order = asIs.toSorted((a, b) => compare(all[a]!, all[b]!) || a - b);
      prices = all;
    }
    const places = new Array<number>(sizes.length);
    order.forEach((index, place) => {
      places[index] = place;
    });
    last = { needed, shelf: { order, places, prices, has } };
    return last.shelf;
  };
}
