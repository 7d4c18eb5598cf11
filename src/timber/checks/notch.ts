import type { Member, Product } from '../member.ts';
import { isSawn } from '../standing.ts';

/** Deepest end notch of sawn lumber, of the depth (NDS 4.4.3). */
const SAWN = 1 / 4;
/** Of glulam and LVL (NDS 5.4.5, 8.4.1), and of glulam also in inches. */
const GLUED = 1 / 10;
const GLULAM_MOST = 3;

/** Floating-point slack on a notch that is just as deep as allowed. */
const ROUNDING = 1e-9;

/** Deepest tension-face notch at an end bearing, in, of a member `d` deep; 0 where none is allowed. */
export function deepestNotch(product: Product, d: number): number {
  if (isSawn(product)) return d * SAWN;
  if (product === 'glulam') return Math.min(d * GLUED, GLULAM_MOST);
  return product === 'LVL' ? d * GLUED : 0;
}

/** Whether the deeper of the two notches is allowed. */
export function notchAllowed(product: Product, d: number, notch: number): boolean {
  return notch <= deepestNotch(product, d) + ROUNDING;
}

/** Why the notches of a member are refused at this depth; null when they are not. */
export function notchRefusal(member: Member, d: number): string | null {
  const place = notchPlaceFault(member);
  if (place !== null) return place;
  const { product } = member.stock;
  const notch = Math.max(member.notch.left, member.notch.right);
  if (notch === 0 || notchAllowed(product, d, notch)) return null;
  if (isSawn(product)) return `notch ${inches(notch)} is deeper than d/4 = ${inches(d * SAWN)}: NDS 4.4.3`;
  if (product === 'glulam') {
    return `notch ${inches(notch)} is deeper than d/10 and 3 in, ${inches(deepestNotch(product, d))}: NDS 5.4.5`;
  }
  if (product === 'LVL')
    return `notch ${inches(notch)} is deeper than d/10 = ${inches(d * GLUED)}: NDS 8.4.1`;
  return 'notches of a custom product are not covered: no clause of NDS 4.4.3, 5.4.5, 8.4.1 applies';
}

/**
 * A tension-face notch stands at an end bearing that is free to turn: at a free end, at a fixed one or at the
 * support of an overhang the bottom face is not the tension face, or there is bending (NDS 4.4.3, 5.4.5).
 */
export function notchPlaceFault(member: Member): string | null {
  for (const end of ['left', 'right'] as const) {
    if (member.notch[end] === 0) continue;
    if (member.beam.supports === 'cantilever' || member.beam.fixed[end]) {
      return `notch.${end}: a notch on the tension face is allowed at a simple end bearing only, NDS 4.4.3, 5.4.5`;
    }
    if (member.beam.overhangs[end] > 0) {
      return `notch.${end}: with an overhang this end has no bearing, and notches are allowed there only, NDS 4.4.3, 5.4.5`;
    }
  }
  return null;
}

/** Shear that a notched end carries, lb: (2/3)·Fv'·b·dn·(dn/d)² (NDS 3.4.3.2). */
export function notchCapacity(Fv: number, b: number, d: number, notch: number): number {
  const dn = d - notch;
  return ((2 * Fv * b * dn) / 3) * (dn / d) * (dn / d);
}

function inches(value: number): string {
  return `${Math.round(value * 1000) / 1000} in`;
}
