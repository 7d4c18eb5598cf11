import {
  compileEffects,
  type Effects,
  isSelfSimilar,
  type Loading,
  liftsOf,
  loadsOf,
  scaleEffects,
  scaleLoadEffects,
  slopedLength,
} from '../../loads/index.ts';
import { Lately } from '../../quantity/lately.ts';
import { type Beam, beamFields, beamLength, type Field, supportPlaces } from '../../statics/beam.ts';
import { bearingArea } from '../factors/bearing-area.ts';
import type { Bracing, Member } from '../member.ts';
import { notchPlaceFault } from './notch.ts';
import { type TermSet, termSet } from './term-set.ts';

/** Everything of a member's checks that does not depend on its size, nor on its wood. */
export interface Prepared {
  readonly member: Member;
  readonly effects: Effects;
  readonly fields: readonly Field[];
  /** Heaviest own weight that the demands are searched for, lb/in. */
  readonly heaviest: number;
  /** False for a member that carries nothing but itself: it does not pass. */
  readonly loaded: boolean;
  readonly shear: TermSet;
  readonly endShear: TermSet;
  readonly sagging: TermSet;
  readonly hogging: TermSet;
  readonly deflectionLive: TermSet;
  readonly deflectionTotal: TermSet;
  readonly bearing: TermSet;
  readonly uplift: TermSet;
  /** By field, in. */
  readonly liveLimit: readonly number[];
  readonly totalLimit: readonly number[];
  /** By support: bearing length, in, and Cb. */
  readonly bearingLength: readonly number[];
  readonly Cb: readonly number[];
  /** By support, lb; 0 where none is stated. */
  readonly tiedDown: readonly number[];
  /** By group of endShear: depth of the notch at that end, in. */
  readonly notch: readonly number[];
  /** The deeper of the two notches, in; Infinity where a notch stands at a place that allows none. */
  readonly deepestNotch: number;
  /** The same prepared for heavier sections, made when one is met. */
  heavier: Prepared | null;
}

export interface PrepareOptions {
  /** Heaviest own weight that will be rated without preparing again, lb/in. */
  readonly heaviest?: number;
}

/** A wet 10 3/4 x 48 in glulam of Southern Pine weighs 11.6 lb/in: the heaviest on the racks, rounded up. */
export const HEAVIEST = 16;

/** Searches are dear, and hold some tens of kilobytes each. */
const MOST_KNOWN = 128;
const KNOWN = new Lately<Member, Prepared>(MOST_KNOWN);

/** Searches combinations and patterns of a member once, for all sizes of section; the same object for the same member. */
export function prepare(member: Member, options: PrepareOptions = {}): Prepared {
  const heaviest = options.heaviest ?? HEAVIEST;
  const known = KNOWN.get(member);
  if (known !== undefined && known.heaviest === heaviest) return known;
  const prepared = searched(member, heaviest);
  KNOWN.set(member, prepared);
  return prepared;
}

/** Lets go of what was prepared for a member that is done with: in a run over many the collector comes late to it. */
export function forgetPrepared(member: Member): void {
  KNOWN.delete(member);
}

function searched(member: Member, heaviest: number): Prepared {
  return withEffects(
    member,
    compileEffects(member, { heaviest, deadFactor: deadFactorOf(member) }),
    heaviest,
  );
}

/**
 * The same for `member`, which is the prepared one with all its lengths multiplied by `factor`; where the loads
 * allow it the search is not done again.
 */
export function prepareScaled(prepared: Prepared, member: Member, factor: number): Prepared {
  const { heaviest, effects } = prepared;
  return isSelfSimilar(member)
    ? withEffects(member, scaleEffects(effects, factor), heaviest)
    : prepare(member, { heaviest });
}

/** The same for `member`, which is the prepared one with all its applied loads multiplied by `factor`, near 1. */
export function prepareLoaded(prepared: Prepared, member: Member, factor: number): Prepared {
  return withEffects(member, scaleLoadEffects(prepared.effects, factor), prepared.heaviest);
}

/**
 * The same for a member that is like the prepared one, to the last bit: the search is done again only where its
 * loads, its beam or the part of dead load in the total deflection differ.
 */
export function prepareLike(prepared: Prepared, member: Member): Prepared {
  const { member: like, heaviest, effects } = prepared;
  const same =
    member.beam === like.beam && deadFactorOf(member) === deadFactorOf(like) && sameLoading(member, like);
  if (!same) return prepare(member, { heaviest });
  const alike = JUDGING_KEYS.every((key) => member[key] === like[key]);
  return alike ? prepared : withEffects(member, effects, heaviest);
}

/**
 * The same for a member whose single span alone is another, without a new search where the loads go along; the
 * ratios are those of a new search but for rounding.
 */
