import type { Loading } from '../../src/loads/loading.ts';
import { supportPlaces } from '../../src/statics/beam.ts';
import type { Response } from '../../src/statics/response.ts';
import { type Segment, segmentsOf } from '../statics/segments.ts';

/** A moment this small against the largest of its field is none. */
const ZERO = 1e-9;

const at = (c: readonly number[], t: number) => c.reduceRight((sum, a) => sum * t + a, 0);

/** Places where a cubic changes sign between 0 and h, bisected between the places where it turns. */
function crossings(c: readonly number[], h: number): number[] {
  const [, b = 0, q = 0, k = 0] = c;
  const disc = 4 * q * q - 12 * k * b;
  const turns = [];
  if (Math.abs(k) > 1e-14 * Math.abs(q)) {
    if (disc > 0) turns.push((-2 * q - Math.sqrt(disc)) / (6 * k), (-2 * q + Math.sqrt(disc)) / (6 * k));
  } else if (q !== 0) turns.push(-b / (2 * q));
  const stops = [0, ...turns.filter((t) => t > 0 && t < h).sort((x, y) => x - y), h];
  return stops.slice(1).flatMap((hi, i) => {
    let [a, z] = [stops[i]!, hi];
    if (at(c, a) * at(c, z) >= 0) return [];
    for (let step = 0; step < 200; step += 1) {
      const middle = (a + z) / 2;
      if (at(c, middle) * at(c, a) > 0) a = middle;
      else z = middle;
    }
    return [a];
  });
}

/** All stretches of a response on which `sign` times the moment is positive, as pieces that join over the supports. */
function stretches(response: Response, sign: number, floor: number, stops: readonly number[]) {
  const pieces: { from: number; to: number; segment: Segment }[] = [];
  for (const segment of segmentsOf(response)) {
    const h = segment.to - segment.from;
    const all = [0, ...crossings(segment.moment, h), h];
    const most = (i: number, by: (m: number) => number) =>
      Math.max(
        ...[0, 0.25, 0.5, 0.75, 1].map((part) =>
          by(at(segment.moment, all[i]! + part * (all[i + 1]! - all[i]!))),
        ),
      );
    // Rounding takes a moment over zero where it only comes up to it, as at a free end.
    const isReal = (i: number) => most(i, Math.abs) > floor;
    const ends = all.filter((_, i) => i === 0 || i === all.length - 1 || (isReal(i - 1) && isReal(i)));
    ends.slice(1).forEach((b, i) => {
      const a = ends[i]!;
      const top = [0, 0.25, 0.5, 0.75, 1].map((part) => sign * at(segment.moment, a + part * (b - a)));
      if (Math.max(...top) > floor) pieces.push({ from: segment.from + a, to: segment.from + b, segment });
    });
  }
  const joined: (typeof pieces)[] = [];
  for (const piece of pieces) {
    const last = joined.at(-1)?.at(-1);
    const touches = last !== undefined && Math.abs(last.to - piece.from) < 1e-9;
    const stands = stops.some((stop) => Math.abs(stop - piece.from) < 1e-9);
    const here = sign * at(piece.segment.moment, piece.from - piece.segment.from);
    if (touches && !stands && here > floor) joined.at(-1)!.push(piece);
    else joined.push([piece]);
  }
  return joined;
}

/** The moments of one sign in a field under one load case, each with the length between its zeros, by plain statics. */
export function momentsOf(
  response: Response,
  { beam, slope }: Loading,
  field: number,
  sign: 1 | -1,
): { readonly moment: number; readonly length: number }[] {
  const { max, min } = response.extremes('moment', field);
  const largest = sign > 0 ? max.value : -min.value;
  if (largest <= 0) return [];
  const supports = supportPlaces(beam);
  const held = beam.supports === 'cantilever' ? { left: false, right: false } : beam.fixed;
  const stops = [...(held.left ? [supports[0]!] : []), ...(held.right ? [supports.at(-1)!] : [])];
  return stretches(response, sign, ZERO * largest, stops).map((pieces) => {
    const length = (pieces.at(-1)!.to - pieces[0]!.from) * Math.hypot(1, slope);
    let moment = 0;
    for (const { from, to, segment } of pieces) {
      if (segment.field !== field) continue;
      const [a, b] = [from - segment.from, to - segment.from];
      const turns = crossings(segment.shear, segment.to - segment.from).filter((t) => t > a && t < b);
      for (const t of [a, ...turns, b]) moment = Math.max(moment, sign * at(segment.moment, t));
    }
    return { moment, length };
  });
}
