import { loadsOf } from '../loads/index.ts';
import { beamFields } from '../statics/beam.ts';
import { woodsOf } from '../timber/index.ts';
import type { Member } from '../timber/member.ts';

/** More loads than this, or woods on the rack, and the searches of a frame take longer than a key is held. */
const FEW_LOADS = 4;
const FEW_WOODS = 2;

/** True for a member whose cures, reach, exponents and chart are worked out within a frame. */
export function isQuick(member: Member): boolean {
  return (
    beamFields(member.beam).length === 1 &&
    loadsOf(member).length <= FEW_LOADS &&
    woodsOf(member).length <= FEW_WOODS
  );
}
