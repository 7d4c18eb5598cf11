import { MOST_SLENDER } from '../factors/beam-stability.ts';
import type { Section } from '../member.ts';
import { CHECK_IDS, type CheckId, PASS_LIMIT } from '../report.ts';
import { bendingRatio, groupSlenderness, hasLength, NO_LENGTH, worstByVolume } from './bending.ts';
import { isForbidden } from './forbidden.ts';
import { notchCapacity } from './notch.ts';
import { type Prepared, prepare } from './prepare.ts';
import { groupDemand, type TermSet } from './term-set.ts';
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
export const NO_UPLIFT = 1e-6;
/** A moment up to this is none, lb.in: the edge that it presses on needs no holding. */
const NO_MOMENT = 1e-6;

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
  ratios: number[],
  governing?: Int32Array,
): boolean {
  if (!sizeWood(wood, section) || isForbidden(prepared, wood)) {
    ratios.fill(Number.POSITIVE_INFINITY);
    return false;
  }
  const p = heavyEnough(prepared, wood);
  const { b, d, area, weight } = wood.at;
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
  rateBending(p.sagging, wood, wood.at.FbSagging, w, 0, BENDING, ratios, governing);
  rateBending(p.hogging, wood, wood.at.FbHogging, w, p.sagging.count, HOGGING, ratios, governing);

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
  ratios: number[],
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
  offset: number,
  id: number,
  ratios: number[],
  governing: Int32Array | undefined,
): void {
  let first = -1;
  for (let g = 0; g < set.count; g += 1) {
    const moment = groupDemand(set, g, w);
    // A group that no longer bends this way at this weight has nothing to check.
    if (moment <= NO_MOMENT) continue;
    const RB = groupSlenderness(set, g, wood);
    const ratio = bendingRatio(set, g, wood, Fb, { moment, length: NO_LENGTH }, RB);
    if (!(ratio <= ratios[id]!)) first = g;
    raise(ratios, id, ratio, governing, g);
    if (RB > 0) raise(ratios, SLENDERNESS, RB / MOST_SLENDER, governing, offset + g);
  }
  if (first < 0 || !hasLength(wood)) return;
  // The group with the largest ratio before CV first: few others can then come up to it.
  rateVolume(set, first, wood, Fb, w, id, ratios, governing);
  for (let g = 0; g < set.count; g += 1)
    if (g !== first) rateVolume(set, g, wood, Fb, w, id, ratios, governing);
}

/** Raises the bending ratio by what CV makes of the moments of a group. */
function rateVolume(
  set: TermSet,
  g: number,
  wood: Wood,
  Fb: number,
  w: number,
  id: number,
  ratios: number[],
  governing: Int32Array | undefined,
): void {
  const { volume } = set.groups[g]!;
  const moment = groupDemand(set, g, w);
  if (volume === null || moment <= NO_MOMENT) return;
  if (bendingRatio(set, g, wood, Fb, { moment, length: volume.longest }) <= ratios[id]!) return;
  const worst = worstByVolume(set, g, wood, Fb, w, ratios[id]!);
  if (worst !== null) raise(ratios, id, bendingRatio(set, g, wood, Fb, worst), governing, g);
}

function rateShearAtDepth(
  p: Prepared,
  wood: Wood,
  w: number,
  ratios: number[],
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