export function prepareResized(prepared: Prepared, member: Member): Prepared {
  const { member: like } = prepared;
  const scaled =
    placesNothing(member) && isOneSpan(member.beam) && isOneSpan(like.beam) && sameLoading(member, like);
  return scaled && deadFactorOf(member) === deadFactorOf(like)
    ? prepareScaled(prepared, member, member.beam.spans[0]! / like.beam.spans[0]!)
    : prepareLike(prepared, member);
}

/** What the effects depend on beside the beam and the part of dead load that counts. */
const LOADING_KEYS = [
  'tributary',
  'area',
  'links',
  'selfWeight',
  'combinations',
  'liveReduction',
  'slope',
  'bearing',
  'shearAt',
] as const satisfies readonly (keyof Loading)[];

function sameLoading(one: Member, other: Member): boolean {
  const loads = one.loads === other.loads || (one.loads.length === 0 && other.loads.length === 0);
  return loads && LOADING_KEYS.every((key) => one[key] === other[key]);
}

/** What capacities and limits are laid out from; the section is none of it. */
const JUDGING_KEYS = [
  'limits',
  'bracing',
  'bracingBottom',
  'notch',
  'tiedDown',
  'typedFactors',
  'stock',
] as const satisfies readonly (keyof Member)[];

function placesNothing({ links = [], loads }: Member): boolean {
  return loads.length === 0 && links.length === 0;
}

/** A single span between bearings that turn freely. */
function isOneSpan({ spans, overhangs, supports, fixed }: Beam): boolean {
  const whole = spans.length === 1 && overhangs.left === 0 && overhangs.right === 0;
  return whole && supports === 'bearings' && !fixed.left && !fixed.right;
}

/** A member prepared from demands that are searched already, up to own weights of `heaviest`, lb/in. */
export function withEffects(member: Member, effects: Effects, heaviest: number): Prepared {
  const fields = beamFields(member.beam);
  const { typedFactors: typed, limits, notch, slope } = member;
  const lengths = fields.map((field) => slopedLength(slope, field.length));
  const spans = fields.map((field, f) => (field.kind === 'overhang' ? 2 : 1) * lengths[f]!);
  const held = () => 0;
  const top = (place: number) => unbracedLength(member.bracing, lengths[place]!);
  const bottom = (place: number) => unbracedLength(member.bracingBottom, lengths[place]!);
  const places = supportPlaces(member.beam);
  const whole = beamLength(member.beam);
  const { endShear } = effects;
  return {
    member,
    effects,
    fields,
    heaviest,
    loaded: isLoaded(member),
    shear: termSet(effects.shear, typed?.CD?.value, held),
    endShear: termSet(endShear, typed?.CD?.value, held),
    sagging: termSet(effects.sagging, typed?.CD?.value, top, lengths),
    hogging: termSet(effects.hogging, typed?.CD?.value, bottom, lengths),
    deflectionLive: termSet(effects.deflectionLive, undefined, held),
    deflectionTotal: termSet(effects.deflectionTotal, undefined, held),
    bearing: termSet(effects.bearing, undefined, held),
    uplift: termSet(effects.uplift, undefined, held),
    liveLimit: spans.map((span) => Math.min(span / limits.live, limits.liveMax ?? Infinity)),
    totalLimit: spans.map((span) => span / limits.total),
    bearingLength: member.bearing,
    Cb: places.map((at, s) => typed?.Cb?.value ?? bearingArea(member.bearing[s]!, at, whole)),
    tiedDown: places.map((_, s) => member.tiedDown?.[s] ?? 0),
    notch: endShear.map(({ place }) => (place === 0 ? notch.left : notch.right)),
    deepestNotch: notchPlaceFault(member) === null ? Math.max(notch.left, notch.right) : Infinity,
    heavier: null,
  };
}

/** What dead load counts in the total deflection (IBC Table 1604.3 note; NDS 3.5.2). */
const HALF_DEAD = { seasoned: 0.5, other: 1 } as const;
const KCR = { seasoned: 1.5, other: 2 } as const;

/** Factor on dead load in the total deflection: half dead, or creep by Kcr. */
export function deadFactorOf(member: Member): number {
  const state = member.seasoned && member.service === 'dry' ? 'seasoned' : 'other';
  return member.creep === 'Kcr' ? KCR[state] : HALF_DEAD[state];
}

/** Unbraced length of an edge in a field `length` long, in; 0 where it is held throughout. */
export function unbracedLength(bracing: Bracing, length: number): number {
  if (bracing === 'continuous') return 0;
  return bracing === 'ends' ? length : bracing;
}

function isLoaded(member: Member): boolean {
  const area = member.tributary > 0 && Object.values(member.area).some((load) => load > 0);
  return (
    area ||
    [...loadsOf(member), ...liftsOf(member)].some((load) =>
      load.type === 'point' ? load.load !== 0 : load.start !== 0 || load.end !== 0,
    )
  );
}
