import type { Product, Stock } from './member.ts';
import { rowsOf } from './rows.ts';
import { GLULAM } from './tables/glulam.ts';
import { LVL } from './tables/lvl.ts';
import { SHORT_SPECIES, SP, WESTERN } from './tables/species.ts';

export { lookUp } from './look-up.ts';
export { type DesignValues, isRefusal, type Refusal } from './reference-values.ts';
export { checkStock, refusal, stockFault } from './refusal.ts';

/** Species that a product is listed in; LVL and custom have none. */
export function speciesOf(product: Product): string[] {
  if (product === 'glulam') return [WESTERN, SP];
  if (product === 'LVL' || product === 'custom') return [];
  return [...new Set(rowsOf(product).map((row) => row.species))];
}

/** Grades of a species (stress classes of glulam), in the order of the table. */
export function gradesOf(product: Product, species: string): string[] {
  if (product === 'custom') return [];
  if (product === 'LVL') return LVL.map((row) => row.grade);
  if (product === 'glulam') {
    return GLULAM.filter((row) => row.only === null || row.only === species).map((row) => row.grade);
  }
  return [
    ...new Set(
      rowsOf(product)
        .filter((row) => row.species === species)
        .map((row) => row.grade),
    ),
  ];
}

/** A species group in few letters, "DF-L", where the trade has them; its name where it has not. */
export function shortSpecies(species: string): string {
  return SHORT_SPECIES[species] ?? species;
}

const letters = (name: string) => name.toLowerCase().replace(/[^a-z0-9]/g, '');
const BY_LETTERS = new Map(
  Object.entries(SHORT_SPECIES).flatMap(([full, short]) => [
    [letters(full), full] as const,
    [letters(short), full] as const,
  ]),
);

/** A species group by its full name, where `name` is that or its short one in any writing; else null. */
export function speciesNamed(name: string): string | null {
  return BY_LETTERS.get(letters(name)) ?? null;
}

/** The wood in few letters: "DF-L No.2", "GL 24F-1.8E", "LVL typical 2.0E". */
export function shortWood(stock: Stock): string {
  const grade = stock.grade.replace('Select Structural', 'SS');
  if (stock.product === 'glulam') return `GL ${grade}`;
  if (stock.product === 'LVL') return /^(2\.0E)?$/i.test(grade) ? 'LVL typical 2.0E' : `LVL ${grade}`;
  return `${shortSpecies(stock.species)} ${grade}`.trim() || stock.product;
}
