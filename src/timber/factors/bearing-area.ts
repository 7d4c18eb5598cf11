import type { Units } from '../../quantity/index.ts';
import { inchesIn } from './wording.ts';

/** NDS 3.10.4: shorter bearings than this, in, are helped by the wood beside them... */
const SHORT = 6;
/** ...where they stand at least this far from the end of the member, in... */
const FROM_END = 3;
/** ...by this much more length, in. */
export const BEARING_MORE = 0.375;

/**
 * Cb of a bearing `length` long whose centre is at `at` on a member from 0 to `memberLength`; in.
 */
export function bearingArea(length: number, at: number, memberLength: number): number {
  return helped(length, at, memberLength) ? (length + BEARING_MORE) / length : 1;
}

/** Why Cb has its value. */
export function bearingAreaReason(length: number, at: number, memberLength: number, units: Units): string {
  const [short, end] = [inchesIn(SHORT, units), inchesIn(FROM_END, units)];
  if (length >= SHORT) return `bearing ${short} or longer, NDS 3.10.4`;
  if (!helped(length, at, memberLength)) return `nearer than ${end} to the end of the member, NDS 3.10.4`;
  const more = units === 'us' ? String(BEARING_MORE) : inchesIn(BEARING_MORE, units);
  return `(lb + ${more})/lb, shorter than ${short}, ${end} or more from the end, NDS 3.10.4`;
}

/** Bearing length, in, that brings force per width over capacity, lb/in over psi, to 1, with the same rule for Cb. */
export function bearingNeeded(withoutCb: number, at: number, memberLength: number): number {
  const shorter = withoutCb - BEARING_MORE;
  if (shorter > 0 && helped(shorter, at, memberLength)) return shorter;
  return withoutCb;
}

function helped(length: number, at: number, memberLength: number): boolean {
  return (
    length < SHORT &&
    at - length / 2 >= FROM_END - ROUNDING &&
    memberLength - at - length / 2 >= FROM_END - ROUNDING
  );
}

/** Floating-point slack on a typed 3 in. */
const ROUNDING = 1e-9;
