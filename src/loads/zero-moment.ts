import { foundPlaces, MOMENT, pieceValue, STRIDE, signChanges } from '../statics/piece.ts';
import { zeros } from '../statics/zeros.ts';
import type { Found } from './bar.ts';
import { type Envelope, pieceUnder } from './envelope.ts';

/** Moments this near to zero against the extreme are zero. */
const ZERO = 1e-9;
const NUMBERS = zeros(6);

/**
 * Length between the points of zero moment on either side of an extreme, in (NDS 5.3.6), under the term's own
 * combination and pattern: the longer of those without own weight and with the heaviest. It ends at a fixed support
 * and at the member's ends.
 */
export function zeroMomentLength(e: Envelope, term: Found, heaviest: number): number {
  const { beam } = e.parts.loading;
  // Nothing but its ends on a simple span under one-way loads: no need to look.
  if (e.plain[term.combination] && e.parts.fields.length === 1 && e.parts.grid.count === 1) {
    const oneWay = beam.supports === 'bearings' && !beam.fixed.left && !beam.fixed.right;
    if (oneWay) return beam.spans[0]!;
  }
  const light = lengthAt(e, term, 0);
  return heaviest > 0 && e.parts.own ? Math.max(light, lengthAt(e, term, heaviest)) : light;
}

function lengthAt(e: Envelope, term: Found, w: number): number {
  const { grid, loading, solution } = e.parts;
  const stops: number[] = [];
  if (loading.beam.fixed.left) stops.push(solution.supports[0]!);
  if (loading.beam.fixed.right) stops.push(solution.supports[solution.supports.length - 1]!);
  const isStop = (x: number) => stops.some((stop) => Math.abs(stop - x) <= grid.tolerance);
  let left = 0;
  for (let p = term.piece; p >= 0; p--) {
    const root = rootIn(e, term, w, p, -1);
    if (root !== null) {
      left = root;
      break;
    }
    left = grid.edges[p]!;
    if (isStop(left)) break;
  }
  let right = 0;
  for (let p = term.piece; p < grid.count; p++) {
    const root = rootIn(e, term, w, p, 1);
    if (root !== null) {
      right = root;
      break;
    }
    right = grid.edges[p + 1]!;
    if (isStop(right)) break;
  }
  return right - left;
}

/** Nearest zero moment in a piece on one side of the term's place, or null. */
function rootIn(e: Envelope, term: Found, w: number, p: number, side: number): number | null {
  const { grid, own } = e.parts;
  pieceUnder(e, term.combination, term.pattern, p, NUMBERS);
  const scale = own ? w * e.deadScale[term.combination]! : 0;
  if (scale !== 0) for (let i = 0; i < 6; i++) NUMBERS[i]! += scale * own!.data[STRIDE * p + i]!;
  const start = grid.edges[p]!;
  const h = grid.edges[p + 1]! - start;
  const lo = side > 0 ? Math.min(h, Math.max(0, term.at - start)) : 0;
  const hi = side > 0 ? h : Math.max(0, Math.min(h, term.at - start));
  const count = signChanges(NUMBERS, 0, MOMENT, lo, hi);
  const places = foundPlaces(MOMENT);
  if (count > 0) return start + places[side > 0 ? 0 : count - 1]!;
  // A zero that is met exactly at the far edge is no sign change.
  const far = pieceValue(NUMBERS, 0, MOMENT, side > 0 ? h : 0);
  return Math.abs(far) <= ZERO * Math.abs(term.base) ? start + (side > 0 ? h : 0) : null;
}
