import type { Member } from '../../timber/member.ts';

type Wood = Pick<Member, 'stock' | 'rack'>;

const KNOWN = new Map<string, Wood>();
/** A schedule has a few woods; more are forgotten and begun anew. */
const MOST = 500;

/**
 * The member with the very stock that an earlier row had, where it is the same wood in the same service: what the racks
 * keep for a stock is then worked out once and not for every row.
 */
export function knownWood(member: Member): Member {
  const { stock, rack, service } = member;
  const key = JSON.stringify([stock, rack, service]);
  const known = KNOWN.get(key);
  if (known !== undefined) return { ...member, ...known };
  if (KNOWN.size >= MOST) KNOWN.clear();
  KNOWN.set(key, rack === undefined ? { stock } : { stock, rack });
  return member;
}
