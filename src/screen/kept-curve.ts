import type { NumberKnob } from '../explore/knobs/knob.ts';
import type { Ranking } from '../explore/rack/best.ts';
import type { Member } from '../timber/member.ts';

/** What a curve is drawn of: a knob of a member between two of its values. */
export interface Stretch {
  readonly member: Member;
  /** The knob's key. */
  readonly key: string;
  readonly number: NumberKnob;
  readonly from: number;
  readonly to: number;
  readonly ranking: Ranking;
}

/** Keeps the last curve of one kind: while its knob is nudged it stays the same, and only the beads move. */
export function keptCurve<T>(make: (stretch: Stretch) => T): (stretch: Stretch) => T {
  let last: { readonly stretch: Stretch; readonly origin: Member; readonly curve: T } | null = null;
  return (stretch) => {
    // The member with the knob at the beginning of the axis: alike for all values of the knob.
    const origin = stretch.number.put(stretch.member, stretch.from);
    const holds =
      last !== null &&
      last.stretch.key === stretch.key &&
      last.stretch.to === stretch.to &&
      last.stretch.ranking === stretch.ranking &&
      alike(last.origin, origin);
    if (last === null || !holds) last = { stretch, origin, curve: make(stretch) };
    return last.curve;
  };
}

/** True for members that say the same; parts that are the same object are not looked into. */
function alike(one: Member, other: Member): boolean {
  const keys = new Set([...Object.keys(one), ...Object.keys(other)]) as Set<keyof Member>;
  for (const key of keys) {
    if (one[key] !== other[key] && JSON.stringify(one[key]) !== JSON.stringify(other[key])) return false;
  }
  return true;
}
