import { isComplete } from '../candidates.ts';
import type { Member, Product, Stock } from '../member.ts';
import { notchAllowed } from './notch.ts';
import type { Prepared } from './prepare.ts';
import type { Wood } from './wood.ts';

/** Products that may be incised (NDS 4.3.8). */
export function mayBeIncised(product: Product): boolean {
  return product === 'dimension lumber' || product === 'machine stress rated';
}

/** LVL is for dry use, unless the maker's report gives values for wet use, which are then typed (NDS 8.1.4). */
export function mayBeWet(stock: Stock): boolean {
  return stock.product !== 'LVL' || isComplete(stock);
}

/** Glulam laid flat bends about its weak axis, LVL about its own; their tables hold no Fb for that. */
export function mayLieFlat(stock: Stock): boolean {
  return (stock.product !== 'glulam' && stock.product !== 'LVL') || isComplete(stock);
}

/** Whether a rule forbids the wood at the size that it stands at; `refusal` says which. */
export function isForbidden({ deepestNotch }: Prepared, { conditions, at }: Wood): boolean {
  const { stock, service, incised } = conditions;
  if (deepestNotch > 0 && !notchAllowed(stock.product, at.d, deepestNotch)) return true;
  if (incised && !mayBeIncised(stock.product)) return true;
  if (service === 'wet' && !mayBeWet(stock)) return true;
  return at.flat && !mayLieFlat(stock);
}

/** Why the conditions of a member forbid its stock whatever the size; null when they do not. */
export function conditionRefusal(member: Member): string | null {
  const { stock } = member;
  if (member.incised && !mayBeIncised(stock.product)) {
    const clause =
      stock.product === 'glulam'
        ? 'NDS 5.3, Table 5.3.1'
        : stock.product === 'LVL'
          ? 'NDS Table 8.3.1'
          : 'NDS 4.3.8';
    return `incised: ${stock.product} has no incising factor, only dimension lumber may be incised: ${clause}`;
  }
  if (member.service === 'wet' && !mayBeWet(stock)) {
    return 'wet: LVL is for dry use (under 16 % moisture) unless the maker’s report says otherwise: NDS 8.1.4; type its values then';
  }
  if (member.section.flat && !mayLieFlat(stock)) {
    const clause = stock.product === 'glulam' ? 'Fby, NDS 5.2, Table 5A' : 'the maker’s report, NDS 8.2';
    return `flat: ${stock.product} laid flat needs its values about the weak axis typed (${clause})`;
  }
  return null;
}
