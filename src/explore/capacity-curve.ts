import type { Member } from '../timber/member.ts';
import { placeFault } from './beam-edits/placed.ts';
import { type Capacity, capacityOf } from './capacity.ts';
import type { NumberKnob } from './knobs/knob.ts';

/** Near enough for a curve that is drawn. */
const CLOSE = 1e-3;

/**
 * What a member carries along a knob, at equal steps from `from` to `to` (base units); null where a load would be off
 * the member.
 */
export function capacityCurve(
  member: Member,
  knob: NumberKnob,
  from: number,
  to: number,
  samples: number,
): (Capacity | null)[] {
  let near = 1;
  return Array.from({ length: samples }, (_, at) => {
    const turned = knob.put(member, from + ((to - from) * at) / (samples - 1));
    if (placeFault(turned) !== null) return null;
    const capacity = capacityOf(turned, { close: CLOSE, near });
    if (capacity.factor > 0 && Number.isFinite(capacity.factor)) near = capacity.factor;
    return capacity;
  });
}
