import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { compileEffects } from '../../src/loads/compile.ts';
import type { Loading } from '../../src/loads/loading.ts';
import { termValue } from '../../src/loads/term-value.ts';
import { beamFields } from '../../src/statics/beam.ts';
import type { Response } from '../../src/statics/response.ts';
import { segmentsOf } from '../statics/segments.ts';
import { everyCase } from './brute-force.ts';
import { anyCarrier, anyMember, member } from './members.ts';

// NDS 3.4.3.1: uniform loads within d of the face left out, point loads within d counted x/d (x from the face).
function shear(loading: Loading, depth: number, w = 0, duration?: number) {
  const effects = compileEffects({ ...loading, shearAt: 'd' }, { heaviest: 3, deadFactor: 1 });
  const list = effects.shearAtDepth!(depth, w);
  return duration === undefined ? list[0]! : list.find((one) => one.duration === duration)!;
}

const l = 160;
const uniform = member({ spans: [l] }, { area: { dead: 0.1 }, tributary: 60, bearing: [4, 4] });

/** Largest |V| on [lo, hi]: at its ends, at the ends of segments, and where the load changes sign within one. */
function largestShear(response: Response, lo: number, hi: number): number {
  let most = 0;
  const offer = (x: number) => {
    most = Math.max(most, Math.abs(response.shearAt(x)));
  };
  for (const {
    from,
    to,
    shear: [, v1, v2],
  } of segmentsOf(response)) {
    const a = Math.max(lo, from);
    const b = Math.min(hi, to);
    if (a > b || (a === b && lo !== hi)) continue;
    // Just inside the segment, off the jump of a support at its end.
    for (const x of [a, b]) most = Math.max(most, Math.abs(inside(response, from, x)));
    const turn = from - v1! / (2 * v2!);
    if (turn > a && turn < b) offer(turn);
  }
  return most;
}

/** Shear at x by the polynomial of the segment that starts at `from`. */
function inside(response: Response, from: number, x: number): number {
  const segment = segmentsOf(response).find((each) => each.from === from)!;
  const t = x - from;
  return segment.shear[0]! + t * (segment.shear[1]! + t * segment.shear[2]!);
}

