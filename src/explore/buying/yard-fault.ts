import { gradesOf, isSawn, rackSizes, shortSpecies, speciesNamed, speciesOf } from '../../timber/index.ts';
import { PRODUCTS, type Product, type Stock } from '../../timber/member.ts';
import { nearestName } from '../../timber/nearest-name.ts';
import type { YardRow } from './yard.ts';
import { gradeKey, isOfSpecies, measured, sizeKey } from './yard-names.ts';

/** What a line of a yard list says that nothing on a rack can be. */
export interface YardFault {
  readonly key: 'size' | 'species' | 'grade' | 'price';
  /** What is wrong and the way out. */
  readonly reason: string;
}

/**
 * Finds the first thing in a line that no wood goes by: a size that is not made, a species or grade that is neither in
 * the tables nor among `woods`, those of the job, or a price by the board foot of what is not counted so.
 */
export function yardChecker(woods: readonly Stock[]): (row: YardRow) => YardFault | null {
  // A list repeats few woods and sizes on many lines.
  const sound = new Set<string>();
  const unlessSound = (key: string, find: () => YardFault | null): YardFault | null => {
    if (sound.has(key)) return null;
    const fault = find();
    if (fault === null) sound.add(key);
    return fault;
  };
  return (row) => {
    const products = productsOf(row);
    const named = products.join();
    return (
      unlessSound(`${row.product} ${row.size}`, () => sizeFault(row, products)) ??
      boardFootFault(row, products) ??
      unlessSound(`${named}; ${row.species}; ${row.grade}`, () => woodFault(row, products, woods))
    );
  };
}

/** The products that a line may be of: the one it names, or those that its size is made in. */
function productsOf({ product, size }: YardRow): readonly Product[] {
  if (product !== null) return [product];
  const prefix = /^(gl|lvl)/.exec(sizeKey(size))?.[1];
  if (prefix !== undefined) return [prefix === 'gl' ? 'glulam' : 'LVL'];
  return PRODUCTS.filter(isSawn);
}

function sizeFault({ size, product }: YardRow, products: readonly Product[]): YardFault | null {
  const sides = measured(size);
  if (sides !== null) {
    return sides.every((side) => side > 0)
      ? null
      : { key: 'size', reason: `"${size}" has a side of nothing` };
  }
  if (product === 'custom') {
    return { key: 'size', reason: `"${size}" is no size; write its measure, as 3 x 8 in` };
  }
  const labels = products.flatMap(labelsOf);
  const bare = (label: string) => sizeKey(label.replace(/^(GL|LVL) /, ''));
  const wanted = sizeKey(size);
  if (labels.some((label) => sizeKey(label) === wanted || (product !== null && bare(label) === wanted))) {
    return null;
  }
  // The list is of single pieces, whatever is built up of them.
  const near = nearestName(size.replace(/^\(\d+\) */, ''), labels);
  const nearest = near === null ? '' : `the nearest is "${near}"; `;
  return {
    key: 'size',
    reason: `"${size}" is not made: ${nearest}one off the stock is written by its measure, as 1.5 x 11 in`,
  };
}

const LABELS = new Map<Product, readonly string[]>();

/** Every size of one piece that a product comes in, whatever its wood. */
function labelsOf(product: Product): readonly string[] {
  let labels = LABELS.get(product);
  if (labels === undefined) {
    const woods = product === 'LVL' ? [''] : speciesOf(product);
    const sizes = woods.flatMap((species) =>
      gradesOf(product, species).flatMap((grade) => rackSizes(product, species, grade)),
    );
    labels = [...new Set(sizes.filter(({ plies }) => plies === 1).map(({ label }) => label))];
    LABELS.set(product, labels);
  }
  return labels;
}

function boardFootFault({ price }: YardRow, products: readonly Product[]): YardFault | null {
  if (price?.per !== 'board foot' || products.some(isSawn)) return null;
  return {
    key: 'price',
    reason: `${products[0]} is not counted in board feet; give the price of a piece or of a foot`,
  };
}

function woodFault(
  { species, grade }: YardRow,
  products: readonly Product[],
  woods: readonly Stock[],
): YardFault | null {
  if (products.includes('custom')) return null;
  const known = [...knownWoods(products), ...woods.filter(({ product }) => products.includes(product))];
  const ofSpecies = known.filter((wood) => species === null || isOfSpecies(wood, species));
  if (species !== null && ofSpecies.length === 0) {
    const names = [...new Set(known.map((wood) => wood.species))];
    return { key: 'species', reason: unknown(species, [...names, ...names.map(shortSpecies)]) };
  }
  // The grades of LVL are its makers' own.
  if (grade === null || products.includes('LVL')) return null;
  const grades = [...new Set(ofSpecies.map((wood) => wood.grade))];
  if (grades.some((name) => gradeKey(name) === gradeKey(grade))) return null;
  return { key: 'grade', reason: unknown(grade, grades) };
}

/** One wood of every species and grade in the tables of these products. */
function knownWoods(products: readonly Product[]): Stock[] {
  return products.flatMap((product) =>
    speciesOf(product).flatMap((species) =>
      gradesOf(product, species).map(
        (grade): Stock => ({ product, species, grade, values: null, valuesFrom: null }),
      ),
    ),
  );
}

function unknown(name: string, known: readonly string[]): string {
  const near = nearestName(name, known);
  const list = known.length === 0 ? '' : `known are ${known.join(', ')}; `;
  const instead = near === null ? list : `the nearest known one is "${near}"; `;
  return `"${name}" is not known here; ${instead}leave it empty for any`;
}

/** Two lines of a yard list that sell the same piece in the same length, by their places; null where there are none. */
export function doubleIn(rows: readonly YardRow[]): { readonly at: number; readonly of: number } | null {
  const seen = new Map<string, number>();
  for (const [at, { size, product, species, grade, lengths }] of rows.entries()) {
    const named = species === null ? null : (speciesNamed(species) ?? species.toLowerCase());
    const wood = [product, named, grade === null ? null : gradeKey(grade)];
    for (const length of lengths.length === 0 ? ['any'] : lengths) {
      const key = [sizeKey(size), ...wood, length].join('|');
      const of = seen.get(key);
      if (of !== undefined) return { at, of };
      seen.set(key, at);
    }
  }
  return null;
}
