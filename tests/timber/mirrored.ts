import type { AppliedLoad } from '../../src/loads/loading.ts';
import { beamLength } from '../../src/statics/beam.ts';
import type { Member } from '../../src/timber/member.ts';

/** A member seen from its other side. */
export function mirrored(member: Member): Member {
  const { beam, bearing, loads, notch, tiedDown } = member;
  const length = beamLength(beam);
  const turned = (load: AppliedLoad): AppliedLoad =>
    load.type === 'point'
      ? { ...load, at: length - load.at }
      : { ...load, from: length - load.to, to: length - load.from, start: load.end, end: load.start };
  return {
    ...member,
    beam: {
      ...beam,
      spans: beam.spans.toReversed(),
      overhangs: { left: beam.overhangs.right, right: beam.overhangs.left },
      fixed: { left: beam.fixed.right, right: beam.fixed.left },
    },
    loads: loads.map(turned),
    bearing: bearing.toReversed(),
    tiedDown: tiedDown?.toReversed() ?? null,
    notch: { left: notch.right, right: notch.left },
  };
}
