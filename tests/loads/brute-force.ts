import { combinationTable } from '../../src/loads/combinations.ts';
import { LOAD_KINDS, type LoadKind } from '../../src/loads/kinds.ts';
import type { Loading } from '../../src/loads/loading.ts';
import { liftBit, patternName } from '../../src/loads/patterns.ts';
import { type BeamLoad, beamFields, type Field } from '../../src/statics/beam.ts';
import type { Response } from '../../src/statics/response.ts';
import { solveBeam } from '../../src/statics/solve.ts';

/** One combination under one pattern, solved as one load case with nothing shared, cached or pruned. */
export interface Case {
  readonly combination: number;
  readonly pattern: string;
  readonly duration: number;
  readonly response: Response;
}

/** Loads of each kind on each field as the plan beam feels them, from the definitions of domain §2. */
function loadsByField(loading: Loading, w: number): Map<LoadKind, BeamLoad[][]> {
  const fields = beamFields(loading.beam);
  const stretch = Math.hypot(1, loading.slope);
  const byKind = new Map<LoadKind, BeamLoad[][]>();
  for (const kind of LOAD_KINDS) {
    const sign = kind === 'windUp' ? -1 : 1;
    const each: BeamLoad[][] = fields.map(() => []);
    let line = loading.area[kind] * loading.tributary;
    if (kind === 'dead') line = (line + (loading.selfWeight ? w : 0)) * stretch;
    fields.forEach((field, f) => {
      if (line !== 0) each[f]!.push(uniform(field, sign * line));
    });
    for (const load of loading.loads) {
      if (load.kind !== kind) continue;
      // A load of no size is no load: its kind does not count as present.
      if (load.type === 'point' ? load.load === 0 : load.start === 0 && load.end === 0) continue;
      if (load.type === 'point') {
        let f = fields.findIndex((field) => load.at < field.start + field.length);
        if (f < 0) f = fields.length - 1;
        each[f]!.push({ type: 'point', at: load.at, load: sign * load.load });
        continue;
      }
      const along = sign * (kind === 'dead' ? stretch : 1);
      fields.forEach((field, f) => {
        const from = Math.max(field.start, load.from);
        const to = Math.min(field.start + field.length, load.to);
        if (from >= to) return;
        const at = (x: number) =>
          along * (load.start + ((load.end - load.start) * (x - load.from)) / (load.to - load.from));
        each[f]!.push({ type: 'line', from, to, start: at(from), end: at(to) });
      });
    }
    for (const { kind: of, load } of carried(loading, ({ max }, k) =>
      PATTERNED.includes(k) ? Math.max(0, max) : max,
    ))
      if (of === kind) putOn(load, fields, each);
    if (each.some((list) => list.length > 0)) byKind.set(kind, each);
  }
  return byKind;
}

const PATTERNED: readonly LoadKind[] = ['live', 'roofLive', 'snow'];

/** What the links bring by kind, taken from the largest and smallest reaction; repeated ones spread over their stretch. */
function carried(
  { links = [] }: Loading,
  take: (range: { readonly max: number; readonly min: number }, kind: LoadKind) => number,
): { readonly kind: LoadKind; readonly load: BeamLoad }[] {
  return links.flatMap((link) =>
    Object.entries(link.bears ?? {}).flatMap(([kind, range]) => {
      const force = take(range, kind as LoadKind);
      if (force === 0) return [];
      const line = link.type === 'line' ? force / link.every : 0;
      const load: BeamLoad =
        link.type === 'point'
          ? { type: 'point', at: link.at, load: force }
          : { type: 'line', from: link.from, to: link.to, start: line, end: line };
      return [{ kind: kind as LoadKind, load }];
    }),
  );
}

/** Upward parts of reactions by kind and field, each there or not: from what the member's own pattern leaves at the least. */
function liftsByField(loading: Loading): { kind: LoadKind; field: number; loads: BeamLoad[] }[] {
  const fields = beamFields(loading.beam);
  const left = fields.length > 1 ? 0.5 : 1;
  const lifts = carried(loading, ({ max, min }, kind) => {
    if (!PATTERNED.includes(kind) || min >= 0) return 0;
    return min - (kind === 'snow' ? left * Math.max(0, max) : 0);
  });
  return PATTERNED.flatMap((kind) => {
    const each: BeamLoad[][] = fields.map(() => []);
    for (const { kind: of, load } of lifts) if (of === kind) putOn(load, fields, each);
    return each.flatMap((loads, field) => (loads.length > 0 ? [{ kind, field, loads }] : []));
  });
}

