import { standingWidth } from '../timber/index.ts';
import type { Member, Section } from '../timber/member.ts';
import { overDepth } from './headroom.ts';

/** Which limit of the user's own a section is over; null where it counts as a choice. */
export function overLimit(member: Member, section: Section): string | null {
  if (overDepth(member, section) > 0) return 'too deep';
  const { maxWidth } = member;
  return maxWidth !== null && standingWidth(section) > maxWidth ? 'too wide' : null;
}
