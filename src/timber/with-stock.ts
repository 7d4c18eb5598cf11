import type { Member, Product, Stock, StockValue } from './member.ts';

/** Timbers are built in green unless somebody says otherwise (domain: total deflection), all else dry. */
export function seasonedByDefault(stock: { readonly product: Product }): boolean {
  return stock.product !== 'timber';
}

/**
 * The member of another wood. Where nobody stated whether the wood is seasoned, what is assumed goes with the product.
 * The size stays: whether the wood comes in it is the caller's to see. The woods on the rack stay as they are.
 */
export function withStock(member: Member, stock: Stock): Member {
  if (stock === member.stock) return member;
  const seasoned = member.assumed.includes('seasoned') ? seasonedByDefault(stock) : member.seasoned;
  return { ...member, stock, seasoned };
}

/** The woods that stand on a member's rack: those asked for, its own always among them, each once. */
export function woodsOf(member: Member): readonly Stock[] {
  const asked = member.rack ?? [];
  const woods: Stock[] = asked.some((stock) => sameStock(stock, member.stock)) ? [] : [member.stock];
  for (const stock of asked) if (!woods.some((each) => sameStock(each, stock))) woods.push(stock);
  return woods;
}

/** Whether two stocks are the same wood with the same values. */
export function sameStock(one: Stock, other: Stock): boolean {
  if (one === other) return true;
  if (one.product !== other.product || one.species !== other.species || one.grade !== other.grade)
    return false;
  const [mine, theirs] = [one.values ?? {}, other.values ?? {}];
  const keys = Object.keys(mine) as StockValue[];
  return keys.length === Object.keys(theirs).length && keys.every((key) => mine[key] === theirs[key]);
}