describe('shear at d from the face', () => {
  test('of a simple span under a uniform load is w(l/2 - bearing/2 - d)', () => {
    expect(shear(uniform, 12).value).toBeCloseTo(6 * (80 - 2 - 12), 9);
    expect(shear(uniform, 12).term.at).toBeCloseTo(14, 9);
  });

  test('is none where d reaches the middle of the span', () => {
    const effects = compileEffects({ ...uniform, shearAt: 'd' }, { heaviest: 3, deadFactor: 1 });
    expect(effects.shearAtDepth!(90, 0).every((one) => Math.abs(one.value) < 1e-9)).toBe(true);
  });

  test('adds own weight at the weight asked for', () => {
    const { value, term } = shear({ ...uniform, selfWeight: true }, 12, 2);
    expect(value).toBeCloseTo(8 * 66, 9);
    expect(term.base + 2 * term.perWeight).toBeCloseTo(value, 9);
  });

  test('counts a point load x from the face with x/d of its shear', () => {
    const d = 16;
    const at = (x: number) =>
      member(
        { spans: [l] },
        { bearing: [4, 4], loads: [{ kind: 'live', type: 'point', at: 2 + x, load: 1000 }] },
      );
    for (const x of [4, 8, 12]) {
      const reaction = (1000 * (l - 2 - x)) / l;
      // The shear from this load beyond it is what the other support bears.
      const expected = Math.max((x / d) * reaction, 1000 - reaction);
      expect(shear(at(x), d, 0, 1).value).toBeCloseTo(expected, 8);
    }
    expect(shear(at(16), d, 0, 1).value).toBeCloseTo((1000 * (l - 18)) / l, 8);
    expect(shear(at(40), d, 0, 1).value).toBeCloseTo((1000 * (l - 42)) / l, 8);
  });

  test('treats both ends alike: the mirrored member has the same shear', () => {
    fc.assert(
      fc.property(anyMember(3, 3), fc.integer({ min: 4, max: 20 }), (loading, depth) => {
        const { beam } = loading;
        if (beam.supports === 'cantilever') return;
        const length = beam.overhangs.left + beam.spans.reduce((a, b) => a + b, 0) + beam.overhangs.right;
        const mirrored: Loading = {
          ...loading,
          beam: {
            ...beam,
            spans: [...beam.spans].reverse(),
            overhangs: { left: beam.overhangs.right, right: beam.overhangs.left },
            fixed: { left: beam.fixed.right, right: beam.fixed.left },
          },
          loads: loading.loads.map((load) =>
            load.type === 'point'
              ? { ...load, at: length - load.at }
              : { ...load, from: length - load.to, to: length - load.from, start: load.end, end: load.start },
          ),
        };
        const at = (one: Loading) =>
          compileEffects({ ...one, shearAt: 'd' }, { heaviest: 3, deadFactor: 1 }).shearAtDepth!(depth, 1.5);
        const one = at(loading);
        const two = at(mirrored);
        for (const { duration, value } of one) {
          const other = two.find((each) => each.duration === duration)?.value ?? 0;
          expect(Math.abs(value - other)).toBeLessThanOrEqual(1e-9 * Math.max(1, value));
        }
      }),
      { numRuns: 150 },
    );
  });

  test('never exceeds the shear at the supports under downward loads, and comes up to it as d goes to nothing', () => {
    const downward = anyMember(3, 3).map(
      (loading): Loading => ({
        ...loading,
        area: { ...loading.area, windUp: 0 },
        loads: loading.loads.filter((load) => load.kind !== 'windUp'),
        bearing: loading.bearing.map(() => 0),
        shearAt: 'd',
      }),
    );
    fc.assert(
      fc.property(downward, (loading) => {
        const effects = compileEffects(loading, { heaviest: 3, deadFactor: 1 });
        const at = (depth: number) => effects.shearAtDepth!(depth, 1);
        for (const group of effects.shear) {
          const support = Math.max(...group.terms.map((term) => termValue(term, 1)));
          const find = (depth: number) =>
            at(depth).find((one) => one.duration === group.duration)?.value ?? 0;
          for (const depth of [6, 12, 18]) expect(find(depth)).toBeLessThanOrEqual(support * (1 + 1e-9));
          expect(find(1e-7)).toBeGreaterThanOrEqual(support * (1 - 1e-6) - 1e-3);
        }
      }),
      { numRuns: 150 },
    );
  });

  test('is the largest shear between the places at d over every combination and pattern, where there are no points', () => {
    const lines = fc.oneof(anyMember(2, 3), anyCarrier(2, 2)).map(
      (loading): Loading => ({
        ...loading,
        beam: { ...loading.beam, fixed: { left: false, right: false } },
        loads: loading.loads.filter((load) => load.type === 'line'),
        links: (loading.links ?? []).filter((link) => link.type === 'line'),
      }),
    );
    const level = lines.filter((loading) => loading.beam.supports === 'bearings');
    fc.assert(
      fc.property(level, fc.integer({ min: 4, max: 20 }), (loading, depth) => {
        const own = 1.5;
        const fields = beamFields(loading.beam);
        const cut = depth + 3.5 / 2;
        const stretches = fields.map((field, f): [number, number] => {
          const { start, length } = field;
          const end = start + length;
          const middle = start + length / 2;
          if (field.kind === 'span') return [Math.min(start + cut, middle), Math.max(end - cut, middle)];
          return f === 0 ? [start, Math.max(start, end - cut)] : [Math.min(end, start + cut), end];
        });
        const effects = compileEffects({ ...loading, shearAt: 'd' }, { heaviest: 3, deadFactor: 1 });
        const found = effects.shearAtDepth!(depth, own);
        const cases = everyCase(loading, own, null);
        const force = Math.max(...cases.flatMap(({ response }) => response.reactions.map(Math.abs)));
        for (const duration of new Set(cases.map((one) => one.duration))) {
          let expected = 0;
          for (const { response, duration: other } of cases) {
            if (other !== duration) continue;
            for (const [lo, hi] of stretches) expected = Math.max(expected, largestShear(response, lo, hi));
          }
          const value = found.find((one) => one.duration === duration)?.value ?? 0;
          expect(Math.abs(value - expected)).toBeLessThanOrEqual(1e-9 * force);
        }
      }),
      { numRuns: 60 },
    );
  });

  test('is not offered where shear is taken at the support', () => {
    expect(compileEffects(uniform, { heaviest: 3, deadFactor: 1 }).shearAtDepth).toBeNull();
  });

  test('takes no relief at an end held against rotation, which does not bear on one surface', () => {
    const loading = member({ spans: [l], supports: 'cantilever' }, { area: { dead: 0.1 }, tributary: 60 });
    expect(shear(loading, 12).value).toBeCloseTo(6 * l, 9);
  });

  const held = { bearing: [4, 4] };
  const dead = (from: number, to: number, size: number) =>
    ({ kind: 'dead', type: 'line', from, to, start: size, end: size }) as const;
  const live = (at: number, load = 1000) => ({ kind: 'live', type: 'point', at, load }) as const;

  test('is found inside the span where loads push both ways', () => {
    // 10 lb/in down on one half, up on the other: the reactions are wl/4, and the shear in the middle as much.
    const both = member({ spans: [l] }, { ...held, loads: [dead(0, 80, 10), dead(80, l, -10)] });
    expect(shear(both, 12).value).toBeCloseTo(400, 8);
    expect(shear(both, 12).term.at).toBeCloseTo(80, 8);
    // The other half lifted by wind, D + 0.6 W up (ASCE 7 2.4.1): 200 lb of D and 240 lb of 0.6 W in the middle.
    const wind = { kind: 'windUp', type: 'line', from: 80, to: l, start: 20, end: 20 } as const;
    const lifted = member({ spans: [l] }, { ...held, loads: [dead(0, 80, 10), wind] });
    expect(shear(lifted, 12, 0, 1.6).value).toBeCloseTo(440, 8);
    // Dead load alone: 3wl/8 at its end, less what lies within d of the face.
    expect(shear(lifted, 12, 0, 0.9).value).toBeCloseTo(600 - 140, 8);
  });

  test('takes no heed of a load right over a support', () => {
    const two = { spans: [l, l] };
    const plain = member(two, { bearing: [4, 4, 4], area: { live: 0.1 }, tributary: 60 });
    const over = { ...plain, loads: [live(0), live(l), live(2 * l)] };
    expect(shear(over, 12, 0, 1).value).toBeCloseTo(shear(plain, 12, 0, 1).value, 8);
  });

  test('on an overhang counts a load at its free end, near the face by x/d of it', () => {
    const overhang = (arm: number, side: 'left' | 'right') =>
      member(
        { spans: [l], overhangs: { left: 0, right: 0, [side]: arm } },
        { bearing: [4, 4], loads: [live(side === 'left' ? 0 : l + arm)] },
      );
    for (const side of ['left', 'right'] as const) {
      expect(shear(overhang(40, side), 12, 0, 1).value).toBeCloseTo(1000, 8);
      // 8 in from the face; the span bears 1000 x 10 / 160 of it.
      expect(shear(overhang(10, side), 12, 0, 1).value).toBeCloseTo((8 / 12) * 1000, 8);
    }
  });

  test('counts a load at just d in full', () => {
    const at = member({ spans: [l] }, { ...held, loads: [live(14)] });
    expect(shear(at, 12, 0, 1).value).toBeCloseTo((1000 * (l - 14)) / l, 8);
    expect(shear(at, 12 + 1e-9, 0, 1).value).toBeCloseTo((1000 * (l - 14)) / l, 5);
  });

  test('has a face half the bearing from the support, its own at each', () => {
    const loading = (left: number, right: number) =>
      member({ spans: [l] }, { bearing: [left, right], area: { dead: 0.1 }, tributary: 60 });
    expect(shear(loading(4, 20), 12).value).toBeCloseTo(6 * (80 - 2 - 12), 8);
    expect(shear(loading(20, 4), 12).value).toBeCloseTo(6 * (80 - 2 - 12), 8);
    expect(shear(loading(20, 20), 12).value).toBeCloseTo(6 * (80 - 10 - 12), 8);
  });
});
