import type { Section } from '../member.ts';
import { bendingCapacity, governingMoment } from './bending.ts';
import type { Prepared } from './prepare.ts';
import { heavyEnough } from './rate.ts';
import type { TermSet } from './term-set.ts';
import { sizeWood, type Wood } from './wood.ts';

/** Adjusted design values, psi. */
export interface AdjustedValues {
  /** Fb' sagging in a field; without CL and CV where it does not sag there. */
  readonly Fb: number;
  readonly FbHogging: number;
  readonly Fv: number;
  readonly E: number;
  readonly Emin: number;
  /** Without Cb. */
  readonly Fcperp: number;
}

/** Adjusted values of a section at a load duration CD, in one field; null where its table does not cover the size. */
export function adjusted(
  prepared: Prepared,
  wood: Wood,
  section: Section,
  duration: number,
  field: number,
): AdjustedValues | null {
  if (!sizeWood(wood, section)) return null;
  const { at } = wood;
  const { member, sagging, hogging } = heavyEnough(prepared, wood);
  const w = member.selfWeight ? at.weight : 0;
  return {
    Fb: inField(sagging, wood, at.FbSagging, duration, field, w),
    FbHogging: inField(hogging, wood, at.FbHogging, duration, field, w),
    Fv: at.Fv * duration,
    E: at.E,
    Emin: at.Emin,
    Fcperp: at.Fcperp,
  };
}

function inField(set: TermSet, wood: Wood, Fb: number, duration: number, field: number, w: number): number {
  for (let g = 0; g < set.count; g += 1) {
    if (set.place[g] !== field || set.duration[g] !== duration) continue;
    return bendingCapacity(set, g, wood, Fb, governingMoment(set, g, wood, Fb, w).length);
  }
  return Fb * duration * wood.at.Cfu;
}
