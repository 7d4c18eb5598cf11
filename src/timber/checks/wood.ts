import { type Candidate, candidateAt, candidatesOf, glulamGroup } from '../candidates.ts';
import { type FlatRule, flatUse, flatUseStiffness } from '../factors/flat-use.ts';
import { incising } from '../factors/incising.ts';
import { type RepetitiveRule, repetitiveFactor } from '../factors/repetitive.ts';
import { type SizeRule, sizeFactor } from '../factors/size.ts';
import { temperatureFactor } from '../factors/temperature.ts';
import { type VolumeRule, volumeSection } from '../factors/volume.ts';
import { type Property, WET_EXEMPT, type WetRule, wetService } from '../factors/wet-service.ts';
import type { Member, Section, Stock } from '../member.ts';
import { isRefusal } from '../reference-values.ts';
import { liesFlat, pieceThickness, pieceWidth, standingDepth, standingWidth } from '../standing.ts';
import { SP } from '../tables/species.ts';
import { ownWeight } from '../weight.ts';

/** What a member says of its wood beside the size. */
export type WoodConditions = Pick<
  Member,
  'stock' | 'service' | 'temperature' | 'incised' | 'repetitive' | 'typedFactors'
>;

/** Which of the factors' rules a stock follows. */
export interface WoodRules {
  readonly wet: WetRule;
  readonly repetitive: RepetitiveRule;
  readonly volume: VolumeRule;
  /** Fv of notched members, and of glulam struck or notched (Table 5A note): Fvx x 0.72. */
  readonly notchedShear: number;
}

/** What a row comes to under the conditions, but for what the size brings. */
interface RowConstants {
  /** Reference Fb, tension at the bottom, at the top. */
  readonly Fb: number;
  readonly FbNeg: number;
  readonly CF: SizeRule;
  /** CM x Ct x Ci on Fb: where wet lumber is exempt, and otherwise. */
  readonly exempt: number;
  readonly service: number;
  /** lb/in³ */
  readonly density: number;
  /** Adjusted, without CD; the stiffnesses without Cfu. */
  readonly Fv: number;
  readonly Fcperp: number;
  readonly E: number;
  readonly Emin: number;
  readonly EyMin: number;
}

/** Stock and conditions, ready to be taken at any size. It keeps the sizes it was taken at: racks are gone through at every nudge. */
export interface Wood {
  readonly conditions: WoodConditions;
  readonly rules: WoodRules;
  readonly candidates: readonly Candidate[];
  readonly rows: readonly RowConstants[];
  /** The size it stands at, set by `sizeWood`. */
  at: SizedWood;
  /** Sizes it was taken at, by `sizeKey`. */
  readonly sizes: Map<number, SizedWood>;
}

/** Everything of a wood at one size that needs no load: in, in², psi, lb/in. */
export interface SizedWood {
  width: number;
  depth: number;
  plies: number;
  flat: boolean;
  /** Index of the row that covers the size; -1 for none. */
  row: number;
  /** As it stands: whole width, depth. */
  b: number;
  d: number;
  area: number;
  modulus: number;
  inertia: number;
  weight: number;
  /** Fb* without CD: all factors but CD, CL, CV and Cfu; tension at the bottom, at the top. */
  FbSagging: number;
  FbHogging: number;
  Cfu: number;
  /** The part of CV that goes with the section. */
  volume: number;
  /** Without CD. */
  Fv: number;
  Fcperp: number;
  E: number;
  Emin: number;
  /** About the weak axis. */
  EyMin: number;
}

/** The shear value of glulam with a notch (NDS Supplement Table 5A, note on Fvx). */
const NOTCHED_GLULAM = 0.72;

const KNOWN = new WeakMap<Stock, readonly Wood[]>();
/** Conditions kept of one stock: those of a session's members, and of the choices a user tries. */
const MOST_CONDITIONS = 32;
const CONDITION_KEYS = [
  'service',
  'temperature',
  'incised',
  'repetitive',
  'typedFactors',
] as const satisfies readonly (keyof WoodConditions)[];

