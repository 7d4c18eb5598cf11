import { lookUp } from './look-up.ts';
import type { Member, Section } from './member.ts';
import { isRefusal } from './reference-values.ts';
import { ownWeight } from './weight.ts';

/** Own weight, lb/in, of a section of the member's stock; NaN where the stock has no values at that size. */
export function sectionWeight(member: Pick<Member, 'stock' | 'service'>, section: Section): number {
  const values = lookUp(member.stock, section);
  if (isRefusal(values)) return Number.NaN;
  return ownWeight(section.width * section.plies * section.depth, values.G, member.service);
}
