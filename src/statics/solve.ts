import { type Beam, type BeamLoad, beamFields, type Field, supportPlaces } from './beam.ts';
import { type Grid, gridOf, type PieceLoads, spread } from './grid.ts';
import { M0, M1, Q0, Q1, QE, S0, S1, STRIDE, V0, V1, Y0, Y1 } from './piece.ts';
import { type Response, responseOf } from './response.ts';
import type { States } from './states.ts';
import { zeros } from './zeros.ts';

/** A beam made ready: the equations of its support moments factored, whatever it is to carry. */
export interface BeamSolution {
  readonly beam: Beam;
  /** Left to right. */
  readonly fields: readonly Field[];
  /** in from the member's left end */
  readonly supports: readonly number[];
  /** Exact response at EI = 1 to these loads. */
  respond(loads: readonly BeamLoad[]): Response;
  /** Multipliers of the elimination, one a support. */
  readonly factors: {
    readonly lower: number[];
    readonly pivot: number[];
    readonly upper: number[];
  };
}

/**
 * Prepares a prismatic Euler-Bernoulli beam on level supports. The unknowns are the moments over the supports
 * (theorem of three moments: slopes of neighbouring spans agree), zero slope standing in at a fixed end.
 * The beam must be free of faults (`beamFault`).
 */
export function solveBeam(beam: Beam): BeamSolution {
  const fields = beamFields(beam);
  const supports = supportPlaces(beam);
  const n = beam.supports === 'cantilever' ? 0 : beam.spans.length;
  const lower = zeros(n + 1);
  const pivot = zeros(n + 1);
  const upper = zeros(n + 1);
  for (let i = 0; i <= n; i++) {
    let diagonal = 1;
    let off = 0;
    if (isUnknown(beam, n, i)) {
      const left = i > 0 ? beam.spans[i - 1]! : 0;
      const right = i < n ? beam.spans[i]! : 0;
      lower[i] = left / 6;
      diagonal = (left + right) / 3;
      off = right / 6;
    }
    pivot[i] = diagonal - (i > 0 ? lower[i]! * upper[i - 1]! : 0);
    upper[i] = off / pivot[i]!;
  }
  const solution: BeamSolution = {
    beam,
    fields,
    supports,
    factors: { lower, pivot, upper },
    respond(loads) {
      const grid = gridOf(beam, loads, fields);
      return responseOf(grid, statesOf(solution, grid, spread(grid, loads)));
    },
  };
  return solution;
}

function isUnknown(beam: Beam, n: number, i: number): boolean {
  if (n === 0) return false;
  if (i === 0) return beam.fixed.left;
  if (i === n) return beam.fixed.right;
  return true;
}

/** Space for what each field does by itself with nothing at its left end; beams have at most eight fields. */
const OWN = {
  v: zeros(8),
  m: zeros(8),
  s: zeros(8),
  y: zeros(8),
};
const MOMENTS = zeros(8);

/** Exact states of all pieces and the reactions, at EI = 1, for loads spread over this grid. */
export function statesOf(solution: BeamSolution, grid: Grid, loads: PieceLoads): States {
  const { beam, fields } = solution;
  const data = zeros(STRIDE * grid.count);
  for (let f = 0; f < fields.length; f++) marchField(grid, loads, f, data);
  const endPoint = loads.points[grid.count]!;
  if (beam.supports === 'cantilever') {
    const length = fields[0]!.length;
    const shear = endPoint - OWN.v[0]!;
    start(grid, data, 0, shear, -OWN.m[0]! - shear * length, 0, 0);
    return { data, reactions: [shear] };
  }
  const n = beam.spans.length;
  const reactions = zeros(n + 1);
  const left = fields[0]!.kind === 'overhang' ? 1 : 0;
  const right = fields.length - left - n;
  const last = fields.length - 1;

  // Moments at the outer supports that the overhangs bring, sagging positive.
  const armRight = right ? fields[last]!.length : 0;
  const shearRight = right ? endPoint - OWN.v[last]! : 0;
  const m = MOMENTS;
  for (let i = 0; i <= n; i++) {
    const before = i > 0 ? left + i - 1 : -1;
    const after = i < n ? left + i : -1;
    if (isUnknown(beam, n, i)) {
      m[i] = (before < 0 ? 0 : slopeAfter(fields, before)) - (after < 0 ? 0 : slopeBefore(fields, after));
    } else if (i === 0) m[i] = left ? OWN.m[0]! : 0;
    else m[i] = right ? -OWN.m[last]! - shearRight * armRight : 0;
  }
  const { lower, pivot, upper } = solution.factors;
  for (let i = 0; i <= n; i++) m[i] = (m[i]! - (i > 0 ? lower[i]! * m[i - 1]! : 0)) / pivot[i]!;
  for (let i = n - 1; i >= 0; i--) m[i]! -= upper[i]! * m[i + 1]!;

  let slope = 0;
  for (let i = 0; i < n; i++) {
    const f = left + i;
    const length = fields[f]!.length;
    const ml = m[i]!;
    const mr = m[i + 1]!;
    const shear = (mr - ml - OWN.m[f]!) / length;
    const slopeHere = (ml * length) / 3 + (mr * length) / 6 + slopeBefore(fields, f);
    if (i === 0 && left) {
      const arm = fields[0]!.length;
      const s = (beam.fixed.left ? 0 : slopeHere) - OWN.s[0]!;
      start(grid, data, 0, 0, 0, s, -s * arm - OWN.y[0]!);
      reactions[0]! -= OWN.v[0]!;
    }
    start(grid, data, f, shear, ml, slopeHere, 0);
    reactions[i]! += shear;
    reactions[i + 1]! -= shear + OWN.v[f]!;
    slope = slopeHere - ml * length - ((shear * length) / 2) * length + OWN.s[f]!;
  }
  if (right) {
    const moment = -OWN.m[last]! - shearRight * armRight;
    start(grid, data, last, shearRight, moment, beam.fixed.right ? 0 : slope, 0);
    reactions[n]! += shearRight;
  } else reactions[n]! += endPoint;
  return { data, reactions };
}

