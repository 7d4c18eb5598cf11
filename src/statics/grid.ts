import { type Beam, type BeamLoad, beamFields, beamLength, type Field } from './beam.ts';
import { zeros } from './zeros.ts';

/** A member cut into pieces at its supports and wherever a load starts, ends or stands. */
export interface Grid {
  readonly fields: readonly Field[];
  /** Left ends of the pieces, in from the member's left end, then the right end of the last. */
  readonly edges: number[];
  /** Index of the first piece of each field, then the number of pieces. */
  readonly first: readonly number[];
  /** Number of pieces. */
  readonly count: number;
  /** Places nearer than this are one, in. */
  readonly tolerance: number;
}

/** Two places are the same when nearer than this part of the member's length. */
const SAME_PLACE = 1e-10;

/** Cuts a beam at its supports and at the places of `loads`. */
export function gridOf(
  beam: Beam,
  loads: readonly BeamLoad[],
  fields: readonly Field[] = beamFields(beam),
): Grid {
  const length = beamLength(beam);
  const tolerance = SAME_PLACE * length;
  const cuts: number[] = [];
  for (const load of loads) {
    if (load.type === 'point') cuts.push(load.at);
    else cuts.push(load.from, load.to);
  }
  cuts.sort((a, b) => a - b);
  const edges: number[] = [];
  const first: number[] = [];
  let next = 0;
  for (const field of fields) {
    first.push(edges.length);
    edges.push(field.start);
    const end = field.start + field.length - tolerance;
    let last = field.start;
    for (; next < cuts.length && cuts[next]! < end; next++) {
      const cut = cuts[next]!;
      if (cut <= last + tolerance) continue;
      edges.push(cut);
      last = cut;
    }
  }
  first.push(edges.length);
  const count = edges.length;
  edges.push(length);
  return { fields, edges: edges, first, count, tolerance };
}

/** Index of the piece that starts at x or holds it; the last piece for the member's right end. */
export function pieceAt(grid: Grid, x: number): number {
  return Math.min(edgeAt(grid, x), grid.count - 1);
}

/** Index of the last edge that x has reached: at a place that the grid was cut at, the edge there. */
function edgeAt(grid: Grid, x: number): number {
  let lo = 0;
  let hi = grid.count;
  while (lo < hi) {
    const mid = (lo + hi + 1) >> 1;
    if (grid.edges[mid]! <= x + grid.tolerance) lo = mid;
    else hi = mid - 1;
  }
  return lo;
}

/** Index of the field that holds a piece. */
export function fieldOfPiece(grid: Grid, piece: number): number {
  let field = 0;
  while (grid.first[field + 1]! <= piece) field++;
  return field;
}

/** Loads as the pieces of a grid see them. */
export interface PieceLoads {
  /** Line load at the start of each piece, lb/in, and its growth along it, lb/in². */
  readonly q0: number[];
  readonly q1: number[];
  /** Point load at the start of each piece, then at the member's right end, lb. */
  readonly points: number[];
}

/**
 * Spreads loads over the pieces of a grid that was cut at their places. A line load runs from edge to edge; one that is
 * shorter than the grid tells apart is the point load it comes to. Parts outside [from, to) are left out.
 */
export function spread(grid: Grid, loads: readonly BeamLoad[], from = 0, to = grid.count): PieceLoads {
  const q0 = zeros(grid.count);
  const q1 = zeros(grid.count);
  const points = zeros(grid.count + 1);
  const { edges } = grid;
  const stand = (edge: number, load: number) => {
    if (edge === grid.count ? to === grid.count : edge >= from && edge < to) points[edge]! += load;
  };
  for (const load of loads) {
    if (load.type === 'point') {
      stand(edgeAt(grid, load.at), load.load);
      continue;
    }
    const first = edgeAt(grid, load.from);
    const end = edgeAt(grid, load.to);
    if (first === end) {
      stand(first, ((load.start + load.end) / 2) * (load.to - load.from));
      continue;
    }
    const start = edges[first]!;
    const growth = (load.end - load.start) / (edges[end]! - start);
    for (let p = Math.max(from, first); p < Math.min(to, end); p++) {
      q0[p]! += load.start + growth * (edges[p]! - start);
      q1[p]! += growth;
    }
  }
  return { q0, q1, points };
}
