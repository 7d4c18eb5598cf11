import type { LateralCase } from '../../loads/effects.ts';
import type { Units } from '../../quantity/index.ts';
import { inchesIn } from './wording.ts';

/** RB above this is not allowed (NDS 3.3.3.7). */
export const MOST_SLENDER = 50;

/** Lu/d at which the rules of Table 3.3.3 change. */
const SHORT = 7;
const LONG = 14.3;

/**
 * Effective length Le, in, of a beam with the unbraced length `lu` and the depth `d`, in (NDS Table 3.3.3).
 */
export function effectiveLength(load: LateralCase, lu: number, d: number): number {
  const slenderness = lu / d;
  if (load === 'point at mid-span') return slenderness < SHORT ? 1.8 * lu : 1.37 * lu + 3 * d;
  if (slenderness < SHORT) return 2.06 * lu;
  if (load === 'uniform' || slenderness <= LONG) return 1.63 * lu + 3 * d;
  return 1.84 * lu;
}

/** RB (NDS 3.3.3.6). Lengths in in; `b` is the whole width. */
export function slendernessRatio(le: number, b: number, d: number): number {
  return Math.sqrt((le * d) / (b * b));
}

/** FbE = 1.20 Emin' / RB² (NDS 3.3.3.8), Euler's c. */
const EULER = 1.2;
/** Constants of the interaction curve of NDS 3.3.3.8. */
const CURVE = 1.9;
const TAIL = 0.95;

/** CL from Fb* (all factors but CL, Cfu, CV) and Emin' about the weak axis, psi (NDS 3.3.3.8). */
export function beamStability(FbStar: number, EyMin: number, RB: number): number {
  const F = (EULER * EyMin) / (RB * RB) / FbStar;
  const half = (1 + F) / CURVE;
  // The form with the difference of two near numbers in it loses digits for stiff members; this one does not.
  return F / TAIL / (half + Math.sqrt(half * half - F / TAIL));
}

/** Why CL has its value, where the edge is not held throughout. */
export function stabilityReason(load: LateralCase, lu: number, d: number, RB: number, units: Units): string {
  const le = effectiveLengthRule(load, lu, d);
  return `lu ${inchesIn(lu, units, 2)}, lu/d ${round(lu / d)}, le = ${le}, RB ${round(RB)}, NDS 3.3.3`;
}

/** The row of Table 3.3.3 that gives Le: "1.63 lu + 3d". */
export function effectiveLengthRule(load: LateralCase, lu: number, d: number): string {
  const slenderness = lu / d;
  if (load === 'point at mid-span') return slenderness < SHORT ? '1.80 lu' : '1.37 lu + 3d';
  if (slenderness < SHORT) return '2.06 lu';
  return load === 'uniform' || slenderness <= LONG ? '1.63 lu + 3d' : '1.84 lu';
}

function round(value: number): number {
  return Math.round(value * 100) / 100;
}
