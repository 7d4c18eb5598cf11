import type { BeamLoad, Field } from '../statics/beam.ts';
import { type Grid, gridOf, type PieceLoads, spread } from '../statics/grid.ts';
import { type BeamSolution, solveBeam, statesOf } from '../statics/solve.ts';
import type { States } from '../statics/states.ts';
import { zeros } from '../statics/zeros.ts';
import { areaToLine, kindSign, planLoad } from './area-to-line.ts';
import { liftsOf, loadsOf } from './carried.ts';
import { type CombinationTable, combinationTable } from './combinations.ts';
import { LOAD_KINDS, type LoadKind } from './kinds.ts';
import type { AppliedLoad, Loading } from './loading.ts';
import { PARTIAL_SNOW, type SnowCase, SPAN_BY_SPAN, snowCases } from './patterns.ts';
import { slopeStretch } from './slope.ts';

/** What one variable kind does, by the parts that may be present or absent. */
export interface KindStates {
  readonly kind: LoadKind;
  /** What carried members lift with, each field by itself there or not; it is no part of the whole load of the kind. */
  readonly lifts: boolean;
  /** All of it at once. */
  readonly whole: States;
  /** Where it comes in patterns on more than one field: its part on each field, null where it loads nothing. */
  readonly parts: readonly (States | null)[] | null;
  /** Largest and smallest of every number over the kind's own patterns; both `whole` where it has none. */
  readonly hi: States;
  readonly lo: States;
}

/** A member's loads solved one by one on one grid: everything else is arithmetic on these. */
export interface LoadParts {
  readonly loading: Loading;
  readonly solution: BeamSolution;
  readonly grid: Grid;
  readonly fields: readonly Field[];
  /** Own weight of 1 lb/in along the member; null where own weight is off. */
  readonly own: States | null;
  readonly dead: States | null;
  /** Variable kinds that are present, in the order of LOAD_KINDS. */
  readonly kinds: readonly KindStates[];
  readonly table: CombinationTable;
  readonly snow: readonly SnowCase[];
}

/** Solves every load part of a member once, at EI = 1. Cost grows with parts x pieces. */
export function solveParts(loading: Loading): LoadParts {
  const { beam, slope } = loading;
  const solution = solveBeam(beam);
  const { fields } = solution;
  const loads = loadsOf(loading);
  const lifts = liftsOf(loading);
  const grid = gridOf(beam, lifts.length === 0 ? loads : [...loads, ...lifts], fields);
  const units = unitStates(solution, grid);
  const stretch = slopeStretch(slope);

  const partOn = (field: number, line: number, typed: readonly BeamLoad[]): States | null => {
    const unit = line === 0 ? null : scaled(units(field), line);
    if (typed.length === 0) return unit;
    const spreadLoads = spread(grid, typed, grid.first[field]!, grid.first[field + 1]!);
    if (isEmpty(spreadLoads)) return unit;
    const states = statesOf(solution, grid, spreadLoads);
    if (unit) add(states, unit, 1);
    return states;
  };
  const wholeOf = (line: number, typed: readonly BeamLoad[]): States => {
    const states = typed.length > 0 ? statesOf(solution, grid, spread(grid, typed)) : null;
    if (line === 0) return states ?? blankStates(grid, solution.supports.length);
    if (fields.length === 1 && !states) return scaled(units(0), line);
    const target = states ?? blankStates(grid, solution.supports.length);
    for (let f = 0; f < fields.length; f++) add(target, units(f), line);
    return target;
  };

  const kinds: KindStates[] = [];
  const present: LoadKind[] = [];
  let dead: States | null = null;
  for (const kind of LOAD_KINDS) {
    const line = kindSign(kind) * areaToLine(loading, kind);
    const typed = typedLoads(loads, kind, slope);
    const lifting = typedLoads(lifts, kind, slope);
    if (line === 0 && typed.length === 0 && lifting.length === 0) continue;
    if (kind === 'dead') {
      dead = wholeOf(line, typed);
      continue;
    }
    present.push(kind);
    const several = fields.length > 1 || lifting.length > 0;
    if (several && (kind === 'snow' || SPAN_BY_SPAN.includes(kind))) {
      kinds.push(
        patterned(
          kind,
          fields.map((_, f) => partOn(f, line, typed)),
          grid,
          solution,
        ),
      );
    } else {
      const whole = wholeOf(line, typed);
      kinds.push({ kind, lifts: false, whole, parts: null, hi: whole, lo: whole });
    }
    if (lifting.length > 0) {
      const parts = fields.map((_, f) => partOn(f, 0, lifting));
      kinds.push({ ...patterned('live', parts, grid, solution), kind, lifts: true, whole: wholeOf(0, NONE) });
    }
  }
  return {
    loading,
    solution,
    grid,
    fields,
    own: loading.selfWeight
      ? stretch === 1 && fields.length === 1
        ? units(0)
        : wholeOf(stretch, NONE)
      : null,
    dead,
    kinds,
    table: combinationTable(present, loading.combinations),
    snow: snowCases(fields.length),
  };
}

