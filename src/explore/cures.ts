import type { Member } from '../timber/member.ts';
import { type Move, nearestMoves } from './moves/index.ts';
import { BY_WEIGHT, type Ranking } from './rack/best.ts';
import type { Rack } from './rack/rack.ts';
import { type RankedRack, rank } from './rack/ranked.ts';

/** One change that would help, with what it does. */
export type Cure = Move;

/**
 * The nearest changes that make a member pass: the best stock size of all woods on its rack, and of its own the next
 * deeper and the next wider size that do it, another ply, a shorter span. A kind that cannot help is absent.
 */
export function curesOf(member: Member, rack: Rack | RankedRack, ranking: Ranking = BY_WEIGHT): Cure[] {
  return nearestMoves(member, 'lit' in rack ? rack : rank(member, rack, ranking), { ranking });
}
