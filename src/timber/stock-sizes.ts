import { candidateAt, candidatesOf, glulamGroup } from './candidates.ts';
import type { Product, Section, Stock } from './member.ts';
import { DRESSED, nominalUp, SIZE_TOLERANCE, TIMBER_DRESSING } from './nominal.ts';
import { isRefusal } from './reference-values.ts';
import { sizeLabel } from './size-label.ts';
import { isSawn } from './standing.ts';
import { SP } from './tables/species.ts';

export { sizeLabel } from './size-label.ts';

/** A stock size on the rack. */
export interface Size {
  readonly label: string;
  readonly product: Product;
  /** The wood that the rack is of. */
  readonly stock: Stock;
  /** Width of one ply, in. */
  readonly width: number;
  /** in */
  readonly depth: number;
  readonly plies: number;
  /** Per foot; null for glulam and LVL. */
  readonly boardFeet: number | null;
}

/** Widths of pieces of one product that share their depths. */
interface Shelf {
  /** Width of a piece, in. */
  readonly width: number;
  /** in, rising */
  readonly depths: readonly number[];
  readonly mostPlies: number;
}

const MOST_PLIES = 4;

/** Dressed depths of the nominal ones from 4 in up to `deepest`, in. */
const depthsTo = (deepest: number) =>
  DRESSED.filter(([nominal]) => nominal >= 4 && nominal <= deepest && nominal !== 5).map(
    ([, dressed]) => dressed,
  );

const TWO_INCH: readonly Shelf[] = [{ width: 1.5, depths: depthsTo(14), mostPlies: MOST_PLIES }];
const LUMBER: readonly Shelf[] = [
  ...TWO_INCH,
  { width: 2.5, depths: depthsTo(14), mostPlies: 1 },
  { width: 3.5, depths: depthsTo(16), mostPlies: 1 },
];

/** NDS Supplement Table 1B: 5x5, then even nominal sizes, on edge. */
const DEEPEST_TIMBER = 24;
const TIMBERS: readonly Shelf[] = [5, 6, 8, 10, 12].map((nominal) => {
  const depths: number[] = [];
  const deepest = nominal === 5 ? 5 : DEEPEST_TIMBER;
  for (let depth = nominal; depth <= deepest; depth += 2) depths.push(depth - TIMBER_DRESSING);
  return { width: nominal - TIMBER_DRESSING, depths, mostPlies: 1 };
});

const SHALLOWEST_GLULAM = 6;
const DEEPEST_GLULAM = 48;

function glulamShelves(widths: readonly number[], lamination: number): Shelf[] {
  const depths: number[] = [];
  for (let count = 1; count * lamination <= DEEPEST_GLULAM; count += 1) {
    if (count * lamination >= SHALLOWEST_GLULAM) depths.push(count * lamination);
  }
  return widths.map((width) => ({ width, depths, mostPlies: 1 }));
}

const WESTERN_GLULAM = glulamShelves([3.125, 5.125, 6.75, 8.75, 10.75, 12.25], 1.5);
const PINE_GLULAM = glulamShelves([3, 5, 6.75, 8.5, 10.5], 1.375);

const LVL: readonly Shelf[] = [
  { width: 1.75, depths: [7.25, 9.25, 9.5, 11.25, 11.875, 14, 16, 18, 20, 24], mostPlies: MOST_PLIES },
];

function shelvesOf(stock: Stock): readonly Shelf[] {
  switch (stock.product) {
    case 'dimension lumber':
      return LUMBER;
    case 'machine stress rated':
      return TWO_INCH;
    case 'timber':
      return TIMBERS;
    case 'glulam':
      return glulamGroup(stock) === SP ? PINE_GLULAM : WESTERN_GLULAM;
    case 'LVL':
      return LVL;
    case 'custom':
      return [];
  }
}

const KNOWN = new WeakMap<Stock, readonly Size[]>();

/**
 * The rack of a stock: sizes that its table covers, lightest first, then shallower, then fewer plies. A stock is never
 * changed: its rack is made once.
 */
