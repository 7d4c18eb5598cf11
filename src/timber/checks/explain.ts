import type { Units } from '../../quantity/index.ts';
import { beamLength, supportPlaces } from '../../statics/beam.ts';
import { MOST_SLENDER } from '../factors/beam-stability.ts';
import { bearingAreaReason, bearingNeeded } from '../factors/bearing-area.ts';
import type { Section } from '../member.ts';
import { CHECK_IDS, type CheckResult, type Factor, roomForRatios } from '../report.ts';
import { isSawn } from '../standing.ts';
import { bendingCapacity, groupSlenderness } from './bending.ts';
import { bendingFactors, durationFactor, factor, serviceFactorList } from './factor-list.ts';
import { type Governing, governingTerm } from './governing-term.ts';
import { notchCapacity } from './notch.ts';
import type { Prepared } from './prepare.ts';
import {
  BEARING,
  BENDING,
  HOGGING,
  heavyEnough,
  LIVE,
  NOTCH,
  rate,
  SHEAR,
  SLENDERNESS,
  TOTAL,
  UPLIFT,
} from './rate.ts';
import type { Wood } from './wood.ts';

/** All checks of a section that apply, with their words, in the order of CHECK_IDS. The section must not be refused. */
export function explainChecks(
  prepared: Prepared,
  wood: Wood,
  section: Section,
  units: Units = 'us',
): { readonly checks: CheckResult[]; readonly passes: boolean } {
  const ratios = roomForRatios();
  const groups = new Int32Array(CHECK_IDS.length);
  const passes = rate(prepared, wood, section, ratios, groups);
  const checks: CheckResult[] = [];
  ratios.forEach((ratio, id) => {
    if (!Number.isNaN(ratio)) checks.push(explain(prepared, wood, id, ratio, groups[id]!, units));
  });
  return { checks, passes };
}

/**
 * The words of one check: what `rate` found, `g` the group that it named, the wood still at the section rated.
 * Only the reasons for the factors are in `units`.
 */
export function explain(
  prepared: Prepared,
  wood: Wood,
  id: number,
  ratio: number,
  g: number,
  units: Units = 'us',
): CheckResult {
  const p = heavyEnough(prepared, wood);
  if (id === SLENDERNESS) return slenderness(p, wood, ratio, g);
  const found = governingTerm(p, wood, id, g);
  const part = partOf(p, wood, id, found, g, units);
  // Written out: to spread two objects into one takes longer than all else here.
  const check: CheckResult = {
    id: CHECK_IDS[id]!,
    ratio,
    place: found.place,
    at: found.at,
    pattern: patternOf(p, found),
    demand: part.demand,
    capacity: part.capacity,
    unit: part.unit,
    combination: part.combination,
    clause: part.clause,
    factors: part.factors,
  };
  return part.bearingNeeded === undefined ? check : { ...check, bearingNeeded: part.bearingNeeded };
}

type Part = Pick<
  CheckResult,
  'demand' | 'capacity' | 'unit' | 'combination' | 'clause' | 'factors' | 'bearingNeeded'
>;

function partOf(p: Prepared, wood: Wood, id: number, found: Governing, g: number, units: Units): Part {
  switch (id) {
    case SHEAR:
      return shear(p, wood, found, units);
    case BENDING:
      return bending(p, wood, found, g, false, units);
    case HOGGING:
      return bending(p, wood, found, g, true, units);
    case LIVE:
      return deflection(p, wood, found, p.liveLimit, 'IBC Table 1604.3', units);
    case TOTAL: {
      const clause = p.member.creep === 'Kcr' ? 'NDS 3.5.2, IBC Table 1604.3' : 'IBC Table 1604.3 note';
      return deflection(p, wood, found, p.totalLimit, clause, units);
    }
    case BEARING:
      return bearing(p, wood, found, units);
    case UPLIFT:
      return uplift(p, found);
    case NOTCH:
      return notch(p, wood, found, p.notch[g]!, units);
    default:
      throw new Error(`no check ${id}`);
  }
}

function patternOf(p: Prepared, { term }: Governing): string {
  return p.effects.patterns[term.pattern] ?? '';
}

function strengthOf(p: Prepared, { term }: Governing) {
  return p.effects.combinations[term.combination]!;
}