/** An even or point load, cut at the fields' ends. */
function putOn(load: BeamLoad, fields: readonly Field[], each: BeamLoad[][]): void {
  if (load.type === 'point') {
    const found = fields.findIndex((field) => load.at < field.start + field.length);
    each[found < 0 ? fields.length - 1 : found]!.push(load);
    return;
  }
  fields.forEach((field, f) => {
    const from = Math.max(field.start, load.from);
    const to = Math.min(field.start + field.length, load.to);
    if (from < to) each[f]!.push({ ...load, from, to });
  });
}

function uniform(field: Field, q: number): BeamLoad {
  return { type: 'line', from: field.start, to: field.start + field.length, start: q, end: q };
}

function times(load: BeamLoad, factor: number): BeamLoad {
  if (load.type === 'point') return { ...load, load: factor * load.load };
  return { ...load, start: factor * load.start, end: factor * load.end };
}

/** The arrangements of snow of ASCE 7 §7.5.1, written out: part of the balanced snow on each field. */
function snowArrangements(n: number): number[][] {
  const list: number[][] = [Array(n).fill(1)];
  if (n === 1) return list;
  for (const end of [0, n - 1]) {
    list.push(Array.from({ length: n }, (_, i) => (i === end ? 1 : 0.5)));
    list.push(Array.from({ length: n }, (_, i) => (i === end ? 0.5 : 1)));
  }
  for (let i = 0; i + 1 < n; i++) {
    list.push(Array.from({ length: n }, (_, k) => (k === i || k === i + 1 ? 1 : 0.5)));
  }
  return list;
}

/** Live load may be left off any field of a member that has several (domain §2). */
function onOff(n: number): number[][] {
  if (n === 1) return [[1]];
  return Array.from({ length: 2 ** n }, (_, mask) => Array.from({ length: n }, (_, f) => (mask >> f) & 1));
}

function subsets<T>(list: readonly T[]): T[][] {
  return Array.from({ length: 2 ** list.length }, (_, mask) => list.filter((_each, i) => (mask >> i) & 1));
}

/** Every combination under every pattern. `deadFactor` null: strength; else the deflection list with that much dead. */
export function everyCase(loading: Loading, w: number, deadFactor: number | null): Case[] {
  const solution = solveBeam(loading.beam);
  const fields = beamFields(loading.beam);
  const n = fields.length;
  const byKind = loadsByField(loading, w);
  const lifts = liftsByField(loading);
  const present = [...byKind.keys(), ...lifts.map(({ kind }) => kind)].filter((kind) => kind !== 'dead');
  const table = combinationTable(present, loading.combinations);
  const list = deadFactor === null ? table.strength : table.deflection;
  const loaded = { live: 0, roofLive: 0, snow: 0 };
  for (const kind of ['live', 'roofLive', 'snow'] as const) {
    byKind.get(kind)?.forEach((loads, f) => {
      if (loads.length > 0) loaded[kind] |= 1 << f;
    });
  }
  const whole = [Array(n).fill(1) as number[]];
  const switches = (kind: LoadKind) =>
    n === 1 && lifts.some((lift) => lift.kind === kind) ? [[0], [1]] : onOff(n);
  const cases: Case[] = [];
  list.forEach((combination, c) => {
    const has = (kind: LoadKind) => byKind.has(kind) && combination.factors[kind] !== undefined;
    for (const live of has('live') ? switches('live') : whole) {
      for (const roofLive of has('roofLive') ? switches('roofLive') : whole) {
        for (const snow of has('snow') ? snowArrangements(n) : whole) {
          for (const lifting of subsets(
            lifts.filter(({ kind }) => combination.factors[kind] !== undefined),
          )) {
            const loads: BeamLoad[] = [];
            for (const [kind, each] of byKind) {
              const factor = (combination.factors[kind] ?? 0) * (kind === 'dead' ? (deadFactor ?? 1) : 1);
              const part = { live, roofLive, snow }[kind as 'live'] ?? whole[0]!;
              each.forEach((list, f) => {
                for (const load of list) loads.push(times(load, factor * part[f]!));
              });
            }
            for (const lift of lifting)
              for (const load of lift.loads) loads.push(times(load, combination.factors[lift.kind]!));
            const bits = (parts: number[]) =>
              parts.reduce((mask, p, f) => (p === 1 ? mask | (1 << f) : mask), 0);
            const pattern = {
              live: bits(live),
              roofLive: bits(roofLive),
              snow: bits(snow),
              lifts: lifting.reduce((mask, { kind, field }) => mask | liftBit(kind, field), 0),
            };
            cases.push({
              combination: c,
              pattern: patternName(pattern, fields, loaded),
              duration: combination.duration,
              response: solution.respond(loads),
            });
          }
        }
      }
    }
  });
  return cases;
}
