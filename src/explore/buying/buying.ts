import { slopedLength } from '../../loads/index.ts';
import { beamLength } from '../../statics/beam.ts';
import { boardFeet, isSawn, type Size } from '../../timber/index.ts';
import type { Member } from '../../timber/member.ts';
import { offerOf } from './offer.ts';
import type { Piece, Price, PriceRow, Shop, YardRow } from './yard.ts';

const FOOT = 12;

/** Length of one piece of a member, in: from end to end, half a bearing beyond the end supports, along the slope. */
export function pieceLength(member: Pick<Member, 'beam' | 'bearing' | 'slope'>): number {
  const { left, right } = beyondEnds(member);
  return slopedLength(member.slope, left + beamLength(member.beam) + right);
}

/** What a piece of a member has beyond its ends, in: half a bearing at an end support, else nothing. */
export function beyondEnds({ beam, bearing }: Pick<Member, 'beam' | 'bearing'>): {
  readonly left: number;
  readonly right: number;
} {
  const held = beam.supports === 'cantilever';
  return {
    left: beam.overhangs.left === 0 ? bearing[0]! / 2 : 0,
    right: held || beam.overhangs.right > 0 ? 0 : bearing[bearing.length - 1]! / 2,
  };
}

/** Lengths that sawn lumber comes in where no yard list says, ft; common practice, no source. */
const USUAL_FEET = [8, 10, 12, 14, 16, 18, 20, 22, 24];
const USUAL_LENGTHS = USUAL_FEET.map((feet) => feet * FOOT);

/** What buying one piece comes to. */
export interface Purchase {
  /** Whether the yard has the size; null where there is no yard list. */
  readonly inYard: boolean | null;
  /** in, the next stocked length; null where none is long enough. */
  readonly length: number | null;
  /** Longest length that is stocked, in; null where it is cut to any length or the yard has none. */
  readonly longest: number | null;
  /** Of the length bought what is not needed, in. */
  readonly waste: number;
  /** A piece; null where there is no price for it. */
  readonly price: number | null;
  /** What that goes by; null where there is no price. */
  readonly rate: Price | null;
  /** Line of the yard list that it is bought from; null where it is from none. */
  readonly line: YardRow | null;
  /** Line of the prices that it goes by; null where it goes by none of them. */
  readonly priced: PriceRow | null;
}

/** Floating-point slack on a sum of lengths, in. */
const ROUNDING = 1e-9;

/**
 * Buys one piece `needed` long, in: the shortest stocked length that does, the cheaper where two lines have it. Where
 * the yard's line names no length it is cut to what is needed. Without a yard list sawn lumber comes in even feet.
 */
export function buyPiece(shop: Shop | null, piece: Piece, needed: number): Purchase {
  const offer = shop === null ? null : offerOf(shop, piece);
  const rows = offer?.rows ?? null;
  const priced = offer?.priced ?? null;
  const usual = isSawn(piece.stock.product) ? USUAL_LENGTHS : [];
  let bought: Purchase = { ...NOTHING, inYard: rows === null ? null : rows.length > 0 };
  let longest: number | null = null;
  for (const line of rows ?? [null]) {
    const lengths = line?.lengths ?? usual;
    const fits = lengths.length === 0 ? needed : lengths.find((each) => each >= needed - ROUNDING);
    const last = lengths[lengths.length - 1];
    if (last !== undefined && last > (longest ?? 0)) longest = last;
    if (fits === undefined) continue;
    const rate = line?.price ?? priced?.price ?? null;
    const price = costOf(rate, piece, fits);
    const shorter = bought.length === null || fits < bought.length;
    const cheaper = price !== null && (bought.price === null || price < bought.price);
    if (!shorter && !(fits === bought.length && cheaper)) continue;
    const own = price !== null && line?.price == null ? priced : null;
    const waste = fits - needed;
    bought = { ...bought, length: fits, waste, price, rate: price === null ? null : rate, line, priced: own };
  }
  return { ...bought, longest };
}

const NOTHING: Omit<Purchase, 'inYard'> = {
  length: null,
  longest: null,
  waste: 0,
  price: null,
  rate: null,
  line: null,
  priced: null,
};

/** Every length that something in a shop is stocked in, in: where a longer piece takes another, its price steps. */
export function stockedLengths({ yard }: Shop): number[] {
  return [...new Set(yard === null ? USUAL_LENGTHS : yard.flatMap(({ lengths }) => lengths))];
}

function costOf(price: Price | null, { stock, width, depth }: Piece, length: number): number | null {
  if (price === null) return null;
  switch (price.per) {
    case 'piece':
      return price.amount;
    case 'foot':
      return (price.amount * length) / FOOT;
    case 'board foot': {
      const feet = boardFeet({ width, depth, plies: 1, flat: false }, stock.product);
      return feet === null ? null : (price.amount * feet * length) / FOOT;
    }
  }
}

/** Price of one member of a size, all its plies; null where some of it has none. */
export function memberPrice(
  shop: Shop | null,
  size: Omit<Size, 'label' | 'product' | 'boardFeet'>,
  needed: number,
): number | null {
  if (shop === null) return null;
  const { price } = buyPiece(shop, size, needed);
  return price === null ? null : price * size.plies;
}
