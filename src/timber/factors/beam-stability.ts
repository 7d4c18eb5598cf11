import type { LateralCase } from '../../loads/effects.ts';

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
export function stabilityReason(load: LateralCase, lu: number, d: number, RB: number): string {
  const slenderness = lu / d;
  let le: string;
  if (load === 'point at mid-span') le = slenderness < SHORT ? '1.80 lu' : '1.37 lu + 3d';
  else if (slenderness < SHORT) le = '2.06 lu';
  else if (load === 'uniform' || slenderness <= LONG) le = '1.63 lu + 3d';
  else le = '1.84 lu';
  return `lu ${round(lu)} in, lu/d ${round(slenderness)}, le = ${le}, RB ${round(RB)}, NDS 3.3.3`;
}

function round(value: number): number {
  return Math.round(value * 100) / 100;
}
