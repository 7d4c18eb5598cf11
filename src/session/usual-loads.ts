import type { LoadKind } from '../loads/kinds.ts';
import { fromUnit } from '../quantity/index.ts';
import type { Use } from '../timber/member.ts';

/** An area load that is usual for a use, to be offered: psi. */
export interface UsualLoad {
  readonly use: string;
  readonly kind: LoadKind;
  readonly load: number;
  readonly source: string;
}

const ASCE = 'ASCE 7 Table 4.3-1, from memory';

/** Live loads by occupancy. Decks and balconies are 1.5 x the area served, at most 100 psf. */
export const USUAL_LOADS: readonly UsualLoad[] = [
  usual('sleeping rooms', 'live', 30, 'IRC Table R301.5, from memory'),
  usual('other dwelling rooms', 'live', 40, ASCE),
  usual('offices', 'live', 50, ASCE),
  usual('corridors above the first floor', 'live', 80, ASCE),
  usual('assembly', 'live', 100, ASCE),
  usual('light storage', 'live', 125, ASCE),
  usual('library stacks', 'live', 150, ASCE),
  usual('deck or balcony of a dwelling', 'live', 60, ASCE),
  usual('attic without storage', 'live', 10, ASCE),
  usual('attic with limited storage', 'live', 20, ASCE),
  usual('roof', 'roofLive', 20, ASCE),
];

/** Dead loads to begin with, psf: light wood framing with its finishes; common practice, no source. */
const FLOOR_DEAD = 12;
const ROOF_DEAD = 15;
const DWELLING_LIVE = 40;
const ROOF_LIVE = 20;

/** Area loads that a new member begins with, psi by kind. */
export function startingLoads(use: Use): Readonly<Record<LoadKind, number>> {
  const none = { dead: 0, live: 0, roofLive: 0, snow: 0, rain: 0, wind: 0, windUp: 0 };
  return use === 'floor'
    ? { ...none, dead: psf(FLOOR_DEAD), live: psf(DWELLING_LIVE) }
    : { ...none, dead: psf(ROOF_DEAD), roofLive: psf(ROOF_LIVE) };
}

function usual(use: string, kind: LoadKind, load: number, source: string): UsualLoad {
  return { use, kind, load: psf(load), source };
}

function psf(load: number): number {
  return fromUnit('areaLoad', load, 'psf');
}