/**
 * The wood of a member, or of another stock under the member's conditions; the same object for the same ones. Throws
 * where the stock has no values.
 */
export function woodOf(member: WoodConditions, stock: Stock = member.stock): Wood {
  const known = KNOWN.get(stock) ?? [];
  const same = known.find(({ conditions }) => CONDITION_KEYS.every((key) => conditions[key] === member[key]));
  if (same !== undefined) return same;
  const candidates = candidatesOf(stock);
  if (isRefusal(candidates)) throw new Error(candidates.refused);
  const { service, temperature, incised, repetitive, typedFactors } = member;
  const conditions = { stock, service, temperature, incised, repetitive, typedFactors };
  const rules = rulesOf(stock);
  const rows = candidates.map((candidate) => rowConstants(conditions, rules, candidate));
  const wood: Wood = { conditions, rules, candidates, rows, at: { ...NOWHERE }, sizes: new Map() };
  KNOWN.set(stock, [...known.slice(1 - MOST_CONDITIONS), wood]);
  return wood;
}

function rowConstants(
  conditions: WoodConditions,
  rules: WoodRules,
  { values, grade }: Candidate,
): RowConstants {
  const on = (property: Property, FbCF: number) => serviceFactors(conditions, rules, property, FbCF);
  return {
    Fb: values.Fb,
    FbNeg: values.FbNeg,
    CF: sizeRule(conditions.stock, grade),
    exempt: on('Fb', WET_EXEMPT),
    service: on('Fb', Number.POSITIVE_INFINITY),
    density: ownWeight(1, values.G, conditions.service),
    Fv: values.Fv * on('Fv', 0),
    Fcperp: values.Fcperp * on('Fcperp', 0),
    E: values.E * on('E', 0),
    Emin: values.Emin * on('E', 0),
    EyMin: values.EyMin * on('E', 0),
  };
}

/** CM x Ct x Ci of a property, typed ones in their place; `FbCF` is Fb x CF, psi. */
function serviceFactors(
  conditions: WoodConditions,
  rules: WoodRules,
  property: Property,
  FbCF: number,
): number {
  const { service, temperature, incised, typedFactors } = conditions;
  const wet = service === 'wet';
  const CM = typedFactors?.CM?.value ?? wetService(wet, rules.wet, property, FbCF);
  const Ct = typedFactors?.Ct?.value ?? temperatureFactor(temperature, wet, property);
  const Ci = typedFactors?.Ci?.value ?? incising(incised, property);
  return CM * Ct * Ci;
}

const NOWHERE: SizedWood = {
  width: Number.NaN,
  depth: 0,
  plies: 0,
  flat: false,
  row: -1,
  b: 0,
  d: 0,
  area: 0,
  modulus: 0,
  inertia: 0,
  weight: 0,
  FbSagging: 0,
  FbHogging: 0,
  Cfu: 1,
  volume: 1,
  Fv: 0,
  Fcperp: 0,
  E: 0,
  Emin: 0,
  EyMin: 0,
};

function rulesOf(stock: Stock): WoodRules {
  switch (stock.product) {
    case 'dimension lumber':
    case 'machine stress rated':
      return { wet: 'lumber', repetitive: 'lumber', volume: 'none', notchedShear: 1 };
    case 'timber':
      return {
        wet: stock.species === SP ? 'southern pine timber' : 'timber',
        repetitive: 'none',
        volume: 'none',
        notchedShear: 1,
      };
    case 'glulam': {
      const volume = glulamGroup(stock) === SP ? 'glulam pine' : 'glulam western';
      return { wet: 'glulam', repetitive: 'none', volume, notchedShear: NOTCHED_GLULAM };
    }
    case 'LVL':
      return { wet: 'as typed', repetitive: 'LVL', volume: 'LVL', notchedShear: 1 };
    case 'custom':
      return { wet: 'as typed', repetitive: 'none', volume: 'none', notchedShear: 1 };
  }
}

