import { STOCK_VALUES, type Stock } from '../timber/member.ts';
import { keeper, present, type Raw, rawAt } from './keep.ts';

/** Values that are plain numbers, without a unit. */
export const WITHOUT_UNIT: readonly string[] = ['G', 'COV'];

/** The `stock` object of a member, as writeMember says. `stress` writes a stress. */
export function writeStock(
  stock: Stock,
  raw: unknown,
  before: Stock | undefined,
  stress: (value: number) => string,
): Raw {
  const of = keeper(raw, before, stock);
  const value = keeper(rawAt(raw, 'values'), before?.values ?? undefined, stock.values ?? {});
  const values = STOCK_VALUES.map((key) => [
    key,
    value(key, undefined, (now) => {
      if (now === undefined || WITHOUT_UNIT.includes(key)) return now;
      return stress(now);
    }),
  ]);
  return present({
    product: of('product', undefined),
    species: of('species', ''),
    grade: of('grade', ''),
    values: stock.values === null ? undefined : present(Object.fromEntries(values)),
    valuesFrom: of('valuesFrom', null, (now) => now ?? undefined),
  });
}