function shear(p: Prepared, wood: Wood, found: Governing, units: Units): Part {
  const combination = strengthOf(p, found);
  return {
    demand: (1.5 * found.demand) / wood.at.area,
    capacity: wood.at.Fv * found.duration,
    unit: 'psi',
    combination: combination.label,
    clause: p.effects.shearAtDepth === null ? 'NDS 3.4.2' : 'NDS 3.4.2, 3.4.3.1',
    factors: [durationFactor(wood, found.duration, combination), ...serviceFactorList(wood, 'Fv', 0, units)],
  };
}

function bending(p: Prepared, wood: Wood, found: Governing, g: number, hogging: boolean, units: Units): Part {
  const set = hogging ? p.hogging : p.sagging;
  const Fb = hogging ? wood.at.FbHogging : wood.at.FbSagging;
  const combination = strengthOf(p, found);
  return {
    demand: found.demand / wood.at.modulus,
    capacity: bendingCapacity(set, g, wood, Fb, found.length),
    unit: 'psi',
    combination: combination.label,
    clause: 'NDS 3.3',
    factors: bendingFactors(wood, set, g, Fb, hogging, combination, found.length, units),
  };
}

function deflection(
  p: Prepared,
  wood: Wood,
  found: Governing,
  limits: readonly number[],
  clause: string,
  units: Units,
): Part {
  return {
    demand: found.demand / (wood.at.E * wood.at.inertia),
    capacity: limits[found.place]!,
    unit: 'in',
    combination: p.effects.deflectionCombinations[found.term.combination]!.label,
    clause,
    factors: serviceFactorList(wood, 'E', 0, units),
  };
}

function bearing(p: Prepared, wood: Wood, found: Governing, units: Units): Part {
  const s = found.place;
  const { b, Fcperp } = wood.at;
  const length = p.bearingLength[s]!;
  const at = supportPlaces(p.member.beam)[s]!;
  const whole = beamLength(p.member.beam);
  const typed = p.member.typedFactors?.Cb !== undefined;
  const Cb: Factor = factor(wood, 'Cb', p.Cb[s]!, bearingAreaReason(length, at, whole, units));
  return {
    demand: found.demand / (b * length),
    capacity: Fcperp * p.Cb[s]!,
    unit: 'psi',
    combination: strengthOf(p, found).label,
    clause: 'NDS 3.10.2',
    factors: [...serviceFactorList(wood, 'Fcperp', 0, units), Cb],
    // A typed Cb holds whatever the length.
    bearingNeeded: typed
      ? found.demand / (b * Fcperp * Cb.value)
      : bearingNeeded(found.demand / (b * Fcperp), at, whole),
  };
}

function uplift(p: Prepared, found: Governing): Part {
  return {
    demand: found.demand,
    capacity: p.tiedDown[found.place]!,
    unit: 'lb',
    combination: strengthOf(p, found).label,
    clause: 'ASCE 7 2.4.1',
    factors: [],
  };
}

function notch(p: Prepared, wood: Wood, found: Governing, depth: number, units: Units): Part {
  const { product } = wood.conditions.stock;
  const combination = strengthOf(p, found);
  const rule = isSawn(product) ? '4.4.3' : product === 'glulam' ? '5.4.5' : '8.4.1';
  const struck = wood.rules.notchedShear;
  const factors = [
    durationFactor(wood, found.duration, combination),
    ...serviceFactorList(wood, 'Fv', 0, units),
  ];
  if (struck !== 1)
    factors.push({ symbol: 'notched', value: struck, reason: 'Fvx of a notched member, Table 5A note' });
  return {
    demand: found.demand,
    capacity: notchCapacity(wood.at.Fv * struck * found.duration, wood.at.b, wood.at.d, depth),
    unit: 'lb',
    combination: combination.label,
    clause: `NDS 3.4.3.2, ${rule}`,
    factors,
  };
}

function slenderness(p: Prepared, wood: Wood, ratio: number, g: number): CheckResult {
  const hogging = g >= p.sagging.count;
  const set = hogging ? p.hogging : p.sagging;
  const group = hogging ? g - p.sagging.count : g;
  const place = set.place[group]!;
  return {
    id: CHECK_IDS[SLENDERNESS]!,
    ratio,
    demand: groupSlenderness(set, group, wood),
    capacity: MOST_SLENDER,
    unit: '',
    combination: '',
    pattern: '',
    place,
    at: p.fields[place]!.start,
    clause: 'NDS 3.3.3.7',
    factors: [],
  };
}
