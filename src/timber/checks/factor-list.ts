import type { Combination } from '../../loads/effects.ts';
import type { Units } from '../../quantity/index.ts';
import { stabilityReason } from '../factors/beam-stability.ts';
import { flatUseReason, flatUseStiffness } from '../factors/flat-use.ts';
import { incising, incisingReason } from '../factors/incising.ts';
import { loadDurationReason } from '../factors/load-duration.ts';
import { repetitiveFactor, repetitiveReason } from '../factors/repetitive.ts';
import { sizeFactor, sizeReason } from '../factors/size.ts';
import { temperatureFactor, temperatureReason } from '../factors/temperature.ts';
import { volumeReason } from '../factors/volume.ts';
import { type Property, wetService, wetServiceReason } from '../factors/wet-service.ts';
import type { FactorSymbol } from '../member.ts';
import type { Factor } from '../report.ts';
import { liesFlat, pieceThickness, pieceWidth } from '../standing.ts';
import { groupSlenderness, groupStability, momentVolume } from './bending.ts';
import type { TermSet } from './term-set.ts';
import { flatRule, sizeRule, type Wood } from './wood.ts';

/**
 * The factors of a property with their reasons, at the size the wood stands at. CM, Ct, Ci, Cr and Cfu are listed
 * where their condition holds, or where they are typed. Cfu on stiffness is one of timbers alone (Table 4D).
 */
export function serviceFactorList(wood: Wood, property: Property, FbCF: number, units: Units): Factor[] {
  const { service, temperature, incised } = wood.conditions;
  const wet = service === 'wet';
  const list: Factor[] = [];
  if (wet || isTyped(wood, 'CM')) {
    const value = wetService(wet, wood.rules.wet, property, FbCF);
    list.push(factor(wood, 'CM', value, wetServiceReason(wet, wood.rules.wet, property, FbCF, units)));
  }
  if (temperature !== 'normal' || isTyped(wood, 'Ct')) {
    const value = temperatureFactor(temperature, wet, property);
    list.push(factor(wood, 'Ct', value, temperatureReason(temperature, wet, units)));
  }
  if (incised || isTyped(wood, 'Ci')) {
    list.push(factor(wood, 'Ci', incising(incised, property), incisingReason(incised)));
  }
  if (property === 'E') list.push(...stiffnessFactors(wood, units));
  return list;
}

/** CD with its reason. */
export function durationFactor(wood: Wood, value: number, combination: Combination): Factor {
  return factor(wood, 'CD', value, loadDurationReason(combination));
}

/**
 * All factors of Fb in a group of bending, `Fb` being Fb* without CD, `hogging` the sign, `length` that between points
 * of zero moment, in.
 */
export function bendingFactors(
  wood: Wood,
  set: TermSet,
  g: number,
  Fb: number,
  hogging: boolean,
  combination: Combination,
  length: number,
  units: Units,
): Factor[] {
  const { at, conditions, candidates, rules } = wood;
  const { stock, repetitive } = conditions;
  const { values, grade } = candidates[at.row]!;
  const thick = pieceThickness(at, stock.product);
  const wide = pieceWidth(at, stock.product);
  const rule = sizeRule(stock, grade);
  const CF = sizeFactor(rule, thick, wide);
  const usedCF = conditions.typedFactors?.CF?.value ?? CF;
  const list = [durationFactor(wood, set.duration[g]!, combination)];
  list.push(...serviceFactorList(wood, 'Fb', (hogging ? values.FbNeg : values.Fb) * usedCF, units));

  const CL = groupStability(set, g, wood, Fb);
  const CV = momentVolume(wood, length);
  const volume = rules.volume !== 'none' || isTyped(wood, 'CV');
  const lesser = (mine: number, other: number) =>
    volume && other < mine ? '; not applied, the other of CL and CV is the lesser, NDS 5.3.6' : '';
  list.push(factor(wood, 'CL', CL, stabilityOf(wood, set, g, hogging, units) + lesser(CL, CV)));
  if (volume) {
    const width = at.flat ? at.depth : at.width;
    const reason = volumeReason(rules.volume, length, width, at.d, units);
    list.push(factor(wood, 'CV', CV, reason + (CL <= CV && CV < 1 ? lesser(CV, CL) : '')));
  }
  // Glulam and LVL have CV in place of CF; whichever enters the value is listed.
  if (!volume || rule !== 'none' || isTyped(wood, 'CF'))
    list.push(factor(wood, 'CF', CF, sizeReason(rule, thick, wide, units)));
  const flat = liesFlat(at, stock.product);
  if (flat || isTyped(wood, 'Cfu')) {
    const reason = flatUseReason(flatRule(stock, thick, wide), flat, thick, wide, units);
    list.push(factor(wood, 'Cfu', at.Cfu, reason));
  }
  const Cr = repetitiveFactor(rules.repetitive, repetitive, at.plies);
  if (Cr !== 1 || repetitive || isTyped(wood, 'Cr')) {
    list.push(factor(wood, 'Cr', Cr, repetitiveReason(rules.repetitive, repetitive, at.plies, units)));
  }
  return list;
}

/** Cfu on E and Emin where it is not 1: a typed Cfu is one on Fb alone. */
function stiffnessFactors(wood: Wood, units: Units): Factor[] {
  const { at, conditions, candidates } = wood;
  const { stock } = conditions;
  if (!liesFlat(at, stock.product)) return [];
  const thick = pieceThickness(at, stock.product);
  const wide = pieceWidth(at, stock.product);
  const rule = flatRule(stock, thick, wide);
  const value = flatUseStiffness(rule, true, candidates[at.row]!.grade);
  return value === 1 ? [] : [{ symbol: 'Cfu', value, reason: flatUseReason(rule, true, thick, wide, units) }];
}

function stabilityOf(wood: Wood, set: TermSet, g: number, hogging: boolean, units: Units): string {
  const { b, d } = wood.at;
  const lu = set.unbraced[g]!;
  if (lu === 0) return `${hogging ? 'bottom' : 'top'} edge held throughout, NDS 3.3.3`;
  if (d <= b) return 'not deeper than wide, NDS 3.3.3.1';
  return stabilityReason(set.lateral[g]!, lu, d, groupSlenderness(set, g, wood), units);
}

/** A factor; a typed one takes the place of the standard's, with its own reason. */
export function factor(wood: Wood, symbol: FactorSymbol, value: number, reason: string): Factor {
  const typed = wood.conditions.typedFactors?.[symbol];
  return typed === undefined
    ? { symbol, value, reason }
    : { symbol, value: typed.value, reason: `typed: ${typed.reason}` };
}

function isTyped(wood: Wood, symbol: FactorSymbol): boolean {
  return wood.conditions.typedFactors?.[symbol] !== undefined;
}
