import { standingDepth } from '../timber/index.ts';
import type { Headroom, Member, Section } from '../timber/member.ts';

/**
 * Depth left for the beam, in: what of the storey is neither clear height, nor ceiling, nor what lies on the beam.
 * The joists lie on a dropped beam; between flush ones they hang and take no height of their own. Negative where
 * nothing is left.
 */
export function depthLeft(headroom: Headroom): number {
  return clearHeight(headroom, 0) - headroom.clear;
}

/** Clear height below a beam of this depth, in. */
export function clearHeight(headroom: Headroom, depth: number): number {
  const { floorToFloor, floor, joists, ceiling, beam } = headroom;
  return floorToFloor - floor - (beam === 'dropped' ? joists : 0) - depth - ceiling;
}

/** Deepest section that counts as a choice, in: what headroom leaves and what was typed; Infinity where neither limits it. */
export function depthLimit({ maxDepth, headroom }: Pick<Member, 'maxDepth' | 'headroom'>): number {
  const left = headroom == null ? Number.POSITIVE_INFINITY : depthLeft(headroom);
  return Math.min(left, maxDepth ?? Number.POSITIVE_INFINITY);
}

/** A sum of typed lengths may miss a stock depth by this, in. */
const ROUNDING = 1e-9;

/** How much deeper than the limit a section stands, in; 0 where it fits. */
export function overDepth(member: Pick<Member, 'maxDepth' | 'headroom'>, section: Section): number {
  const over = standingDepth(section) - depthLimit(member);
  return over > ROUNDING ? over : 0;
}