const NONE: readonly BeamLoad[] = [];

function typedLoads(loads: readonly AppliedLoad[], kind: LoadKind, slope: number): readonly BeamLoad[] {
  if (loads.length === 0) return NONE;
  const typed: BeamLoad[] = [];
  for (const load of loads) {
    if (load.kind !== kind) continue;
    if (load.type === 'point' ? load.load === 0 : load.start === 0 && load.end === 0) continue;
    typed.push(planLoad(load, slope));
  }
  return typed;
}

/** States of 1 lb/in on one field, solved when first asked for. */
function unitStates(solution: BeamSolution, grid: Grid): (field: number) => States {
  const made: (States | undefined)[] = [];
  return (field) => {
    let unit = made[field];
    if (!unit) {
      const loads = {
        q0: zeros(grid.count),
        q1: zeros(grid.count),
        points: zeros(grid.count + 1),
      };
      loads.q0.fill(1, grid.first[field]!, grid.first[field + 1]!);
      unit = statesOf(solution, grid, loads);
      made[field] = unit;
    }
    return unit;
  };
}

function isEmpty(loads: PieceLoads): boolean {
  return [loads.q0, loads.q1, loads.points].every((list) => list.every((value) => value === 0));
}

function blankStates(grid: Grid, supports: number): States {
  return { data: zeros(grid.count * 11), reactions: zeros(supports) };
}

export function scaled(states: States, factor: number): States {
  const data = zeros(states.data.length);
  for (let i = 0; i < data.length; i++) data[i] = factor * states.data[i]!;
  const reactions = zeros(states.reactions.length);
  for (let i = 0; i < reactions.length; i++) reactions[i] = factor * states.reactions[i]!;
  return { data, reactions };
}

/** Adds `factor` times some states to others. */
export function add(target: States, states: States, factor: number): void {
  for (let i = 0; i < target.data.length; i++) target.data[i]! += factor * states.data[i]!;
  for (let i = 0; i < target.reactions.length; i++) target.reactions[i]! += factor * states.reactions[i]!;
}

function patterned(
  kind: LoadKind,
  parts: readonly (States | null)[],
  grid: Grid,
  solution: BeamSolution,
): KindStates {
  const blank = () => blankStates(grid, solution.supports.length);
  const whole = blank();
  for (const part of parts) if (part) add(whole, part, 1);
  const hi = blank();
  const lo = blank();
  if (kind === 'snow') {
    const cases = snowCases(parts.length);
    boundSnow(
      cases,
      hi.data,
      lo.data,
      parts.map((part) => part?.data),
    );
    boundSnow(
      cases,
      hi.reactions,
      lo.reactions,
      parts.map((part) => part?.reactions),
    );
  } else {
    for (const part of parts) {
      if (!part) continue;
      addSigned(hi.data, lo.data, part.data);
      addSigned(hi.reactions, lo.reactions, part.reactions);
    }
  }
  return { kind, lifts: false, whole, parts, hi, lo };
}

function addSigned(hi: number[], lo: number[], part: number[]): void {
  for (let i = 0; i < part.length; i++) {
    const value = part[i]!;
    if (value > 0) hi[i]! += value;
    else lo[i]! += value;
  }
}

/** Largest and smallest of every number over the arrangements of snow. */
function boundSnow(
  cases: readonly SnowCase[],
  hi: number[],
  lo: number[],
  parts: readonly (number[] | undefined)[],
): void {
  hi.fill(Number.NEGATIVE_INFINITY);
  lo.fill(Number.POSITIVE_INFINITY);
  const sum = zeros(hi.length);
  for (const { full } of cases) {
    sum.fill(0);
    for (let f = 0; f < parts.length; f++) {
      const part = parts[f];
      if (!part) continue;
      const factor = full & (1 << f) ? 1 : PARTIAL_SNOW;
      for (let i = 0; i < sum.length; i++) sum[i]! += factor * part[i]!;
    }
    for (let i = 0; i < sum.length; i++) {
      if (sum[i]! > hi[i]!) hi[i] = sum[i]!;
      if (sum[i]! < lo[i]!) lo[i] = sum[i]!;
    }
  }
}