export function rackSizesOf(stock: Stock): readonly Size[] {
  let known = KNOWN.get(stock);
  if (known === undefined) {
    known = makeRackSizes(stock);
    KNOWN.set(stock, known);
  }
  return known;
}

function makeRackSizes(stock: Stock): Size[] {
  const candidates = candidatesOf(stock);
  if (isRefusal(candidates)) return [];
  const { product } = stock;
  const sizes: Size[] = [];
  for (const { width, depths, mostPlies } of shelvesOf(stock)) {
    for (const depth of depths) {
      for (let plies = 1; plies <= mostPlies; plies += 1) {
        const section: Section = { width, depth, plies, flat: false };
        if (candidateAt(candidates, product, section) < 0) break;
        sizes.push({
          label: sizeLabel(section, product),
          product,
          stock,
          width,
          depth,
          plies,
          boardFeet: boardFeet(section, product),
        });
      }
    }
  }
  return sizes.sort(byWeight);
}

/** The rack of a grade whose values are all the table's. */
export function rackSizes(product: Product, species: string, grade: string): readonly Size[] {
  return rackSizesOf({ product, species, grade, values: null, valuesFrom: null });
}

function byWeight(one: Size, other: Size): number {
  const area = (size: Size) => size.width * size.depth * size.plies;
  return area(one) - area(other) || one.depth - other.depth || one.plies - other.plies;
}

/** Board feet in a foot of length: nominal thickness x nominal depth / 12, sawn only; else null. */
export function boardFeet(section: Section, product: Product): number | null {
  if (!isSawn(product)) return null;
  const nominal =
    product === 'timber' ? (size: number) => Math.ceil(size + TIMBER_DRESSING - SIZE_TOLERANCE) : nominalUp;
  return (nominal(section.width) * nominal(section.depth) * section.plies) / 12;
}

/** Widths of one piece that a stock comes in, in, rising; none for custom. */
export function stockWidths(stock: Stock): number[] {
  return shelvesOf(stock).map(({ width }) => width);
}

/** Depths that a piece of this width comes in, in, rising; for a width off the stock those of all widths. */
export function stockDepths(stock: Stock, width: number): number[] {
  const shelves = shelvesOf(stock);
  const own = shelves.filter((shelf) => Math.abs(shelf.width - width) <= SIZE_TOLERANCE);
  const depths = (own.length > 0 ? own : shelves).flatMap((shelf) => shelf.depths);
  const candidates = candidatesOf(stock);
  const covered = (depth: number) =>
    !isRefusal(candidates) &&
    candidateAt(candidates, stock.product, { width, depth, plies: 1, flat: false }) >= 0;
  return [...new Set(depths)].filter(covered).sort((one, other) => one - other);
}

/** The next stock depth above (`by` 1) or below (-1) a depth, in; null at the end of the stock. */
export function nextStockDepth(stock: Stock, width: number, depth: number, by: 1 | -1): number | null {
  return nextOf(stockDepths(stock, width), depth, by);
}

/** The next stock width of one piece above or below a width, in; null at the end of the stock. */
export function nextStockWidth(stock: Stock, width: number, by: 1 | -1): number | null {
  return nextOf(stockWidths(stock), width, by);
}

function nextOf(sizes: readonly number[], from: number, by: 1 | -1): number | null {
  const beyond = sizes.filter((size) =>
    by > 0 ? size > from + SIZE_TOLERANCE : size < from - SIZE_TOLERANCE,
  );
  return (by > 0 ? beyond[0] : beyond[beyond.length - 1]) ?? null;
}

/** Plies that a stock is built up of at most: 1 for what comes in one piece; of a width off the stock the most of all. */
export function mostPlies(stock: Stock, width: number): number {
  if (stock.product === 'custom') return MOST_PLIES;
  const shelves = shelvesOf(stock);
  const own = shelves.find((shelf) => Math.abs(shelf.width - width) <= SIZE_TOLERANCE);
  return own?.mostPlies ?? Math.max(...shelves.map((shelf) => shelf.mostPlies));
}
