import { loadsOf } from './carried.ts';
import type { Effects, Term, TermGroup, VolumeMoment, VolumeMoments } from './effects.ts';
import type { Loading } from './loading.ts';

/**
 * True where a member with all its lengths multiplied by one factor has the same effects but for powers of that
 * factor: line loads keep their size a length, so shear and reactions go with it once, moments twice, deflections
 * at EI = 1 four times. Point loads do not grow with the length, nor does the depth within which shear is left out.
 */
export function isSelfSimilar(loading: Loading): boolean {
  return loading.shearAt === 'support' && loadsOf(loading).every((load) => load.type === 'line');
}

/** The effects of a self-similar loading with every span, overhang and load position multiplied by `factor`. */
export function scaleEffects(effects: Effects, factor: number): Effects {
  const once = factor;
  const twice = factor * factor;
  const fourTimes = twice * twice;
  const groups = (from: readonly TermGroup[], power: number) =>
    from.map((group) => scaleGroup(group, factor, power));
  return {
    ...effects,
    shear: groups(effects.shear, once),
    endShear: groups(effects.endShear, once),
    sagging: groups(effects.sagging, twice),
    hogging: groups(effects.hogging, twice),
    bearing: groups(effects.bearing, once),
    uplift: groups(effects.uplift, once),
    deflectionLive: groups(effects.deflectionLive, fourTimes),
    deflectionTotal: groups(effects.deflectionTotal, fourTimes),
  };
}

function scaleGroup(group: TermGroup, factor: number, power: number): TermGroup {
  const scaled = (term: Term): Term => {
    const { valueAt, placeAt } = term;
    return {
      ...term,
      base: term.base * power,
      perWeight: term.perWeight * power,
      valueAt: valueAt === null ? null : (w) => power * valueAt(w),
      placeAt: placeAt === null ? null : (w) => factor * placeAt(w),
      at: term.at * factor,
    };
  };
  return {
    ...group,
    volume: scaleVolume(group.volume, { lengths: factor, moments: power, weights: 1 }, scaled),
    terms: group.terms.map(scaled),
  };
}

/** Lengths and moments so many times as large, under own weights so many times as heavy. */
function scaleVolume(
  volume: VolumeMoments | null,
  by: { readonly lengths: number; readonly moments: number; readonly weights: number },
  scaled: (term: Term) => Term,
): VolumeMoments | null {
  if (volume === null) return null;
  const change = (one: VolumeMoment | null): VolumeMoment | null =>
    one && {
      moment: one.moment * by.moments,
      length: one.length * by.lengths,
      at: one.at * by.lengths,
      term: scaled(one.term),
    };
  return {
    longest: volume.longest * by.lengths,
    worst: (root, w, over = 0) =>
      change(volume.worst(root, w / by.weights, over / by.moments / by.lengths ** (1 / root))),
    of: (term, w) => change(volume.of(term, w / by.weights)),
  };
}

/**
 * The effects of the same loading with every load multiplied by `factor` and own weight as it was: a demand goes with
 * loads and own weight together, so it is the factor times that of the loading as it is under an own weight of w over
 * the factor.
 */
export function scaleLoadEffects(effects: Effects, factor: number): Effects {
  const groups = (from: readonly TermGroup[]) =>
    from.map(
      (group): TermGroup => ({
        ...group,
        volume: scaleVolume(group.volume, { lengths: 1, moments: factor, weights: factor }, (term) =>
          scaleLoad(term, factor),
        ),
        terms: group.terms.map((term) => scaleLoad(term, factor)),
      }),
    );
  const { shearAtDepth } = effects;
  return {
    ...effects,
    shear: groups(effects.shear),
    endShear: groups(effects.endShear),
    sagging: groups(effects.sagging),
    hogging: groups(effects.hogging),
    bearing: groups(effects.bearing),
    uplift: groups(effects.uplift),
    deflectionLive: groups(effects.deflectionLive),
    deflectionTotal: groups(effects.deflectionTotal),
    shearAtDepth:
      shearAtDepth === null
        ? null
        : (depth, w) =>
            shearAtDepth(depth, w / factor).map((found) => ({
              ...found,
              value: found.value * factor,
              term: scaleLoad(found.term, factor),
            })),
  };
}

function scaleLoad(term: Term, factor: number): Term {
  const { valueAt, placeAt } = term;
  return {
    ...term,
    base: term.base * factor,
    valueAt: valueAt === null ? null : (w) => factor * valueAt(w / factor),
    placeAt: placeAt === null ? null : (w) => placeAt(w / factor),
  };
}
