import { slopedLength } from '../../loads/index.ts';
import { beamLength } from '../../statics/beam.ts';
import { boardFeet, isSawn, type Size } from '../../timber/index.ts';
import type { Member } from '../../timber/member.ts';
import { offerOf, type Piece, type Price, type Shop } from './yard.ts';

const FOOT = 12;

/** Length of one piece of a member, in: from end to end, half a bearing beyond the end supports, along the slope. */
export function pieceLength(member: Pick<Member, 'beam' | 'bearing' | 'slope'>): number {
  const { beam, bearing, slope } = member;
  const held = beam.supports === 'cantilever';
  const left = beam.overhangs.left === 0 ? bearing[0]! / 2 : 0;
  const right = held || beam.overhangs.right > 0 ? 0 : bearing[bearing.length - 1]! / 2;
  return slopedLength(slope, left + beamLength(beam) + right);
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
  const stocked: { lengths: readonly number[]; price: Price | null }[] = rows?.map(({ lengths, price }) => ({
    lengths,
    price: price ?? offer!.price,
  })) ?? [{ lengths: isSawn(piece.stock.product) ? USUAL_LENGTHS : [], price: offer?.price ?? null }];
  let length: number | null = null;
  let price: number | null = null;
  let longest: number | null = null;
  for (const row of stocked) {
    const fits = row.lengths.length === 0 ? needed : row.lengths.find((each) => each >= needed - ROUNDING);
    const last = row.lengths[row.lengths.length - 1];
    if (last !== undefined && last > (longest ?? 0)) longest = last;
    if (fits === undefined) continue;
    const cost = costOf(row.price, piece, fits);
    const shorter = length === null || fits < length;
    if (shorter || (fits === length && cost !== null && (price === null || cost < price))) {
      length = fits;
      price = cost;
    }
  }
  const inYard = rows === null ? null : rows.length > 0;
  return { inYard, length, longest, waste: length === null ? 0 : length - needed, price };
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
