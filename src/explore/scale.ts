import type { Borne, Placed } from '../loads/index.ts';
import type { Member } from '../timber/member.ts';
import { withPlaces } from './beam-edits/placed.ts';

/**
 * The member with every span, overhang and load position multiplied by one factor.
 * Bearings, notches, tributary width and typed unbraced lengths keep their size.
 */
export function scaleLengths(member: Member, factor: number): Member {
  const { beam } = member;
  return {
    ...withPlaces(member, (placed) => moved(placed, factor)),
    beam: {
      ...beam,
      spans: beam.spans.map((span) => span * factor),
      overhangs: { left: beam.overhangs.left * factor, right: beam.overhangs.right * factor },
    },
  };
}

function moved<T extends Placed>(placed: T, factor: number): T {
  return placed.type === 'point'
    ? { ...placed, at: placed.at * factor }
    : { ...placed, from: placed.from * factor, to: placed.to * factor };
}

/** The member with every applied load multiplied by one factor; own weight stays. */
export function scaleLoads(member: Member, factor: number): Member {
  const area = { ...member.area };
  for (const kind of Object.keys(area) as (keyof typeof area)[]) area[kind] *= factor;
  const links = member.links?.map((link) => ({ ...link, bears: scaled(link.bears, factor) }));
  return {
    ...member,
    ...(links === undefined ? {} : { links }),
    area,
    loads: member.loads.map((load) =>
      load.type === 'point'
        ? { ...load, load: load.load * factor }
        : { ...load, start: load.start * factor, end: load.end * factor },
    ),
  };
}

function scaled(bears: Borne | null, factor: number): Borne | null {
  if (bears === null) return null;
  const entries = Object.entries(bears).map(([kind, { max, min }]) => [
    kind,
    { max: max * factor, min: min * factor },
  ]);
  return Object.fromEntries(entries) as Borne;
}
