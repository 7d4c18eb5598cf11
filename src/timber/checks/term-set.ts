import type { LateralCase, TermGroup } from '../../loads/effects.ts';
import { type VolumeRule, volumeLength } from '../factors/volume.ts';

/**
 * The groups of one check laid out in flat arrays, so that the largest demand of a group at an own weight is a few
 * multiplications. `first[g]` to `first[g + 1]` are the terms of group g.
 */
export interface TermSet {
  readonly groups: readonly TermGroup[];
  readonly count: number;
  readonly first: Int32Array;
  readonly base: Float64Array;
  readonly perWeight: Float64Array;
  /** Terms whose extreme moves with the own weight; null where none does. */
  readonly moving: readonly (((w: number) => number) | null)[] | null;
  readonly duration: Float64Array;
  readonly place: Int32Array;
  /** Bending: unbraced length of the compression edge, in; 0 where it is held throughout. */
  readonly unbraced: Float64Array;
  readonly lateral: readonly LateralCase[];
  /** Part of CV that goes with the length, by rule, made when first asked for. */
  readonly volume: Partial<Record<VolumeRule, Float64Array>>;
}

/**
 * Lays groups out; `duration` stands over each group's own where it was typed. For bending `unbracedOf` gives the
 * unbraced length of a field and `lengths` the fields' own lengths, in.
 */
export function termSet(
  groups: readonly TermGroup[],
  duration: number | undefined,
  unbracedOf: (place: number) => number,
  lengths: readonly number[] = [],
): TermSet {
  const terms = groups.flatMap((group) => group.terms);
  const first = new Int32Array(groups.length + 1);
  groups.forEach((group, g) => {
    first[g + 1] = first[g]! + group.terms.length;
  });
  return {
    groups,
    count: groups.length,
    first,
    base: Float64Array.from(terms, (term) => term.base),
    perWeight: Float64Array.from(terms, (term) => term.perWeight),
    moving: terms.some((term) => term.valueAt !== null) ? terms.map((term) => term.valueAt) : null,
    duration: Float64Array.from(groups, (group) => duration ?? group.duration),
    place: Int32Array.from(groups, (group) => group.place),
    unbraced: Float64Array.from(groups, (group) => unbracedOf(group.place)),
    lateral: groups.map((group) => lateralOf(group, unbracedOf(group.place), lengths)),
    volume: {},
  };
}

/** Table 3.3.3 has its row for one load at mid-span for beams without bracing between their supports. */
function lateralOf(
  { lateralCase, place }: TermGroup,
  unbraced: number,
  lengths: readonly number[],
): LateralCase {
  return lateralCase === 'point at mid-span' && unbraced < lengths[place]! ? 'other' : lateralCase;
}

/** The largest demand of group `g` at own weight `w`, lb/in; 0 where all its terms are upward. */
export function groupDemand(set: TermSet, g: number, w: number): number {
  const { first, base, perWeight, moving } = set;
  const end = first[g + 1]!;
  let most = 0;
  for (let t = first[g]!; t < end; t += 1) {
    const value = termValue(base, perWeight, moving, t, w);
    if (value > most) most = value;
  }
  return most;
}

/** The term of group `g` that is the largest at own weight `w`, as an index into the group's own terms. */
export function worstTerm(set: TermSet, g: number, w: number): number {
  const start = set.first[g]!;
  let worst = 0;
  let most = Number.NEGATIVE_INFINITY;
  for (let t = start; t < set.first[g + 1]!; t += 1) {
    const value = termValue(set.base, set.perWeight, set.moving, t, w);
    if (value > most) {
      most = value;
      worst = t - start;
    }
  }
  return worst;
}

function termValue(
  base: Float64Array,
  perWeight: Float64Array,
  moving: TermSet['moving'],
  t: number,
  w: number,
): number {
  if (moving !== null) {
    const valueAt = moving[t]!;
    if (valueAt !== null) return valueAt(w);
  }
  return base[t]! + perWeight[t]! * w;
}

/** The length parts of CV of the groups under a rule. */
export function volumeLengths(set: TermSet, rule: VolumeRule): Float64Array {
  const known = set.volume[rule];
  if (known !== undefined) return known;
  const made = Float64Array.from(set.groups, (group) => volumeLength(rule, group.zeroMomentLength));
  set.volume[rule] = made;
  return made;
}
