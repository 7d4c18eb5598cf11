import { fieldOfPiece } from '../statics/grid.ts';
import { foundPlaces, largestPlace, type Order, pieceValue, STRIDE, signChanges } from '../statics/piece.ts';
import { zeros } from '../statics/zeros.ts';
import type { Bar, Found } from './bar.ts';
import type { Term } from './effects.ts';
import { type Envelope, pieceUnder, WHOLE, worstPattern } from './envelope.ts';
import type { Pattern } from './patterns.ts';

/** Extremes nearer than this part of a piece are at one place; the value's error is of second order in it. */
const SAME_PLACE = 1e-7;

const NUMBERS = zeros(6);
const SUMMED = zeros(6);
const HEAVY = zeros(6);

/** Works out one piece under one combination: the worst pattern is fixed between the sign changes of the parts. */
export function refine(
  e: Envelope,
  order: Order,
  sign: number,
  c: number,
  p: number,
  bar: Bar,
  found: Found[],
  from: number,
  to: number,
): void {
  if (e.plain[c]) {
    const { data } = e.hi[c]!;
    const o = STRIDE * p;
    for (let i = 0; i < 6; i++)
      NUMBERS[i] = data[o + i]! + (e.dead ? e.deadScale[c]! * e.dead.data[o + i]! : 0);
    consider(e, order, sign, c, p, from, to, WHOLE, bar, found);
    return;
  }
  const cuts = patternCuts(e, order, c, p, from, to);
  const snowLoad = e.parts.kinds.find(({ kind, lifts, parts }) => kind === 'snow' && !lifts && parts);
  const cases = snowLoad && e.list[c]!.factors.snow ? e.parts.snow : null;
  for (let i = 0; i + 1 < cuts.length; i++) {
    const lo = cuts[i]!;
    const hi = cuts[i + 1]!;
    const middle = (lo + hi) / 2;
    const pattern = worstPattern(e, c, sign, (states) => pieceValue(states.data, STRIDE * p, order, middle));
    if (!cases) {
      pieceUnder(e, c, pattern, p, NUMBERS);
      consider(e, order, sign, c, p, lo, hi, pattern, bar, found);
      continue;
    }
    for (const snow of cases) {
      const one = { ...pattern, snow: snow.full };
      pieceUnder(e, c, one, p, NUMBERS);
      consider(e, order, sign, c, p, lo, hi, one, bar, found);
    }
  }
}

/** Ends of the stretches of a piece on which no part that may be absent changes sign. */
function patternCuts(e: Envelope, order: Order, c: number, p: number, from: number, to: number): number[] {
  const cuts = [from, to];
  for (const { kind, lifts, parts } of e.parts.kinds) {
    if (!parts || (kind === 'snow' && !lifts) || !e.list[c]!.factors[kind]) continue;
    for (const part of parts) {
      if (!part) continue;
      const count = signChanges(part.data, STRIDE * p, order, from, to);
      const places = foundPlaces(order);
      for (let i = 0; i < count; i++) cuts.push(places[i]!);
    }
  }
  return cuts.length === 2 ? cuts : cuts.sort((a, b) => a - b);
}

/** Adds the extreme of the numbers in NUMBERS, one fixed pattern, on part of a piece, unless the bar covers it. */
function consider(
  e: Envelope,
  order: Order,
  sign: number,
  c: number,
  p: number,
  lo: number,
  hi: number,
  pattern: Pattern,
  bar: Bar,
  found: Found[],
): void {
  const heaviest = bar.heaviest;
  const own = e.parts.own?.data ?? null;
  const ownAt = STRIDE * p;
  const scale = own ? e.deadScale[c]! : 0;
  const t0 = largestPlace(NUMBERS, 0, order, sign, lo, hi);
  const v0 = sign * pieceValue(NUMBERS, 0, order, t0);
  let perWeight = 0;
  let vH = v0;
  let tH = t0;
  if (scale !== 0 && heaviest !== 0) {
    perWeight = sign * scale * pieceValue(own!, ownAt, order, t0);
    for (let i = 0; i < 6; i++) HEAVY[i] = NUMBERS[i]! + heaviest * scale * own![ownAt + i]!;
    tH = largestPlace(HEAVY, 0, order, sign, lo, hi);
    vH = sign * pieceValue(HEAVY, 0, order, tH);
  }
  if ((v0 <= 0 && vH <= 0) || bar.covers(v0, vH)) return;
  const start = e.parts.grid.edges[p]!;
  const moves = Math.abs(tH - t0) > SAME_PLACE * (e.parts.grid.edges[p + 1]! - start);
  let valueAt: Term['valueAt'] = null;
  let placeAt: Term['placeAt'] = null;
  let raised = bar.raise(v0, perWeight);
  if (moves) {
    const base = NUMBERS.slice();
    const weight = own!.slice(ownAt, ownAt + 6);
    const largestAt = (w: number) => {
      for (let i = 0; i < 6; i++) SUMMED[i] = base[i]! + w * scale * weight[i]!;
      return largestPlace(SUMMED, 0, order, sign, lo, hi);
    };
    valueAt = (w) => {
      const t = largestAt(w);
      return sign * pieceValue(SUMMED, 0, order, t);
    };
    placeAt = (w) => start + largestAt(w);
    const slopeH = sign * scale * pieceValue(own!, ownAt, order, tH);
    raised |= bar.raise(vH - heaviest * slopeH, slopeH);
  }
  const term: Found = {
    base: v0,
    perWeight,
    valueAt,
    placeAt,
    combination: c,
    pattern,
    at: start + t0,
    place: fieldOfPiece(e.parts.grid, p),
    piece: p,
  };
  bar.owned(raised, term);
  found.push(term);
}
