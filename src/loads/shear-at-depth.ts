import type { PointLoad } from '../statics/beam.ts';
import { pieceAt } from '../statics/grid.ts';
import { pieceValue, SHEAR, STRIDE, V0, V1 } from '../statics/piece.ts';
import { planLoad } from './area-to-line.ts';
import type { Found } from './bar.ts';
import { liftsOf, loadsOf } from './carried.ts';
import type { ShearAtDepth } from './effects.ts';
import { type Envelope, numberUnder, type ReadPart, worstPattern } from './envelope.ts';
import type { LoadKind } from './kinds.ts';
import type { LoadParts } from './parts.ts';
import type { PatternBook } from './pattern-book.ts';
import { searchStretch } from './search.ts';
import { termValue } from './term-value.ts';

/** One side of a support: shear acts on the field beside it. */
interface Side {
  readonly field: number;
  /** 1: the field runs to the right of its support, -1: to the left. */
  readonly toward: 1 | -1;
  /** Place of the face, in from the member's left end. */
  readonly face: number;
  /** The farthest the place at d may move: the middle between two faces, or a free end. */
  readonly limit: number;
  /** An end held against rotation does not just bear on one surface: shear is taken at the support there. */
  readonly held: boolean;
  readonly points: readonly SidePoint[];
}

/** A point load on a side's field. */
interface SidePoint {
  readonly kind: LoadKind;
  readonly lifts: boolean;
  readonly at: number;
  /** lb, downward positive */
  readonly load: number;
  /** Shear just inside the support from this load alone, lb; solved when first asked for. */
  shear(): number;
}

/**
 * Shear by NDS 3.4.3.1 for loads on the top of a member that bears on its bottom: at d from each face, so that line
 * loads within d count for nothing; a point load x from the face, x < d, counts with x/d of its shear at the support.
 * Farther inside shear is taken as it is. Returns the largest by duration for a depth, in, and own weight, lb/in.
 */
export function shearBeyond(e: Envelope, book: PatternBook): (depth: number, w: number) => ShearAtDepth[] {
  const { parts } = e;
  const sides = sidesOf(parts);
  const mixed = [...loadsOf(parts.loading), ...liftsOf(parts.loading)].some(
    (load) => (load.type === 'point' ? load.load : Math.min(load.start, load.end)) < 0,
  );
  return (depth, w) => {
    const places = sides.map((side) => placeAtDepth(side, depth));
    const readers = sides.map((side, i) => readerAt(parts, side, depth, places[i]!));
    const result: ShearAtDepth[] = [];
    for (const { duration, combinations } of parts.table.byDuration) {
      let best: Found | null = null;
      let value = 0;
      const offer = (found: Found) => {
        const size = termValue(found, w);
        if (size <= value * (1 + 1e-12)) return;
        value = size;
        best = found;
      };
      sides.forEach((side, i) => {
        for (const c of combinations) {
          offer(shearUnder(e, c, 1, side, places[i]!, readers[i]!));
          offer(shearUnder(e, c, -1, side, places[i]!, readers[i]!));
        }
      });
      // Where all loads push one way shear only falls along a field and is largest at d from its faces.
      const upward = mixed ? combinations : combinations.filter((c) => e.list[c]!.factors.windUp);
      if (upward.length > 0) {
        parts.fields.forEach((field, f) => {
          let lo = field.start;
          let hi = field.start + field.length;
          sides.forEach((side, i) => {
            if (side.field !== f) return;
            if (side.toward > 0) lo = places[i]!;
            else hi = places[i]!;
          });
          for (const found of searchStretch(e, SHEAR, [1, -1], upward, lo, hi, w)) offer(found);
        });
      }
      if (best) result.push({ duration, value, term: book.term(best) });
    }
    return result;
  };
}

function placeAtDepth(side: Side, depth: number): number {
  if (side.held) return side.face;
  const at = side.face + side.toward * depth;
  return side.toward > 0 ? Math.min(at, side.limit) : Math.max(at, side.limit);
}

function shearUnder(e: Envelope, c: number, sign: number, side: Side, at: number, read: ReadPart): Found {
  const pattern = worstPattern(e, c, sign, read);
  const own = e.parts.own ? read(e.parts.own, null, -1, false) : 0;
  return {
    base: sign * numberUnder(e, c, pattern, read),
    perWeight: sign * e.deadScale[c]! * own,
    valueAt: null,
    placeAt: null,
    combination: c,
    pattern,
    at,
    place: side.field,
    piece: 0,
  };
}

