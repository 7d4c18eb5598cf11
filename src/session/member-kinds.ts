import type { CombinationSet } from '../loads/loading.ts';
import { fromUnit } from '../quantity/index.ts';
import { FARTHEST_APART } from '../timber/factors/repetitive.ts';
import type { Member, Stock, Use } from '../timber/member.ts';
import { withStock } from '../timber/with-stock.ts';
import { newMember } from './new-member.ts';
import { startingLoads } from './usual-loads.ts';

/** What a member can be, with what it usually begins with. */
export interface MemberKind {
  readonly name: string;
  /** What names of such members begin with: "J" of "J1". */
  readonly mark: string;
  readonly use: Use;
  readonly supports: Member['beam']['supports'];
  /** From centre to centre of its like, in; null: it carries a width of its own. */
  readonly spacing: number | null;
  readonly area: Member['area'];
  readonly service: Member['service'];
}

/** Spacings, and the dead load of bare deck boards, are common practice, no source. */
const JOIST_SPACING = 16;
const RAFTER_SPACING = 24;
const DECK_DEAD = fromUnit('areaLoad', 10, 'psf');
/** Of a deck or a balcony: 1.5 times that of the dwelling it serves (ASCE 7 Table 4.3-1, from memory). */
const DECK_LIVE = fromUnit('areaLoad', 60, 'psf');

const FLOOR = {
  use: 'floor',
  supports: 'bearings',
  spacing: null,
  area: startingLoads('floor'),
  service: 'dry',
} as const;
const ROOF = { ...FLOOR, use: 'roof', area: startingLoads('roof') } as const;

/** What can be added: a floor, a roof, what stands outside. */
export const MEMBER_KINDS: readonly MemberKind[] = [
  { ...FLOOR, name: 'girder', mark: 'G' },
  { ...FLOOR, name: 'joist', mark: 'J', spacing: JOIST_SPACING },
  { ...FLOOR, name: 'header', mark: 'H' },
  { ...ROOF, name: 'rafter', mark: 'R', spacing: RAFTER_SPACING },
  { ...ROOF, name: 'ridge', mark: 'RB' },
  {
    ...FLOOR,
    name: 'deck joist',
    mark: 'D',
    spacing: JOIST_SPACING,
    area: { ...FLOOR.area, dead: DECK_DEAD, live: DECK_LIVE },
    service: 'wet',
  },
  {
    ...FLOOR,
    name: 'cantilever',
    mark: 'C',
    supports: 'cantilever',
    area: { ...FLOOR.area, live: DECK_LIVE },
  },
];

/** A new member of this kind. `span` (of a cantilever its free length) and `width` (or spacing) in in. */
export function memberOfKind(
  kind: MemberKind,
  span: number,
  width: number,
  name: string,
  job: { readonly combinations: CombinationSet; readonly stock: Stock },
): Member {
  const plain = newMember(kind.use, [span], width, name);
  const member: Member = {
    ...plain,
    beam: { ...plain.beam, supports: kind.supports },
    bearing: kind.supports === 'cantilever' ? plain.bearing.slice(0, 1) : plain.bearing,
    spacing: kind.spacing === null ? null : width,
    area: kind.area,
    combinations: job.combinations,
    service: kind.service,
    repetitive: kind.spacing !== null && width <= FARTHEST_APART,
    assumed: plain.assumed.filter((key) => key !== 'service' || kind.service === 'dry'),
  };
  return withStock(member, job.stock);
}
