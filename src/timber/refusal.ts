import { candidateAt, candidatesOf, sizesCovered } from './candidates.ts';
import { conditionRefusal } from './checks/forbidden.ts';
import { notchRefusal } from './checks/notch.ts';
import { candidateFor } from './look-up.ts';
import type { FactorSymbol, Member, Section, Stock, TypedFactors } from './member.ts';
import { isRefusal } from './reference-values.ts';
import { standingDepth } from './standing.ts';

/** What is wrong with a member's wood, and the key of the session file it is wrong at. */
export interface StockFault {
  readonly path: string;
  readonly reason: string;
}

/** Why a rule forbids a section for a member, with the clause; null when none does. */
export function refusal(member: Member, section: Section = member.section): string | null {
  return stockFault(section === member.section ? member : { ...member, section })?.reason ?? null;
}

/** The same for the member's own section: null, or one line with the nearest known name or the clause. */
export function checkStock(member: Member): string | null {
  return stockFault(member)?.reason ?? null;
}

/** What is newly wrong with a changed member's wood; null where nothing is, or where something was before. */
export function checkChange(changed: Member, before: Member): string | null {
  const fault = checkStock(changed);
  return fault === null || checkStock(before) !== null ? null : fault;
}

/** The first fault of a member's stock, conditions and size; null when there is none. */
export function stockFault(member: Member): StockFault | null {
  const { stock, section } = member;
  const name = stockNameFault(stock);
  if (name !== null) return name;
  const found = candidateFor(stock, section);
  if (isRefusal(found)) return { path: 'section', reason: found.refused };
  const condition = conditionRefusal(member);
  if (condition !== null) return { path: condition.slice(0, condition.indexOf(':')), reason: condition };
  const factor = factorFault(member.typedFactors ?? null);
  if (factor !== null) return factor;
  const notch = notchRefusal(member, standingDepth(section));
  return notch === null ? null : { path: 'notch', reason: notch };
}

/** Why a stock has no design values at any size; null where it has some. */
export function stockNameFault(stock: Stock): StockFault | null {
  const known = candidatesOf(stock);
  return isRefusal(known) ? { path: pathOf(known.refused), reason: known.refused } : null;
}

/** `refusal` for many sections of one member, laid as it is: what does not depend on the size is found once. */
export function refuserOf(member: Member): (section: Section) => string | null {
  const { stock, notch } = member;
  const known = candidatesOf(stock);
  if (isRefusal(known)) return () => known.refused;
  const always = conditionRefusal(member) ?? factorFault(member.typedFactors ?? null)?.reason ?? null;
  const notched = notch.left > 0 || notch.right > 0;
  return (section) => {
    if (candidateAt(known, stock.product, section) < 0) return sizesCovered(known, stock, section);
    if (always !== null) return always;
    return notched ? notchRefusal(member, standingDepth(section)) : null;
  };
}

/** The key that a refused look-up is about. */
function pathOf(refused: string): string {
  if (/^no /.test(refused)) return 'stock.species';
  return /typed|values/.test(refused) ? 'stock.values' : 'stock.grade';
}

function factorFault(typed: TypedFactors | null): StockFault | null {
  for (const symbol of Object.keys(typed ?? {}) as FactorSymbol[]) {
    const { value, reason } = typed![symbol]!;
    const path = `factors.${symbol}`;
    if (!(Number.isFinite(value) && value > 0))
      return { path, reason: `typed ${symbol} must be more than 0` };
    if (!reason.trim()) return { path, reason: `typed ${symbol} needs the reason for its value` };
  }
  return null;
}
