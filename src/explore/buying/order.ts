import { boardFeet, sectionWeight, sizeLabel } from '../../timber/index.ts';
import type { Member, Stock } from '../../timber/member.ts';
import { buyPiece, pieceLength } from './buying.ts';
import type { Price, Shop } from './yard.ts';

const FOOT = 12;

/** What to buy for one member and those like it. */
export interface OrderLine {
  readonly member: string;
  /** One piece: "2x12". */
  readonly size: string;
  readonly stock: Stock;
  /** Plies times members. */
  readonly pieces: number;
  /** Length needed of each, in: from end to end, bearings included. */
  readonly needed: number;
  /** Length to order, in; null where none is stocked that long. */
  readonly length: number | null;
  /** Of each piece what is cut off, in. */
  readonly waste: number;
  /** A piece as ordered, lb. */
  readonly weight: number;
  /** All pieces as ordered; null for glulam and LVL. */
  readonly boardFeet: number | null;
  /** A piece; null where it has no price. */
  readonly price: number | null;
  /** What that goes by, and where it stands; null where it has no price. */
  readonly rate: Price | null;
  readonly priceFrom: PriceSource | null;
  /** Why it has none; null where it has one. */
  readonly unpriced: Unpriced | null;
  /** Longest length that is stocked, in, where none is long enough. */
  readonly longest: number | null;
}

/** The yard list, or the prices of woods that were typed beside it. */
export type PriceSource = 'yard' | 'prices';
export type Unpriced = 'no price' | 'not in the yard' | 'none long enough';

export interface Order {
  readonly lines: readonly OrderLine[];
  readonly pieces: number;
  /** lb */
  readonly weight: number;
  /** Share of the ordered length that is cut off. */
  readonly waste: number;
  /** Of the lines that have a price; null where none has. */
  readonly price: number | null;
  /** True where every line has a price, so that the price is that of the job. */
  readonly complete: boolean;
}

/** What to buy for members, each piece in one length from end to end. */
export function orderOf(members: readonly Member[], shop: Shop | null): Order {
  const lines = members.map((member) => orderLine(member, shop));
  const sum = (of: (line: OrderLine) => number) => lines.reduce((total, line) => total + of(line), 0);
  const ordered = sum((line) => line.pieces * (line.length ?? line.needed));
  const priced = lines.filter((line) => line.price !== null);
  return {
    lines,
    pieces: sum((line) => line.pieces),
    weight: sum((line) => line.pieces * line.weight),
    waste: ordered > 0 ? sum((line) => line.pieces * line.waste) / ordered : 0,
    price:
      priced.length === 0 ? null : priced.reduce((total, { pieces, price }) => total + pieces * price!, 0),
    complete: priced.length === lines.length,
  };
}

/** What to buy for one member and those like it: the same figures wherever they are told. */
export function orderLine(member: Member, shop: Shop | null): OrderLine {
  const { stock, section } = member;
  const piece = { ...section, plies: 1, flat: false };
  const needed = pieceLength(member);
  const { inYard, length, longest, waste, price, rate, priced } = buyPiece(
    shop,
    { ...section, stock },
    needed,
  );
  const pieces = section.plies * member.count;
  const ordered = length ?? needed;
  const feet = boardFeet(piece, stock.product);
  return {
    member: member.name,
    size: sizeLabel(piece, stock.product),
    stock,
    pieces,
    needed,
    length,
    waste,
    weight: sectionWeight(member, piece) * ordered,
    boardFeet: feet === null ? null : (feet * pieces * ordered) / FOOT,
    price,
    rate,
    priceFrom: price === null ? null : priced === null ? 'yard' : 'prices',
    unpriced: price === null ? unpricedBy(inYard, length) : null,
    longest: length === null ? longest : null,
  };
}

function unpricedBy(inYard: boolean | null, length: number | null): Unpriced {
  if (inYard === false) return 'not in the yard';
  return length === null ? 'none long enough' : 'no price';
}
