import { areaToLine } from './area-to-line.ts';
import { liftsOf, loadsOf } from './carried.ts';
import type { LateralCase } from './effects.ts';
import type { LoadKind } from './kinds.ts';
import type { LoadParts } from './parts.ts';

/** A point stands at mid-span within this part of the span. */
const MID_SPAN = 1e-6;

interface Lateral {
  readonly case: LateralCase;
  readonly combinations: readonly number[];
}

/**
 * Sorts combinations by their case of NDS Table 3.3.3: only whole-length uniform loads on a simple span; one point
 * load at its middle and nothing else; anything else, every continuous, overhanging, fixed or cantilevered beam among
 * it. Own weight is a uniform load, so a point load is alone only where own weight is off.
 */
export function lateralCases(parts: LoadParts, combinations: readonly number[]): Lateral[] {
  const { beam, links = [], loads } = parts.loading;
  const simple =
    parts.fields.length === 1 && beam.supports === 'bearings' && !beam.fixed.left && !beam.fixed.right;
  if (!simple) return [{ case: 'other', combinations }];
  if (loads.length === 0 && links.length === 0) return [{ case: 'uniform', combinations }];
  const sorted = new Map<LateralCase, number[]>();
  for (const c of combinations) {
    const found = caseOf(parts, (kind) => (parts.table.strength[c]!.factors[kind] ?? 0) !== 0);
    const list = sorted.get(found);
    if (list) list.push(c);
    else sorted.set(found, [c]);
  }
  return [...sorted].map(([found, list]) => ({ case: found, combinations: list }));
}

function caseOf(parts: LoadParts, acts: (kind: LoadKind) => boolean): LateralCase {
  const { beam, selfWeight } = parts.loading;
  const length = beam.spans[0]!;
  let uniform = selfWeight || (acts('dead') && areaToLine(parts.loading, 'dead') !== 0);
  for (const { kind } of parts.kinds) if (acts(kind) && areaToLine(parts.loading, kind) !== 0) uniform = true;
  let points = 0;
  for (const load of [...loadsOf(parts.loading), ...liftsOf(parts.loading)]) {
    if (!acts(load.kind)) continue;
    if (load.type === 'point') {
      if (load.load === 0) continue;
      if (Math.abs(load.at - length / 2) > MID_SPAN * length) return 'other';
      points++;
    } else if (load.start !== 0 || load.end !== 0) {
      const whole = load.from <= MID_SPAN * length && load.to >= length * (1 - MID_SPAN);
      if (!whole || load.start !== load.end) return 'other';
      uniform = true;
    }
  }
  if (points === 0) return 'uniform';
  return uniform ? 'other' : 'point at mid-span';
}
