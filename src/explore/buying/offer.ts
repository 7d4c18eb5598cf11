import { isSawn, sizeLabel } from '../../timber/index.ts';
import type { Stock } from '../../timber/member.ts';
import type { Piece, PriceRow, Shop, YardRow } from './yard.ts';
import { gradeKey, isOfSpecies, measured, SAME_SIZE, sizeKey } from './yard-names.ts';

/** The lines of the yard list that are this piece, and those of the prices. */
export interface Offer {
  /** null: there is no yard list. */
  readonly rows: readonly YardRow[] | null;
  /** The first that fits; null where none does. */
  readonly priced: PriceRow | null;
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
    const { yard, prices } = shop;
    offer = {
      rows: yard === null ? null : rowsOf(yard, piece),
      priced: rowsOf(prices, piece)[0] ?? null,
    };
    ofStock.set(key, offer);
  }
  return offer;
}

type Named = Pick<PriceRow, 'size' | 'product' | 'species' | 'grade'>;

/** A line with its names in the writing that they are compared by. */
interface Readied<Row extends Named> {
  readonly row: Row;
  /** Its place among the lines. */
  readonly at: number;
  readonly size: string | null;
  /** in; null for a nominal size. */
  readonly sides: readonly [number, number] | null;
  readonly grade: string | null;
}

/**
 * The lines by the size that they name, as a long list is looked through for every size of a rack; under null those that
 * name none or its measure.
 */
type Shelves<Row extends Named> = ReadonlyMap<string | null, readonly Readied<Row>[]>;

const SHELVES = new WeakMap<readonly Named[], Shelves<Named>>();

function shelvesOf<Row extends Named>(rows: readonly Row[]): Shelves<Row> {
  const known = SHELVES.get(rows) as Shelves<Row> | undefined;
  if (known !== undefined) return known;
  const shelves = new Map<string | null, Readied<Row>[]>();
  for (const [at, row] of rows.entries()) {
    const size = row.size === null ? null : sizeKey(row.size);
    const sides = row.size === null ? null : measured(row.size);
    const line = { row, at, size, sides, grade: row.grade === null ? null : gradeKey(row.grade) };
    const name = sides === null ? size : null;
    const shelf = shelves.get(name);
    if (shelf === undefined) shelves.set(name, [line]);
    else shelf.push(line);
  }
  SHELVES.set(rows, shelves);
  return shelves;
}

/** The lines that are a piece, in their order. */
function rowsOf<Row extends Named>(rows: readonly Row[], { stock, width, depth }: Piece): Row[] {
  const label = sizeLabel({ width, depth, plies: 1, flat: false }, stock.product);
  const own = sizeKey(label);
  const bare = sizeKey(label.replace(/^(GL|LVL) /, ''));
  const grade = gradeKey(stock.grade);
  // A size in actual measure, or none at all, names no product: that of engineered wood has to be said.
  const saysEnough = (row: Named) => row.product !== null || isSawn(stock.product);
  const isOfSize = ({ row, size, sides }: Readied<Named>): boolean => {
    if (size === null) return saysEnough(row);
    if (size === own || (row.product !== null && size === bare)) return true;
    return (
      sides !== null &&
      saysEnough(row) &&
      Math.abs(sides[0] - width) <= SAME_SIZE &&
      Math.abs(sides[1] - depth) <= SAME_SIZE
    );
  };
  const shelves = shelvesOf(rows);
  return [...new Set([own, bare, null])]
    .flatMap((name) => shelves.get(name) ?? [])
    .filter((line) => {
      const { product, species } = line.row;
      if (product !== null && product !== stock.product) return false;
      if (line.grade !== null && line.grade !== grade) return false;
      return isOfSize(line) && (species === null || isOfSpecies(stock, species));
    })
    .sort((one, other) => one.at - other.at)
    .map(({ row }) => row);
}
