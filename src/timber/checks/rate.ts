import { beamStability, effectiveLength, MOST_SLENDER, slendernessRatio } from '../factors/beam-stability.ts';
import { volumeFactor } from '../factors/volume.ts';
import type { Section } from '../member.ts';
import { CHECK_IDS, type CheckId, PASS_LIMIT } from '../report.ts';
import { isForbidden } from './forbidden.ts';
import { notchCapacity } from './notch.ts';
import { type Prepared, prepare } from './prepare.ts';
import { groupDemand, type TermSet, volumeLengths } from './term-set.ts';
import { sizeWood, type Wood } from './wood.ts';

const at = (id: CheckId) => CHECK_IDS.indexOf(id);
export const SHEAR = at('shear');
export const BENDING = at('bending');
export const HOGGING = at('bending-hogging');
export const LIVE = at('deflection-live');
export const TOTAL = at('deflection-total');
export const BEARING = at('bearing');
export const SLENDERNESS = at('slenderness');
export const UPLIFT = at('uplift');
export const NOTCH = at('notch');

/** An upward reaction under this is rounding of the statics, lb. */
const NO_UPLIFT = 1e-6;

/**
 * All checks of a member in all combinations and patterns, for one wood and section: fills `ratios` in the order of
 * CHECK_IDS (demand over capacity; NaN: does not apply; Infinity: uplift with nothing stated to hold it down) and says
 * whether the member passes. Where a rule forbids the section every ratio is Infinity (`refusal` says why).
 * `governing`, where given, takes the index of the group behind each ratio; of the slenderness ratio those of
 * sagging come first, those of hogging after.
 */
export function rate(
  prepared: Prepared,
  wood: Wood,
  section: Section,
  ratios: Float64Array,
  governing?: Int32Array,
): boolean {
  if (!sizeWood(wood, section) || isForbidden(prepared, wood)) {
    ratios.fill(Number.POSITIVE_INFINITY);
    return false;
  }
  const p = heavyEnough(prepared, wood);
  const { b, d, area, modulus, weight } = wood.at;
  const w = p.member.selfWeight ? weight : 0;
  ratios.fill(Number.NaN);

  if (p.effects.shearAtDepth !== null) rateShearAtDepth(p, wood, w, ratios, governing);
  else {
    const { shear } = p;
    for (let g = 0; g < shear.count; g += 1) {
      const ratio = (1.5 * groupDemand(shear, g, w)) / area / (wood.at.Fv * shear.duration[g]!);
      raise(ratios, SHEAR, ratio, governing, g);
    }
  }
  rateBending(p.sagging, wood, wood.at.FbSagging, w, modulus, 0, BENDING, ratios, governing);
  rateBending(p.hogging, wood, wood.at.FbHogging, w, modulus, p.sagging.count, HOGGING, ratios, governing);

  const stiffness = wood.at.E * wood.at.inertia;
  const { deflectionLive: live, deflectionTotal: total } = p;
  for (let g = 0; g < live.count; g += 1) {
    raise(ratios, LIVE, groupDemand(live, g, w) / stiffness / p.liveLimit[live.place[g]!]!, governing, g);
  }
  for (let g = 0; g < total.count; g += 1) {
    raise(ratios, TOTAL, groupDemand(total, g, w) / stiffness / p.totalLimit[total.place[g]!]!, governing, g);
  }

  const { bearing, uplift, endShear } = p;
  for (let g = 0; g < bearing.count; g += 1) {
    const s = bearing.place[g]!;
    const ratio = groupDemand(bearing, g, w) / (b * p.bearingLength[s]!) / (wood.at.Fcperp * p.Cb[s]!);
    raise(ratios, BEARING, ratio, governing, g);
  }
  for (let g = 0; g < uplift.count; g += 1) {
    const force = groupDemand(uplift, g, w);
    if (force > NO_UPLIFT) raise(ratios, UPLIFT, force / p.tiedDown[uplift.place[g]!]!, governing, g);
  }
  if (p.deepestNotch > 0) {
    const Fv = wood.at.Fv * wood.rules.notchedShear;
    for (let g = 0; g < endShear.count; g += 1) {
      const notch = p.notch[g]!;
      if (notch === 0) continue;
      const capacity = notchCapacity(Fv * endShear.duration[g]!, b, d, notch);
      raise(ratios, NOTCH, groupDemand(endShear, g, w) / capacity, governing, g);
    }
  }
  if (!p.loaded) return false;
  for (let id = 0; id < ratios.length; id += 1) if (ratios[id]! > PASS_LIMIT) return false;
  return true;
}

