import type { LateralCase, TermGroup } from '../../loads/effects.ts';

/**
 * The groups of one check laid out in flat arrays (plain ones: typed arrays cost more to make than they save), so that the largest demand of a group at an own weight is a few
 * multiplications. `first[g]` to `first[g + 1]` are the terms of group g.
 */
export interface TermSet {
  readonly groups: readonly TermGroup[];
  readonly count: number;
  readonly first: readonly number[];
  readonly base: readonly number[];
  readonly perWeight: readonly number[];
  /** Terms whose extreme moves with the own weight; null where none does. */
  readonly moving: readonly (((w: number) => number) | null)[] | null;
  readonly duration: readonly number[];
  readonly place: readonly number[];
  /** Bending: unbraced length of the compression edge, in; 0 where it is held throughout. */
  readonly unbraced: readonly number[];
  readonly lateral: readonly LateralCase[];
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
  const first = [0];
  const base: number[] = [];
  const perWeight: number[] = [];
  const moving: TermGroup['terms'][number]['valueAt'][] = [];
  const unbraced: number[] = [];
  const lateral: LateralCase[] = [];
  let moves = false;
  for (const group of groups) {
    for (const term of group.terms) {
      base.push(term.base);
      perWeight.push(term.perWeight);
      moving.push(term.valueAt);
      moves ||= term.valueAt !== null;
    }
    first.push(base.length);
    const free = unbracedOf(group.place);
    unbraced.push(free);
    lateral.push(lateralOf(group, free, lengths));
  }
  return {
    groups,
    count: groups.length,
    first,
    base,
    perWeight,
    moving: moves ? moving : null,
    duration: groups.map((group) => duration ?? group.duration),
    place: groups.map((group) => group.place),
    unbraced,
    lateral,
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
  base: readonly number[],
  perWeight: readonly number[],
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
