import { writeQuantity } from '../../quantity/index.ts';
import { type Member, STOCK_VALUES, type Stock } from '../../timber/member.ts';

/** What to put on the command line as --set to get from one wood to another; nothing where they are the same. */
export function stockSets(from: Member, to: Member): string[] {
  return from.stock === to.stock ? [] : [`stock=${JSON.stringify(written(to.stock))}`];
}

/** Values without a unit. */
const PLAIN: readonly string[] = ['G', 'COV'];

/** A stock as the session file writes it. */
function written({ product, species, grade, values, valuesFrom }: Stock): Record<string, unknown> {
  const own: Record<string, unknown> = { product };
  if (species !== '') own.species = species;
  if (grade !== '') own.grade = grade;
  if (values === null) return own;
  const given = STOCK_VALUES.filter((key) => values[key] !== undefined);
  own.values = Object.fromEntries(
    given.map((key) => [
      key,
      PLAIN.includes(key) ? values[key] : writeQuantity('stress', values[key]!, 'us'),
    ]),
  );
  own.valuesFrom = valuesFrom;
  return own;
}