function raise(
  ratios: Float64Array,
  id: number,
  ratio: number,
  governing: Int32Array | undefined,
  g: number,
): void {
  if (ratio <= ratios[id]!) return;
  ratios[id] = ratio;
  if (governing !== undefined) governing[id] = g;
}

/** Bending under the groups of one sign, and RB where their compression edge is not held. */
function rateBending(
  set: TermSet,
  wood: Wood,
  Fb: number,
  w: number,
  modulus: number,
  offset: number,
  id: number,
  ratios: Float64Array,
  governing: Int32Array | undefined,
): void {
  for (let g = 0; g < set.count; g += 1) {
    const demand = groupDemand(set, g, w);
    // A group that no longer bends this way at this weight has nothing to check.
    if (demand <= 0) continue;
    raise(ratios, id, demand / modulus / bendingCapacity(set, g, wood, Fb), governing, g);
    const RB = groupSlenderness(set, g, wood);
    if (RB > 0) raise(ratios, SLENDERNESS, RB / MOST_SLENDER, governing, offset + g);
  }
}

/** RB of a group's compression edge; 0 where it is held, or where the section is not deeper than wide. */
export function groupSlenderness(set: TermSet, g: number, wood: Wood): number {
  const lu = set.unbraced[g]!;
  const { b, d } = wood.at;
  return lu === 0 || d <= b ? 0 : slendernessRatio(effectiveLength(set.lateral[g]!, lu, d), b, d);
}

/** CL of a group. `Fb` is Fb* without CD. */
export function groupStability(set: TermSet, g: number, wood: Wood, Fb: number): number {
  const typed = wood.conditions.typedFactors?.CL;
  if (typed !== undefined) return typed.value;
  const RB = groupSlenderness(set, g, wood);
  return RB === 0 ? 1 : beamStability(Fb * set.duration[g]!, wood.at.EyMin, RB);
}

/** CV of a group. */
export function groupVolume(set: TermSet, g: number, wood: Wood): number {
  const typed = wood.conditions.typedFactors?.CV;
  if (typed !== undefined) return typed.value;
  const { volume } = wood.rules;
  return volume === 'none' ? 1 : volumeFactor(volumeLengths(set, volume)[g]!, wood.at.volume);
}

/** Fb' of a group, psi: the lesser of CL and CV (NDS 5.3.6). */
export function bendingCapacity(set: TermSet, g: number, wood: Wood, Fb: number): number {
  const CL = groupStability(set, g, wood, Fb);
  const CV = groupVolume(set, g, wood);
  return Fb * set.duration[g]! * wood.at.Cfu * Math.min(CL, CV);
}

function rateShearAtDepth(
  p: Prepared,
  wood: Wood,
  w: number,
  ratios: Float64Array,
  governing: Int32Array | undefined,
): void {
  const typed = p.member.typedFactors?.CD?.value;
  const found = p.effects.shearAtDepth!(wood.at.d, w);
  for (let g = 0; g < found.length; g += 1) {
    const { value, duration } = found[g]!;
    const ratio = (1.5 * value) / wood.at.area / (wood.at.Fv * (typed ?? duration));
    raise(ratios, SHEAR, ratio, governing, g);
  }
}

/** The prepared member whose demands are searched up to the weight of the wood at hand. */
export function heavyEnough(prepared: Prepared, wood: Wood): Prepared {
  const { weight } = wood.at;
  let p = prepared;
  while (weight > p.heaviest) {
    p.heavier ??= prepare(p.member, { heaviest: weight * 2 });
    p = p.heavier;
  }
  return p;
}