/** CF's rule for a row (its grade, not the one asked for: Stud 8 in and deeper is No.3). */
export function sizeRule(stock: Stock, grade: string): SizeRule {
  if (stock.product === 'timber') return 'timber';
  if (stock.product !== 'dimension lumber') return 'none';
  if (stock.species === SP) return 'southern pine';
  if (grade === 'Stud') return 'stud';
  if (grade === 'Utility') return 'utility';
  return grade === 'Construction' || grade === 'Standard' ? 'light framing' : 'lumber';
}

/** Beams & stringers are deeper than wide by more than this, in (NDS 4.1.3); only they have Cfu among timbers. */
const STRINGER_OVER = 2;

/** Cfu's rule for a piece as bought, in. */
export function flatRule(stock: Stock, thick: number, wide: number): FlatRule {
  if (stock.product === 'timber') return wide - thick > STRINGER_OVER ? 'timber' : 'none';
  return stock.product === 'dimension lumber' || stock.product === 'machine stress rated' ? 'lumber' : 'none';
}

/** Sizes kept by one wood: some racks, and the free sizes tried between. */
const MOST_SIZES = 4096;

/** A number by which a size is found again; sizes that share one are told apart by looking. */
function sizeKey({ width, depth, plies, flat }: Section): number {
  return width + depth * 128 + plies * 16384 + (flat ? 131072 : 0);
}

/** Takes the wood at a size; false where its table does not cover it. Costs little for a size it was taken at before. */
export function sizeWood(wood: Wood, section: Section): boolean {
  if (!isAt(wood.at, section)) {
    const key = sizeKey(section);
    const known = wood.sizes.get(key);
    if (known !== undefined && isAt(known, section)) wood.at = known;
    else {
      wood.at = sized(wood, section);
      if (wood.sizes.size >= MOST_SIZES) wood.sizes.clear();
      wood.sizes.set(key, wood.at);
    }
  }
  return wood.at.row >= 0;
}

function isAt(at: SizedWood, { width, depth, plies, flat }: Section): boolean {
  return at.width === width && at.depth === depth && at.plies === plies && at.flat === flat;
}

function sized(wood: Wood, section: Section): SizedWood {
  const { width, depth, plies, flat } = section;
  const at: SizedWood = { ...NOWHERE, width, depth, plies, flat };
  const { stock, repetitive, typedFactors } = wood.conditions;
  at.row = candidateAt(wood.candidates, stock.product, section);
  if (at.row < 0) return at;

  const row = wood.rows[at.row]!;
  const b = standingWidth(section);
  const d = standingDepth(section);
  at.b = b;
  at.d = d;
  at.area = b * d;
  at.modulus = (b * d * d) / 6;
  at.inertia = (b * d * d * d) / 12;
  at.weight = at.area * row.density;

  const thick = pieceThickness(section, stock.product);
  const wide = pieceWidth(section, stock.product);
  const CF = typedFactors?.CF?.value ?? sizeFactor(row.CF, thick, wide);
  const Cr = typedFactors?.Cr?.value ?? repetitiveFactor(wood.rules.repetitive, repetitive, section.plies);
  at.FbSagging = row.Fb * CF * Cr * (row.Fb * CF <= WET_EXEMPT ? row.exempt : row.service);
  at.FbHogging = row.FbNeg * CF * Cr * (row.FbNeg * CF <= WET_EXEMPT ? row.exempt : row.service);
  at.volume = volumeSection(wood.rules.volume, section.flat ? section.depth : section.width, d);
  at.Fv = row.Fv;
  at.Fcperp = row.Fcperp;
  let stiffness = 1;
  at.Cfu = typedFactors?.Cfu?.value ?? 1;
  if (liesFlat(section, stock.product)) {
    const { grade } = wood.candidates[at.row]!;
    const rule = flatRule(stock, thick, wide);
    if (typedFactors?.Cfu === undefined) at.Cfu = flatUse(rule, true, thick, wide, grade);
    stiffness = flatUseStiffness(rule, true, grade);
  }
  at.E = row.E * stiffness;
  at.Emin = row.Emin * stiffness;
  at.EyMin = row.EyMin * stiffness;
  return at;
}
