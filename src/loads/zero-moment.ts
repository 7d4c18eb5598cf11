import { foundPlaces, MOMENT, pieceValue, STRIDE, signChanges } from '../statics/piece.ts';
import type { States } from '../statics/solve.ts';
import { zeros } from '../statics/zeros.ts';
import type { Found } from './bar.ts';
import { type Envelope, numberUnder, pieceUnder } from './envelope.ts';
import type { Pattern } from './patterns.ts';

/** Moments this near to zero against the extreme are zero. */
const ZERO = 1e-9;
const NUMBERS = zeros(6);

/** Moments of two patterns this near to each other are the same. */
const SAME = 1e-9;

/**
 * Length between the points of zero moment on either side of an extreme, in (NDS 5.3.6), under the term's own
 * combination: the longest of its own pattern and those that come to the same moment (live load on the span beside an
 * overhang adds nothing over the support, but draws the zero nearer), without own weight and with the heaviest. It
 * ends at a fixed support and at the member's ends.
 */
export function zeroMomentLength(e: Envelope, term: Found, heaviest: number): number {
  const { beam } = e.parts.loading;
  // Nothing but its ends on a simple span under one-way loads: no need to look.
  if (e.plain[term.combination] && e.parts.fields.length === 1 && e.parts.grid.count === 1) {
    const oneWay = beam.supports === 'bearings' && !beam.fixed.left && !beam.fixed.right;
    if (oneWay) return beam.spans[0]!;
  }
  let longest = 0;
  for (const pattern of equals(e, term)) {
    const same = { ...term, pattern };
    longest = Math.max(longest, lengthAt(e, same, 0));
    if (heaviest > 0 && e.parts.own) longest = Math.max(longest, lengthAt(e, same, heaviest));
  }
  return longest;
}

/** The term's pattern, and those without what adds nothing or with another case of snow that come to its moment. */
function equals(e: Envelope, term: Found): Pattern[] {
  const { combination: c, pattern, piece, at } = term;
  if (e.plain[c]) return [pattern];
  const x = at - e.parts.grid.edges[piece]!;
  const read = (states: States) => pieceValue(states.data, STRIDE * piece, MOMENT, x);
  const moment = numberUnder(e, c, pattern, read);
  const nothing = SAME * Math.abs(moment);
  const busy = { live: pattern.live, roofLive: pattern.roofLive };
  let snow = false;
  for (const { kind, parts } of e.parts.kinds) {
    if (!parts || !e.list[c]!.factors[kind]) continue;
    if (kind === 'snow') snow = true;
    else {
      parts.forEach((part, f) => {
        if (part && Math.abs(read(part)) <= nothing) busy[kind as keyof typeof busy] &= ~(1 << f);
      });
    }
  }
  const found = [pattern];
  for (const full of snow ? e.parts.snow.map((one) => one.full) : [pattern.snow]) {
    const other = { ...busy, snow: full };
    if (Math.abs(numberUnder(e, c, other, read) - moment) <= nothing) found.push(other);
  }
  return found;
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