/** Reads the shear that a load part brings at d from a side's face, its near point loads scaled. */
function readerAt(parts: LoadParts, side: Side, depth: number, at: number): ReadPart {
  const { grid } = parts;
  let p = pieceAt(grid, at);
  // From the left the shear before a point load that stands just there.
  if (side.toward > 0 && grid.edges[p]! >= at - grid.tolerance) p = Math.max(grid.first[side.field]!, p - 1);
  if (side.toward > 0) p = Math.max(grid.first[side.field]!, p);
  else p = Math.min(grid.first[side.field + 1]! - 1, p);
  const t = at - grid.edges[p]!;
  const near: { kind: LoadKind; lifts: boolean; change: number }[] = [];
  if (!side.held) {
    for (const point of side.points) {
      const x = Math.max(0, side.toward * (point.at - side.face));
      if (x >= depth) continue;
      const passed = side.toward * (at - point.at) > grid.tolerance;
      const shear = point.shear();
      const here = shear - (passed ? side.toward * point.load : 0);
      near.push({ kind: point.kind, lifts: point.lifts, change: (x / depth) * shear - here });
    }
  }
  return (states, kind, field, lifts) => {
    let shear = pieceValue(states.data, STRIDE * p, SHEAR, t);
    if (field < 0 || field === side.field)
      for (const point of near) if (point.kind === kind && point.lifts === lifts) shear += point.change;
    return shear;
  };
}

function sidesOf(parts: LoadParts): Side[] {
  const { fields, loading, solution } = parts;
  const { beam, bearing } = loading;
  const last = solution.supports.length - 1;
  const cantilever = beam.supports === 'cantilever';
  const sides: Side[] = [];
  const leading = !cantilever && fields[0]!.kind === 'overhang' ? 1 : 0;
  fields.forEach((field, f) => {
    const end = field.start + field.length;
    const leftSupport = f - leading;
    const hasLeft = leftSupport >= 0;
    const hasRight = !cantilever && leftSupport + 1 <= last;
    const left = hasLeft ? field.start + (bearing[leftSupport] ?? 0) / 2 : field.start;
    const right = hasRight ? end - (bearing[leftSupport + 1] ?? 0) / 2 : end;
    const middle = (left + right) / 2;
    const held = (i: number) =>
      cantilever || (i === 0 && beam.fixed.left) || (i === last && beam.fixed.right);
    if (hasLeft) {
      const face = held(leftSupport) ? field.start : left;
      const points = pointsOf(parts, f, 1);
      sides.push({
        field: f,
        toward: 1,
        face,
        limit: hasRight ? middle : end,
        held: held(leftSupport),
        points,
      });
    }
    if (hasRight) {
      const i = leftSupport + 1;
      const face = held(i) ? end : right;
      sides.push({
        field: f,
        toward: -1,
        face,
        limit: hasLeft ? middle : field.start,
        held: held(i),
        points: pointsOf(parts, f, -1),
      });
    }
  });
  return sides;
}

function pointsOf(parts: LoadParts, f: number, toward: 1 | -1): SidePoint[] {
  const { fields, grid, loading } = parts;
  const field = fields[f]!;
  const end = field.start + field.length;
  const isLast = f === fields.length - 1;
  const points: SidePoint[] = [];
  const pressing = loadsOf(loading);
  for (const [index, typed] of [...pressing, ...liftsOf(loading)].entries()) {
    const load = planLoad(typed, loading.slope);
    if (load.type !== 'point' || load.load === 0) continue;
    if (load.at < field.start - grid.tolerance || load.at > end + grid.tolerance) continue;
    const freeEnd = isLast && field.kind === 'overhang';
    // A load right over a support goes straight into it.
    if (load.at >= end - grid.tolerance && !freeEnd) continue;
    let shear: number | null = null;
    points.push({
      kind: typed.kind,
      lifts: index >= pressing.length,
      at: load.at,
      load: load.load,
      shear: () => {
        shear ??= shearInside(parts, f, toward, load);
        return shear;
      },
    });
  }
  return points;
}

function shearInside(parts: LoadParts, f: number, toward: 1 | -1, load: PointLoad): number {
  const { states, grid } = parts.solution.respond([load]);
  if (toward < 0) return states.data[STRIDE * (grid.first[f + 1]! - 1) + V1]!;
  // A load at the very start of the field stands outside the shear read there.
  const atStart = load.at <= parts.fields[f]!.start + parts.grid.tolerance;
  return states.data[STRIDE * grid.first[f]! + V0]! + (atStart ? load.load : 0);
}
