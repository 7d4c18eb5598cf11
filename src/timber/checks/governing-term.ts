import type { Term } from '../../loads/effects.ts';
import { governingMoment } from './bending.ts';
import type { Prepared } from './prepare.ts';
import { BEARING, BENDING, HOGGING, heavyEnough, LIVE, NOTCH, SHEAR, TOTAL, UPLIFT } from './rate.ts';
import { groupDemand, type TermSet, worstTerm } from './term-set.ts';
import type { Wood } from './wood.ts';

/** The demand behind a ratio, and where it comes from. */
export interface Governing {
  /** lb, lb.in or lb.in³ */
  readonly demand: number;
  readonly duration: number;
  readonly term: Term;
  readonly place: number;
  readonly at: number;
  /** Bending: between the points of zero moment, in, where CV goes with it. */
  readonly length: number;
}

/** What governs a check: `g` the group that `rate` named, the wood still at the section rated. */
export function governingTerm(prepared: Prepared, wood: Wood, id: number, g: number): Governing {
  const p = heavyEnough(prepared, wood);
  const w = p.member.selfWeight ? wood.at.weight : 0;
  if (id === SHEAR && p.effects.shearAtDepth !== null) {
    const { term, value, duration } = p.effects.shearAtDepth(wood.at.d, w)[g]!;
    const typed = p.member.typedFactors?.CD?.value;
    return { demand: value, duration: typed ?? duration, term, place: term.place, at: term.at, length: 0 };
  }
  const set = setOf(p, id);
  if (id === BENDING || id === HOGGING) {
    const Fb = id === BENDING ? wood.at.FbSagging : wood.at.FbHogging;
    const { moment, length, at, term } = governingMoment(set, g, wood, Fb, w);
    return { demand: moment, duration: set.duration[g]!, term, place: term.place, at, length };
  }
  const term = set.groups[g]!.terms[worstTerm(set, g, w)]!;
  const at = term.placeAt === null ? term.at : term.placeAt(w);
  return {
    demand: groupDemand(set, g, w),
    duration: set.duration[g]!,
    term,
    place: term.place,
    at,
    length: 0,
  };
}

/** The groups of a check, by its index in CHECK_IDS. */
export function setOf(p: Prepared, id: number): TermSet {
  switch (id) {
    case SHEAR:
      return p.shear;
    case BENDING:
      return p.sagging;
    case HOGGING:
      return p.hogging;
    case LIVE:
      return p.deflectionLive;
    case TOTAL:
      return p.deflectionTotal;
    case BEARING:
      return p.bearing;
    case UPLIFT:
      return p.uplift;
    case NOTCH:
      return p.endShear;
    default:
      throw new Error(`check ${id} has no demands`);
  }
}
