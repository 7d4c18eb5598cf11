import { M0, Q0, QE, STRIDE } from '../statics/piece.ts';
import type { Envelope } from './envelope.ts';

/**
 * Whether every load of these combinations presses a simple span down, so that it sags from end to end: its moments are
 * zero at its two ends and nowhere else.
 */
export function isPressedSpan(e: Envelope, combinations: readonly number[]): boolean {
  const { fields, grid, loading } = e.parts;
  const { supports, fixed } = loading.beam;
  const simple = fields.length === 1 && supports === 'bearings' && !fixed.left && !fixed.right;
  return simple && combinations.every((c) => e.plain[c] && sagsThroughout(e, c, grid.count));
}

/** Under line loads that press a moment lies above the chord of a piece: it is positive where that is at its ends. */
function sagsThroughout(e: Envelope, c: number, count: number): boolean {
  const { data } = e.hi[c]!;
  const scale = e.dead ? e.deadScale[c]! : 0;
  const value = (i: number) => data[i]! + (scale === 0 ? 0 : scale * e.dead!.data[i]!);
  for (let p = 0; p < count; p++) {
    const o = STRIDE * p;
    if (value(o + Q0) < 0 || value(o + QE) < 0 || (p > 0 && value(o + M0) <= 0)) return false;
  }
  return true;
}
