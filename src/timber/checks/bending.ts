import type { VolumeMoment } from '../../loads/effects.ts';
import { beamStability, effectiveLength, slendernessRatio } from '../factors/beam-stability.ts';
import { hasVolumeLength, volumeFactor, volumeLength, volumeRoot } from '../factors/volume.ts';
import { groupDemand, type TermSet, worstTerm } from './term-set.ts';
import type { Wood } from './wood.ts';

/** RB of a group's compression edge; 0 where it is held, or where the section is not deeper than wide. */
export function groupSlenderness(set: TermSet, g: number, wood: Wood): number {
  const lu = set.unbraced[g]!;
  const { b, d } = wood.at;
  return lu === 0 || d <= b ? 0 : slendernessRatio(effectiveLength(set.lateral[g]!, lu, d), b, d);
}

/** CL of a group, its RB given where that is known. `Fb` is Fb* without CD. */
export function groupStability(
  set: TermSet,
  g: number,
  wood: Wood,
  Fb: number,
  RB = groupSlenderness(set, g, wood),
): number {
  const typed = wood.conditions.typedFactors?.CL;
  if (typed !== undefined) return typed.value;
  return RB === 0 ? 1 : beamStability(Fb * set.duration[g]!, wood.at.EyMin, RB);
}

/** CV of a moment with this length between points of zero moment, in. */
export function momentVolume(wood: Wood, length: number): number {
  const typed = wood.conditions.typedFactors?.CV;
  if (typed !== undefined) return typed.value;
  const { volume } = wood.rules;
  return volume === 'none' ? 1 : volumeFactor(volumeLength(volume, length), wood.at.volume);
}

/**
 * Fb' of a moment of a group, psi, its RB given where that is known: the lesser of CL and CV (NDS 5.3.6); `length` as
 * in `momentVolume`.
 */
export function bendingCapacity(
  set: TermSet,
  g: number,
  wood: Wood,
  Fb: number,
  length: number,
  RB = groupSlenderness(set, g, wood),
): number {
  const CL = groupStability(set, g, wood, Fb, RB);
  return Fb * set.duration[g]! * wood.at.Cfu * Math.min(CL, momentVolume(wood, length));
}

/** The bending ratio of a moment of a group. */
export function bendingRatio(
  set: TermSet,
  g: number,
  wood: Wood,
  Fb: number,
  { moment, length }: Pick<VolumeMoment, 'moment' | 'length'>,
  RB = groupSlenderness(set, g, wood),
): number {
  return moment / wood.at.modulus / bendingCapacity(set, g, wood, Fb, length, RB);
}

/** CV is 1 for a moment without length: what bends a member before CV is asked. */
export const NO_LENGTH = 0;

/** The same moment found in two ways differs by rounding: the largest stands where CV makes no more than this of another. */
const MORE = 1 + 1e-12;

/** Whether CV is worked out and goes with the length, so that it may ask for another moment than the largest. */
export function hasLength(wood: Wood): boolean {
  return hasVolumeLength(wood.rules.volume) && wood.conditions.typedFactors?.CV === undefined;
}

/** The moment of a group that CV makes most of, where that comes to more than a ratio known; null where it does not. */
export function worstByVolume(
  set: TermSet,
  g: number,
  wood: Wood,
  Fb: number,
  w: number,
  ratio: number,
): VolumeMoment | null {
  const rule = wood.rules.volume;
  const { at } = wood;
  // What moment and root of length a ratio of 1 comes to, where CV is below 1.
  const unit = at.modulus * Fb * set.duration[g]! * at.Cfu * volumeLength(rule, 1) * at.volume;
  const worst = set.groups[g]!.volume?.worst(volumeRoot(rule), w, unit * ratio) ?? null;
  return worst !== null && bendingRatio(set, g, wood, Fb, worst) > MORE * ratio ? worst : null;
}

/** The moment of a group that governs at own weight `w`, lb/in: the largest, or that which CV makes more of. */
export function governingMoment(set: TermSet, g: number, wood: Wood, Fb: number, w: number): VolumeMoment {
  const largest = worstTerm(set, g, w);
  const term = set.groups[g]!.terms[largest]!;
  const at = term.placeAt === null ? term.at : term.placeAt(w);
  const plain = { moment: groupDemand(set, g, w), length: NO_LENGTH, at, term };
  if (!hasLength(wood)) return plain;
  const worst = worstByVolume(set, g, wood, Fb, w, bendingRatio(set, g, wood, Fb, plain));
  if (worst !== null) return worst;
  return { ...plain, length: set.groups[g]!.volume?.of(largest, w)?.length ?? NO_LENGTH };
}
