import type { Product, Stock } from '../../timber/member.ts';

/** One line of a yard list. */
export interface YardRow {
  /** One piece, as the yard writes it: "2x12", "GL 5-1/8x15", "38x286 mm". */
  readonly size: string;
  /** null: by the size's name alone. */
  readonly product: Product | null;
  /** null: any. */
  readonly species: string | null;
  readonly grade: string | null;
  /** in, rising; empty: cut to any length. */
  readonly lengths: readonly number[];
  readonly price: Price | null;
}

/** What a wood costs whatever its size, where the yard list does not say. */
export interface PriceRow extends Omit<YardRow, 'size' | 'lengths' | 'price'> {
  /** null: any. */
  readonly size: string | null;
  readonly price: Price;
}

/** Money, in whatever the list is written in. */
export interface Price {
  readonly amount: number;
  readonly per: 'piece' | 'foot' | 'board foot';
}

/** What there is to buy. Never changed: what is found in it is kept. */
export interface Shop {
  /** null: no yard list, so nothing is known of what is in stock. */
  readonly yard: readonly YardRow[] | null;
  readonly prices: readonly PriceRow[];
}

/** One piece to look for, in. */
export interface Piece {
  readonly stock: Stock;
  readonly width: number;
  readonly depth: number;
}
