import { sameStock, stockNameFault } from '../../timber/index.ts';
import type { Member, Stock } from '../../timber/member.ts';
import type { Turn } from '../knobs/knob.ts';

/** Woods on one rack at most; the session file's bound. */
const MOST_WOODS = 16;

/** True where a wood was asked to stand on the member's rack. */
export function isOnRack(member: Member, stock: Stock): boolean {
  return (member.rack ?? []).some((each) => sameStock(each, stock));
}

/**
 * The member with its wood put on the rack, or taken off where it stands there. The first that is put there keeps
 * company with `before`, the wood that the beam is of so far.
 */
export function toggleOnRack(member: Member, before: Stock): Turn {
  const { stock } = member;
  if (isOnRack(member, stock)) return { member: offRack(member, stock) };
  if (stock.product === 'custom')
    return { fault: 'a custom product has no stock sizes to stand on the rack' };
  const fault = stockNameFault(stock);
  if (fault !== null) return { fault: fault.reason };
  const company = sameStock(before, stock) || before.product === 'custom' ? [] : [before];
  const rack = [...(member.rack ?? company), stock];
  return rack.length > MOST_WOODS
    ? { fault: `a rack holds ${MOST_WOODS} woods at most` }
    : { member: { ...member, rack } };
}

/** The member with a wood taken off its rack; its own stays there all the same. */
export function offRack(member: Member, stock: Stock): Member {
  const rack = (member.rack ?? []).filter((each) => !sameStock(each, stock));
  return { ...member, rack: rack.length === 0 ? null : rack };
}

/** The member without a rack that holds nothing but its own wood. */
export function tidyRack(member: Member): Member {
  const { rack, stock } = member;
  if (rack == null || rack.some((each) => !sameStock(each, stock))) return member;
  return { ...member, rack: null };
}
