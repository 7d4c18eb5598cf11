import { rackSizesOf, type Size, sizeLabel } from '../../timber/index.ts';
import type { Member, Section } from '../../timber/member.ts';
import { takeSize } from '../rack/rack.ts';
import { type Ladder, rungs } from './ladder.ts';

/** A section as it stands: width of one ply, depth, plies. */
interface Standing {
  readonly ply: number;
  readonly depth: number;
  readonly plies: number;
}

function standing({ width, depth, plies, flat }: Section): Standing {
  return { ply: flat ? depth : width, depth: flat ? width : depth, plies };
}

/** Stock sizes of the member's own wood beside the size it has, nearest first. */
function sizesBy(member: Member, fits: Fits, by: (to: Standing) => number): Member[] {
  const { flat } = member.section;
  const now = standing(member.section);
  const of = (size: Size) => standing({ ...size, flat });
  return rackSizesOf(member.stock)
    .filter((size) => fits(of(size), now))
    .sort((a, b) => by(of(a)) - by(of(b)))
    .map((size) => takeSize(member, size));
}

const label: Ladder['label'] = ({ section, stock }) => sizeLabel(section, stock.product);

type Fits = (to: Standing, from: Standing) => boolean;

const DEEPER: Fits = (to, from) => to.ply === from.ply && to.plies === from.plies && to.depth > from.depth;
const WIDER: Fits = (to, from) =>
  to.depth === from.depth && to.ply !== from.ply && to.ply * to.plies > from.ply * from.plies;
const PLIES_MORE: Fits = (to, from) =>
  to.depth === from.depth && to.ply === from.ply && to.plies > from.plies;

/** What the kinds of the sentence look for among sizes, and what they take the least of. */
export const NEAREST = [
  { kind: 'deepen', fits: DEEPER, by: (to: Standing) => to.depth },
  { kind: 'widen', fits: WIDER, by: (to: Standing) => to.ply * to.plies },
  { kind: 'add a ply', fits: PLIES_MORE, by: (to: Standing) => to.plies },
] as const;

/** Of sizes those that are such a step from the member's own, nearest first. */
export function steps<T extends { readonly size: Size }>(
  member: Member,
  sizes: readonly T[],
  { fits, by }: (typeof NEAREST)[number],
): T[] {
  const { flat } = member.section;
  const now = standing(member.section);
  const of = ({ size }: T) => standing({ ...size, flat });
  return sizes.filter((each) => fits(of(each), now)).sort((a, b) => by(of(a)) - by(of(b)));
}

/** The next stock depths of the same width and plies. */
export function deepen(member: Member): Ladder {
  const deeper = sizesBy(member, DEEPER, (to) => to.depth);
  return rungs('deepen', 'section', deeper, label);
}

/** The next stock widths of the same depth, but for one ply more of the same. */
export function widen(member: Member): Ladder {
  const wider = sizesBy(member, WIDER, (to) => to.ply * to.plies);
  return rungs('widen', 'section', wider, label);
}

export function addPly(member: Member): Ladder {
  const more = sizesBy(member, PLIES_MORE, (to) => to.plies);
  return rungs('add a ply', 'section', more, label);
}

/** Wood added where deepening and widening are set side by side. */
export const MORE_WOOD = 1.1;

/** Takes the rounding of the product off, in parts of an inch. */
const MILLIONTHS = 1e6;

/** The member with 10 % more wood as a free size: all of it in the depth, or all in the width. */
export function freeSize(member: Member, way: 'deepen' | 'widen'): Member {
  const { section } = member;
  const upright = (way === 'deepen') !== section.flat;
  const more = (size: number) => Math.round(size * MORE_WOOD * MILLIONTHS) / MILLIONTHS;
  const grown = upright
    ? { ...section, depth: more(section.depth) }
    : { ...section, width: more(section.width) };
  return { ...member, section: grown };
}
