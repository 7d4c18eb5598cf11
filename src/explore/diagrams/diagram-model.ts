import {
  type Combination,
  type Curve,
  type CurveExtreme,
  type Curves,
  type CurvesOf,
  curves,
} from '../../loads/index.ts';
import { fromUnit, showMoment, showQuantity, showSmall, showSpan, type Units } from '../../quantity/index.ts';
import { Lately } from '../../quantity/lately.ts';
import { beamFields, beamLength, supportPlaces } from '../../statics/index.ts';
import {
  adjusted,
  deadFactorOf,
  prepare,
  refusal,
  sectionWeight,
  standingDepth,
  standingWidth,
  woodOf,
} from '../../timber/index.ts';
import type { Member } from '../../timber/member.ts';
import { isPlain, placeName, supportName } from '../../timber/place-words.ts';
import { placedOn } from '../beam-edits/placed.ts';

/** What the diagrams of one member are drawn from, at the places asked for. */
export interface DiagramModel {
  /** Of the combination chosen, or of all. */
  readonly chosen: Curves;
  /** Of all combinations: what the scales go by, so that stepping through them moves nothing else. */
  readonly envelope: Curves;
  /** Stiffness, lb.in²; null where no table covers the size. */
  readonly EI: number | null;
}

/** What of a member the curves need beside its loads; kept, since every key asks for it. */
interface Basis {
  readonly weight: number;
  readonly EI: number | null;
  readonly deadFactor: number;
  readonly combinations: readonly Combination[];
  readonly deflection: readonly Combination[];
  readonly patterns: readonly string[];
}

/** The member in hand and its ghosts. */
const MOST_MEMBERS = 16;
const BASES = new Lately<Member, Basis>(MOST_MEMBERS);
const CURVES = new Lately<Member, Map<string, Curves>>(MOST_MEMBERS);

/** The basis of a member's curves; the same object for the same member. */
export function basisOf(member: Member): Basis {
  const known = BASES.get(member);
  if (known !== undefined) return known;
  const prepared = prepare(member);
  const { effects } = prepared;
  const basis: Basis = {
    ...stiffnessOf(member),
    deadFactor: deadFactorOf(member),
    combinations: effects.combinations,
    deflection: effects.deflectionCombinations,
    patterns: effects.patterns,
  };
  BASES.set(member, basis);
  return basis;
}

/** Own weight and stiffness; a size that is refused has no stiffness to be trusted. */
function stiffnessOf(member: Member): { weight: number; EI: number | null } {
  const { section, selfWeight } = member;
  const weight = selfWeight ? sectionWeight(member, section) : 0;
  const usable = Number.isFinite(weight) ? weight : 0;
  if (refusal(member) !== null) return { weight: usable, EI: null };
  const values = adjusted(prepare(member), woodOf(member), section, 1, 0);
  if (values === null) return { weight: usable, EI: null };
  return { weight: usable, EI: (values.E * standingWidth(section) * standingDepth(section) ** 3) / 12 };
}

/** Places of `count` equal steps from end to end of a member, in. */
export function placesAlong(member: Member, count: number): number[] {
  const length = beamLength(member.beam);
  return Array.from({ length: count }, (_, at) => (length * at) / (count - 1));
}

/** The curves of a member at places from its left end, in: of one combination or of all. */
export function diagramsOf(member: Member, which: CurvesOf, places: readonly number[]): DiagramModel {
  const { EI } = basisOf(member);
  const of = (each: CurvesOf) => curvesAt(member, each, places);
  const envelope = of('envelope');
  return { chosen: which === 'envelope' ? envelope : of(which), envelope, EI };
}

function curvesAt(member: Member, which: CurvesOf, places: readonly number[]): Curves {
  const known = CURVES.get(member) ?? new Map<string, Curves>();
  CURVES.set(member, known);
  const key = `${which} ${places.length} ${places[0]}`;
  let found = known.get(key);
  if (found === undefined) {
    const { weight, deadFactor } = basisOf(member);
    found = curves(member, weight, which, places, deadFactor);
    known.set(key, found);
  }
  return found;
}

