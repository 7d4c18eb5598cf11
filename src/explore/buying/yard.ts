import { parseQuantity } from '../../quantity/index.ts';
import { isSawn, shortSpecies, sizeLabel } from '../../timber/index.ts';
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

/** The lines of the yard list that are this piece, and those of the prices. */
export interface Offer {
  /** null: there is no yard list. */
  readonly rows: readonly YardRow[] | null;
  readonly price: Price | null;
}

const FOUND = new WeakMap<Shop, WeakMap<Stock, Map<string, Offer>>>();

/** What a shop has of a piece; found once. */
export function offerOf(shop: Shop, piece: Piece): Offer {
  const ofShop = FOUND.get(shop) ?? new WeakMap<Stock, Map<string, Offer>>();
  FOUND.set(shop, ofShop);
  const ofStock = ofShop.get(piece.stock) ?? new Map<string, Offer>();
  ofShop.set(piece.stock, ofStock);
  const key = `${piece.width}x${piece.depth}`;
  let offer = ofStock.get(key);
  if (offer === undefined) {
    const matches = matcherOf(piece);
    offer = {
      rows: shop.yard?.filter(matches) ?? null,
      price: shop.prices.find(matches)?.price ?? null,
    };
    ofStock.set(key, offer);
  }
  return offer;
}

type Named = Pick<PriceRow, 'size' | 'product' | 'species' | 'grade'>;

function matcherOf({ stock, width, depth }: Piece): (row: Named) => boolean {
  const label = sizeLabel({ width, depth, plies: 1, flat: false }, stock.product);
  const own = sizeKey(label);
  const bare = sizeKey(label.replace(/^(GL|LVL) /, ''));
  const species = [nameKey(stock.species), nameKey(shortSpecies(stock.species))];
  const grade = gradeKey(stock.grade);
  return (row) => {
    if (row.product !== null && row.product !== stock.product) return false;
    if (row.species !== null && !species.includes(nameKey(row.species))) return false;
    if (row.grade !== null && gradeKey(row.grade) !== grade) return false;
    if (row.size === null) return row.product !== null || isSawn(stock.product);
    const named = sizeKey(row.size);
    if (named === own || (row.product !== null && named === bare)) return true;
    const sides = measured(row.size);
    // A size in actual measure names no product: that of engineered wood has to be said.
    return (
      sides !== null &&
      (row.product !== null || isSawn(stock.product)) &&
      Math.abs(sides[0] - width) <= SAME_SIZE &&
      Math.abs(sides[1] - depth) <= SAME_SIZE
    );
  };
}

/** Half a millimetre, in: a size in whole millimetres is the same piece as the one in inches. */
const SAME_SIZE = 0.5 / 25.4;

/** "1.5 x 11.25 in", "38x286 mm" as inches; null for a nominal size. */
function measured(size: string): readonly [number, number] | null {
  const parts = /^\s*([\d.]+)\s*(?:in|mm|")?\s*[x×]\s*([\d.]+)\s*(in|mm|")\s*$/i.exec(size);
  if (parts === null) return null;
  const side = (text: string) => parseQuantity('length', `${text} ${parts[3]}`);
  const [width, depth] = [side(parts[1]!), side(parts[2]!)];
  return width.ok && depth.ok ? [width.value, depth.value] : null;
}

/** "GL 5 1/8 × 15" and "gl 5-1/8x15" alike. */
function sizeKey(size: string): string {
  return size
    .toLowerCase()
    .replace(/×/g, 'x')
    .replace(/(\d)[ -]+(?=\d+\/)/g, '$1-')
    .replace(/[\s"]/g, '');
}

function nameKey(name: string): string {
  return name.toLowerCase().replace(/[^a-z0-9]/g, '');
}

/** "No. 2", "#2" and "No.2" alike; "SS" is Select Structural. */
function gradeKey(grade: string): string {
  const plain = nameKey(grade.replace(/#\s*/g, 'no'));
  return plain === 'ss' || plain === 'selstr' ? 'selectstructural' : plain;
}
