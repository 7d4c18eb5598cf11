import type { AppliedLoad } from '../loads/loading.ts';
import type { Member } from '../timber/member.ts';

/**
 * The member with every span, overhang and load position multiplied by one factor.
 * Bearings, notches, tributary width and typed unbraced lengths keep their size.
 */
export function scaleLengths(member: Member, factor: number): Member {
  const { beam } = member;
  return {
    ...member,
    beam: {
      ...beam,
      spans: beam.spans.map((span) => span * factor),
      overhangs: { left: beam.overhangs.left * factor, right: beam.overhangs.right * factor },
    },
    loads: member.loads.length === 0 ? member.loads : member.loads.map((load) => moved(load, factor)),
  };
}

function moved(load: AppliedLoad, factor: number): AppliedLoad {
  return load.type === 'point'
    ? { ...load, at: load.at * factor }
    : { ...load, from: load.from * factor, to: load.to * factor };
}

/** The member with every applied load multiplied by one factor; own weight stays. */
export function scaleLoads(member: Member, factor: number): Member {
  const area = { ...member.area };
  for (const kind of Object.keys(area) as (keyof typeof area)[]) area[kind] *= factor;
  return {
    ...member,
    area,
    loads: member.loads.map((load) =>
      load.type === 'point'
        ? { ...load, load: load.load * factor }
        : { ...load, start: load.start * factor, end: load.end * factor },
    ),
  };
}
