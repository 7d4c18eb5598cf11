import type { Units } from '../../quantity/index.ts';
import { inchesIn } from './wording.ts';

/** `lumber`: dimension lumber and MSR (NDS 4.3.9); `LVL` (8.3.7); `none`: timbers, glulam, typed values. */
export type RepetitiveRule = 'lumber' | 'LVL' | 'none';

const REPETITIVE: Readonly<Record<RepetitiveRule, number>> = { lumber: 1.15, LVL: 1.04, none: 1 };

/** Members in contact or near each other that count as repetitive (NDS 4.3.9). */
export const REPETITIVE_PLIES = 3;
/** in, on centers (NDS 4.3.9) */
export const FARTHEST_APART = 24;

/** Cr on Fb: stated, or three plies or more. */
export function repetitiveFactor(rule: RepetitiveRule, stated: boolean, plies: number): number {
  return stated || plies >= REPETITIVE_PLIES ? REPETITIVE[rule] : 1;
}

/** Why Cr has its value. */
export function repetitiveReason(rule: RepetitiveRule, stated: boolean, plies: number, units: Units): string {
  if (rule === 'none') return 'no repetitive use for this product, NDS 4.3.9';
  const clause = rule === 'LVL' ? 'NDS 8.3.7' : 'NDS 4.3.9';
  if (plies >= REPETITIVE_PLIES) return `${plies} plies in contact, ${clause}`;
  if (!stated) return `not repetitive, ${clause}`;
  return `three or more, at most ${inchesIn(FARTHEST_APART, units)} apart, sharing load, ${clause}`;
}
