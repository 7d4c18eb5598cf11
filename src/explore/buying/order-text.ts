import { massNumber, showSpan, type Units } from '../../quantity/index.ts';
import { moneyText } from './money.ts';
import type { OrderLine } from './order.ts';

/** A line of an order as its columns show it; null where there is nothing to show. */
export interface OrderText {
  readonly pieces: string;
  /** `16'-0"` */
  readonly length: string | null;
  /** "13 %" of the length ordered. */
  readonly waste: string | null;
  /** A piece. */
  readonly weight: string;
  /** All pieces. */
  readonly boardFeet: string | null;
  /** A piece. */
  readonly price: string | null;
  /** All pieces. */
  readonly total: string | null;
}

export function orderText(line: OrderLine, units: Units): OrderText {
  const { pieces, length, waste, weight, boardFeet, price } = line;
  return {
    pieces: String(pieces),
    length: length === null ? null : showSpan(length, units),
    waste: length === null ? null : `${((100 * waste) / length).toFixed(0)} %`,
    weight: massNumber(weight, units),
    boardFeet: boardFeet === null ? null : boardFeet.toFixed(1),
    price: price === null ? null : moneyText(price),
    total: price === null ? null : moneyText(price * pieces),
  };
}

/** Why a line has no price: "none is stocked 16'-2" long; the longest is 16'-0"". Empty where it has one. */
export function unpricedText({ unpriced, needed, longest }: OrderLine, units: Units): string {
  if (unpriced !== 'none long enough') return unpriced ?? '';
  const most = longest === null ? '' : `; the longest is ${showSpan(longest, units)}`;
  return `none is stocked ${showSpan(needed, units)} long${most}`;
}