/** Slope at the left end of a simple span from its own loads; end moments ml, mr add ml l/3 + mr l/6. */
function slopeBefore(fields: readonly Field[], f: number): number {
  const length = fields[f]!.length;
  return (-OWN.m[f]! * length) / 6 - OWN.y[f]! / length;
}

/** Slope at the right end of a simple span from its own loads; end moments add -ml l/6 - mr l/3. */
function slopeAfter(fields: readonly Field[], f: number): number {
  const length = fields[f]!.length;
  return (OWN.m[f]! * length) / 3 - OWN.y[f]! / length + OWN.s[f]!;
}

/** States of a field under its own loads with no shear, moment, slope or deflection at its left end. */
function marchField(grid: Grid, loads: PieceLoads, field: number, data: number[]): void {
  let v = 0;
  let m = 0;
  let s = 0;
  let y = 0;
  const end = grid.first[field + 1]!;
  for (let p = grid.first[field]!; p < end; p++) {
    const o = STRIDE * p;
    const h = grid.edges[p + 1]! - grid.edges[p]!;
    const q0 = loads.q0[p]!;
    const q1 = loads.q1[p]!;
    v -= loads.points[p]!;
    data[o + Q0] = q0;
    data[o + Q1] = q1;
    data[o + QE] = q0 + q1 * h;
    data[o + V0] = v;
    data[o + M0] = m;
    data[o + S0] = s;
    data[o + Y0] = y;
    y += h * (s - (h / 2) * (m + (h / 3) * (v - (h / 4) * (q0 + (h * q1) / 5))));
    s -= h * (m + (h / 2) * (v - (h / 3) * (q0 + (h * q1) / 4)));
    m += h * (v - (h / 2) * (q0 + (h * q1) / 3));
    v -= h * (q0 + (h * q1) / 2);
    data[o + V1] = v;
    data[o + M1] = m;
    data[o + S1] = s;
    data[o + Y1] = y;
  }
  OWN.v[field] = v;
  OWN.m[field] = m;
  OWN.s[field] = s;
  OWN.y[field] = y;
}

/** Adds to a field what the shear, moment, slope and deflection at its left end bring. */
function start(grid: Grid, data: number[], field: number, v: number, m: number, s: number, y: number): void {
  const origin = grid.edges[grid.first[field]!]!;
  const end = grid.first[field + 1]!;
  for (let p = grid.first[field]!; p < end; p++) {
    const o = STRIDE * p;
    const a = grid.edges[p]! - origin;
    const b = grid.edges[p + 1]! - origin;
    data[o + V0]! += v;
    data[o + M0]! += m + v * a;
    data[o + S0]! += s - a * (m + (v * a) / 2);
    data[o + Y0]! += y + a * (s - (a / 2) * (m + (v * a) / 3));
    data[o + V1]! += v;
    data[o + M1]! += m + v * b;
    data[o + S1]! += s - b * (m + (v * b) / 2);
    data[o + Y1]! += y + b * (s - (b / 2) * (m + (v * b) / 3));
  }
}
