import { sizeLabel } from '../../timber/index.ts';
import type { Stock } from '../../timber/member.ts';
import type { Piece, Price, PriceRow } from './yard.ts';

/** The prices with one of a piece in its own wood; it stands before all others, so that it holds. */
export function withPiecePrice(prices: readonly PriceRow[], piece: Piece, price: Price): PriceRow[] {
  const { stock, width, depth } = piece;
  const size = sizeLabel({ width, depth, plies: 1, flat: false }, stock.product);
  const row = { size, ...woodOf(stock), price };
  return [row, ...prices.filter((each) => !isOfSame(each, row))];
}

/** The prices with one of a wood whatever its size: behind those of sizes, before all others of woods. */
export function withWoodPrice(prices: readonly PriceRow[], stock: Stock, price: Price): PriceRow[] {
  const row = { size: null, ...woodOf(stock), price };
  const others = prices.filter((each) => !isOfSame(each, row));
  const first = others.findIndex((each) => each.size === null);
  const at = first < 0 ? others.length : first;
  return [...others.slice(0, at), row, ...others.slice(at)];
}

function woodOf({ product, species, grade }: Stock): Pick<PriceRow, 'product' | 'species' | 'grade'> {
  return { product, species: species || null, grade: grade || null };
}

function isOfSame(one: PriceRow, other: PriceRow): boolean {
  return (
    one.size === other.size &&
    one.product === other.product &&
    one.species === other.species &&
    one.grade === other.grade
  );
}
