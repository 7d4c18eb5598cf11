import type { Placed } from '../../loads/index.ts';
import { beamFault } from '../../statics/index.ts';
import type { Member } from '../../timber/member.ts';

/** "point load 2": loads by their kind of place and their number in the list. */
export function loadName(load: Placed, index: number): string {
  return `${load.type} load ${index + 1}`;
}

/** "link 2": links by their number in the list. */
export function linkName(index: number): string {
  return `link ${index + 1}`;
}

/** Everything that stands somewhere on a member, loads before links, with what it is called. */
export function placedOn({
  loads,
  links = [],
}: Member): { readonly placed: Placed; readonly name: string }[] {
  return [
    ...loads.map((load, index) => ({ placed: load, name: loadName(load, index) })),
    ...links.map((link, index) => ({ placed: link, name: linkName(index) })),
  ];
}

/** The member with all that stands on it put through one change of places, told the index in its own list. */
export function withPlaces(member: Member, move: <T extends Placed>(placed: T, index: number) => T): Member {
  const { links, loads } = member;
  const moved = { ...member, loads: loads.length === 0 ? loads : loads.map((load, at) => move(load, at)) };
  return links === undefined ? moved : { ...moved, links: links.map((link, at) => move(link, at)) };
}

/** Why a member's beam, loads or links cannot be worked out, in plain words; null when they can. */
export function placeFault({ beam, links, loads }: Member): string | null {
  const fault = beamFault(beam, loads);
  if (fault !== null || links === undefined) return fault;
  for (const [index, link] of links.entries()) {
    const alone = beamFault(beam, [
      link.type === 'point' ? { ...link, load: 0 } : { ...link, start: 0, end: 0 },
    ]);
    if (alone !== null) return alone.replace(/^load 1/, linkName(index));
  }
  return null;
}
