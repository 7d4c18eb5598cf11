import { areaToLine } from '../../loads/area-to-line.ts';
import { loadsOf } from '../../loads/carried.ts';
import type { LoadKind } from '../../loads/kinds.ts';
import { beamLength } from '../../statics/beam.ts';
import type { Member } from '../member.ts';
import { sectionWeight } from '../section-weight.ts';

/**
 * Load on the member at a glance, lb/in, spread over its length: dead with own weight, live, and the largest of
 * roof live, snow and rain (ASCE 7 §2.4.1 in full, without wind).
 */
export function lineLoadOf(member: Member): number {
  const of = (kind: LoadKind) => areaToLine(member, kind) + typedLoad(member, kind) / beamLength(member.beam);
  const own = member.selfWeight ? sectionWeight(member, member.section) : 0;
  return own + of('dead') + of('live') + Math.max(of('roofLive'), of('snow'), of('rain'));
}

/** All line and point loads of a kind, lb. */
function typedLoad(member: Member, kind: LoadKind): number {
  let sum = 0;
  for (const load of loadsOf(member)) {
    if (load.kind !== kind) continue;
    sum += load.type === 'point' ? load.load : ((load.start + load.end) / 2) * (load.to - load.from);
  }
  return sum;
}