export const QUANTITIES = ['shear', 'moment', 'deflection'] as const;
export type DiagramQuantity = (typeof QUANTITIES)[number];

/** A value of a curve for people: "1680 lb", "5880 ft-lb", "0.36 in", upward "0.12 in up". */
export function showValue(quantity: DiagramQuantity, value: number, EI: number | null, units: Units): string {
  if (quantity === 'shear') return showQuantity('pointLoad', value, units);
  if (quantity === 'moment') return showMoment(value, units);
  if (EI === null) return '';
  const size = showSmall(Math.abs(value) / EI, units);
  return value < 0 && Number.parseFloat(size) !== 0 ? `${size} up` : size;
}

/** The unit that a quantity's values are in. */
export function unitOf(quantity: DiagramQuantity, units: Units): string {
  if (quantity === 'shear') return units === 'us' ? 'lb' : 'kN';
  if (quantity === 'moment') return units === 'us' ? 'ft-lb' : 'kN-m';
  return units === 'us' ? 'in' : 'mm';
}

/** Where an extreme is, to the inch or the centimetre: nobody sets it out, and the cursor reads it closer. */
export function placeText(at: number, units: Units): string {
  const step = units === 'us' ? 1 : fromUnit('length', 10, 'mm');
  return showSpan(Math.round(at / step) * step, units);
}

/** `1680 lb at 0'-0"`, where asked with what brings it: ", D+L, live on span 1". */
export function extremeText(
  quantity: DiagramQuantity,
  extreme: CurveExtreme,
  EI: number | null,
  units: Units,
  withCause: boolean,
): string {
  const place = `${showValue(quantity, extreme.value, EI, units)} at ${placeText(extreme.at, units)}`;
  if (!withCause) return place;
  const { combination, pattern } = extreme;
  return `${place}, ${combination}${pattern === 'all spans' ? '' : `, ${pattern}`}`;
}

/** Largest and smallest of a quantity at one place. */
export function valuesAt(
  member: Member,
  which: CurvesOf,
  at: number,
): Readonly<Record<DiagramQuantity, [number, number]>> {
  const { weight, deadFactor } = basisOf(member);
  const found = curves(member, weight, which, [at], deadFactor);
  const both = (curve: Curve): [number, number] => [curve.max[0]!, curve.min[0]!];
  return { shear: both(found.shear), moment: both(found.moment), deflection: both(found.deflection) };
}

/** Places worth stopping at, in, ascending: ends, supports, where loads stand, begin and end, and the extremes. */
export function placesOfNote(member: Member, which: CurvesOf, model: DiagramModel): number[] {
  const places = [0, beamLength(member.beam), ...supportPlaces(member.beam)];
  for (const { placed: load } of placedOn(member)) {
    if (load.type === 'point') places.push(load.at);
    else places.push(load.from, load.to);
  }
  for (const quantity of QUANTITIES) {
    const { highest, lowest } = (which === 'envelope' ? model.envelope : model.chosen)[quantity];
    for (const extreme of [highest, lowest]) if (extreme !== null) places.push(extreme.at);
  }
  places.sort((a, b) => a - b);
  return places.filter((place, at) => at === 0 || place - places[at - 1]! > NEAR);
}

/** Places nearer than this are one stop, in. */
const NEAR = 1 / 16;

/** "span 2", "the right overhang", "support 2" where the place is one; empty within a plain span. */
export function whereIs(member: Member, at: number): string {
  const support = supportPlaces(member.beam).findIndex((place) => Math.abs(place - at) < NEAR);
  if (support >= 0) return supportName(member, support);
  if (isPlain(member)) return '';
  const fields = beamFields(member.beam);
  const field = fields.findIndex(({ start, length }) => at <= start + length);
  return placeName(member, field < 0 ? fields.length - 1 : field);
}
