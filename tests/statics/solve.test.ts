import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import type { Beam, BeamLoad } from '../../src/statics/beam.ts';
import { beamFields, beamLength, supportPlaces } from '../../src/statics/beam.ts';
import {
  DEFLECTION,
  LOAD,
  M1,
  MOMENT,
  pieceValue,
  QE,
  S1,
  SHEAR,
  SLOPE,
  STRIDE,
  V1,
  Y1,
} from '../../src/statics/piece.ts';
import { solveBeam } from '../../src/statics/solve.ts';
import { anyBeam, anyLoad, anyLoadedBeam, beam, line, point } from './beams.ts';
import { fixedMoments, segmentsOf } from './segments.ts';

/** Sum of the loads' sizes without sign, lb: what rounding is measured against. */
function gross(loads: readonly BeamLoad[]): number {
  return loads.reduce(
    (sum, load) =>
      sum +
      (load.type === 'point'
        ? Math.abs(load.load)
        : (Math.abs(load.start) + Math.abs(load.end)) * (load.to - load.from)),
    0,
  );
}

function total(load: BeamLoad): { force: number; moment: number } {
  if (load.type === 'point') return { force: load.load, moment: load.load * load.at };
  const { from, to, start, end } = load;
  const h = to - from;
  return {
    force: ((start + end) / 2) * h,
    moment: ((start + end) / 2) * h * from + (h * h * (start + 2 * end)) / 6,
  };
}

/** Places along a beam that are not singled out by anything. */
function places(on: Beam): number[] {
  const length = beamLength(on);
  return Array.from({ length: 13 }, (_, i) => ((i + 0.377) / 13.5) * length);
}

const RUNS = { numRuns: 200 };

describe('solveBeam', () => {
  test('balances forces and moments on any beam under any loads', () => {
    fc.assert(
      fc.property(anyLoadedBeam, ({ on, loads }) => {
        const solution = solveBeam(on);
        const response = solution.respond(loads);
        const { reactions } = response;
        const held = fixedMoments(solution, response);
        const force = gross(loads);
        const length = beamLength(on);
        const sum = loads.map(total);
        const up = reactions.reduce((a, r) => a + r, 0);
        expect(Math.abs(up - sum.reduce((a, s) => a + s.force, 0))).toBeLessThanOrEqual(1e-10 * force);
        const turning = supportPlaces(on).reduce((a, x, i) => a + x * reactions[i]!, 0);
        const residue = turning - sum.reduce((a, s) => a + s.moment, 0) - held.left - held.right;
        expect(Math.abs(residue)).toBeLessThanOrEqual(1e-10 * force * length);
      }),
      RUNS,
    );
  });

  test('does not deflect at supports, nor turn at fixed ends, and is free of force at free ends', () => {
    fc.assert(
      fc.property(anyLoadedBeam, ({ on, loads }) => {
        const response = solveBeam(on).respond(loads);
        const length = beamLength(on);
        const force = gross(loads);
        const supports = supportPlaces(on);
        for (const x of supports) {
          expect(Math.abs(response.deflectionAt(x))).toBeLessThanOrEqual(1e-11 * force * length ** 3);
        }
        if (on.fixed.left || on.supports === 'cantilever') {
          expect(Math.abs(response.slopeAt(supports[0]!))).toBeLessThanOrEqual(1e-11 * force * length ** 2);
        }
        if (on.overhangs.right > 0 || on.supports === 'cantilever') {
          expect(Math.abs(response.momentAt(length))).toBeLessThanOrEqual(1e-11 * force * length);
        }
      }),
      RUNS,
    );
  });

  test('gives for loads together the sum of what it gives for each alone', () => {
    fc.assert(
      fc.property(anyLoadedBeam, fc.integer({ min: -4, max: 4 }), ({ on, loads }, factor) => {
        const solution = solveBeam(on);
        const scale = (load: BeamLoad): BeamLoad =>
          load.type === 'point'
            ? { ...load, load: factor * load.load }
            : { ...load, start: factor * load.start, end: factor * load.end };
        const half = Math.floor(loads.length / 2);
        const first = loads.slice(0, half);
        const second = loads.slice(half);
        const together = solution.respond([...first, ...second.map(scale)]);
        const one = solution.respond(first);
        const two = solution.respond(second);
        const length = beamLength(on);
        const force = gross(loads) * (1 + Math.abs(factor));
        for (const x of places(on)) {
          expect(
            Math.abs(together.momentAt(x) - one.momentAt(x) - factor * two.momentAt(x)),
          ).toBeLessThanOrEqual(1e-10 * force * length);
          expect(
            Math.abs(together.deflectionAt(x) - one.deflectionAt(x) - factor * two.deflectionAt(x)),
          ).toBeLessThanOrEqual(1e-10 * force * length ** 3);
        }
        together.reactions.forEach((reaction, i) => {
          expect(Math.abs(reaction - one.reactions[i]! - factor * two.reactions[i]!)).toBeLessThanOrEqual(
            1e-10 * force,
          );
        });
      }),
      RUNS,
    );
  });

  test('gives the mirror image for the mirrored beam', () => {
    fc.assert(
      fc.property(
        anyLoadedBeam.filter(({ on }) => on.supports === 'bearings'),
        ({ on, loads }) => {
          const length = beamLength(on);
          const mirrored: Beam = {
            spans: [...on.spans].reverse(),
            overhangs: { left: on.overhangs.right, right: on.overhangs.left },
            supports: 'bearings',
            fixed: { left: on.fixed.right, right: on.fixed.left },
          };
          const turned = loads.map(
            (load): BeamLoad =>
              load.type === 'point'
                ? point(load.load, length - load.at)
                : line(length - load.to, length - load.from, load.end, load.start),
          );
          const one = solveBeam(on).respond(loads);
          const two = solveBeam(mirrored).respond(turned);
          const force = gross(loads);
          one.reactions.forEach((reaction, i) => {
            expect(Math.abs(reaction - two.reactions[one.reactions.length - 1 - i]!)).toBeLessThanOrEqual(
              1e-9 * force,
            );
          });
          for (const x of places(on)) {
            expect(Math.abs(one.momentAt(x) - two.momentAt(length - x))).toBeLessThanOrEqual(
              1e-9 * force * length,
            );
            expect(Math.abs(one.deflectionAt(x) - two.deflectionAt(length - x))).toBeLessThanOrEqual(
              1e-9 * force * length ** 3,
            );
          }
          for (const quantity of ['moment', 'deflection'] as const) {
            const size = force * length ** (quantity === 'moment' ? 1 : 3);
            const a = one.extremes(quantity);
            const b = two.extremes(quantity);
            expect(Math.abs(a.max.value - b.max.value)).toBeLessThanOrEqual(1e-9 * size);
            expect(Math.abs(a.min.value - b.min.value)).toBeLessThanOrEqual(1e-9 * size);
          }
        },
      ),
      RUNS,
    );
  });

  test('is symmetric where beam and loads are', () => {
    fc.assert(
      fc.property(
        fc.array(fc.integer({ min: 30, max: 300 }), { minLength: 1, maxLength: 3 }),
        fc.nat(1000),
        (half, k) => {
          const spans = [...half, ...[...half].reverse()];
          const length = spans.reduce((a, b) => a + b, 0);
          const at = (k / 1000) * length;
          const { reactions } = solveBeam(beam(spans)).respond([
            point(100, at),
            point(100, length - at),
            line(0, length, 3),
          ]);
          for (const [i, reaction] of reactions.entries()) {
            expect(reaction).toBeCloseTo(reactions[reactions.length - 1 - i]!, 7);
          }
        },
      ),
      RUNS,
    );
  });

  test('obeys the reciprocal theorem: the deflection at A from a load at B is that at B from the same load at A', () => {
    const beamAndPlaces = anyBeam.chain((on) =>
      fc.tuple(
        fc.constant(on),
        fc.double({ min: 0, max: 1, noNaN: true }),
        fc.double({ min: 0, max: 1, noNaN: true }),
      ),
    );
    fc.assert(
      fc.property(beamAndPlaces, ([on, a, b]) => {
        const length = beamLength(on);
        const solution = solveBeam(on);
        const ab = solution.respond([point(1, a * length)]).deflectionAt(b * length);
        const ba = solution.respond([point(1, b * length)]).deflectionAt(a * length);
        expect(Math.abs(ab - ba)).toBeLessThanOrEqual(1e-11 * length ** 3);
      }),
      RUNS,
    );
  });

  test('gives shear as the slope of moment, and moment as minus the curvature of deflection', () => {
    fc.assert(
      fc.property(anyLoadedBeam, ({ on, loads }) => {
        const segments = segmentsOf(solveBeam(on).respond(loads));
        const derived = (c: readonly number[]) => c.slice(1).map((value, i) => (i + 1) * value);
        for (const s of segments) {
          expect(derived(s.moment).map((v) => v + 0)).toEqual(
            [...s.shear].map((v) => v + 0).map((v, i) => expect.closeTo(v, 8 - i)),
          );
          for (const [i, v] of derived(s.slope).entries()) expect(v).toBeCloseTo(-s.moment[i]!, 7);
        }
      }),
      { numRuns: 60 },
    );
  });

  test('finds extremes that no sample exceeds, and that are met at their places', () => {
    fc.assert(
      fc.property(anyLoadedBeam, ({ on, loads }) => {
        const response = solveBeam(on).respond(loads);
        const length = beamLength(on);
        const force = gross(loads);
        const curves = [
          ['moment', response.momentAt, 1],
          ['deflection', response.deflectionAt, 3],
        ] as const;
        for (const [quantity, at, power] of curves) {
          const { max, min } = response.extremes(quantity);
          const slack = 1e-11 * force * length ** power;
          for (let i = 0; i <= 400; i++) {
            const value = at((i / 400) * length);
            expect(value).toBeLessThanOrEqual(max.value + slack);
            expect(value).toBeGreaterThanOrEqual(min.value - slack);
          }
          // A fixed support under an overhang is a jump of moment: its place alone names two values.
          if (quantity === 'deflection') expect(Math.abs(at(max.at) - max.value)).toBeLessThanOrEqual(slack);
        }
      }),
      { numRuns: 80 },
    );
  });

  test('jumps in shear by the point load, and reads the right side of the jump', () => {
    const response = solveBeam(beam([100])).respond([point(60, 40)]);
    expect(response.shearAt(39.999)).toBeCloseTo(36, 9);
    expect(response.shearAt(40)).toBeCloseTo(-24, 9);
    expect(response.shearAt(100)).toBeCloseTo(-24, 9);
  });

  test('sends a load right over a support straight into it', () => {
    for (const [on, at, i] of [
      [beam([100, 80]), 0, 0],
      [beam([100, 80]), 100, 1],
      [beam([100, 80]), 180, 2],
    ] as const) {
      const response = solveBeam(on).respond([point(50, at)]);
      for (const [k, reaction] of response.reactions.entries())
        expect(reaction).toBeCloseTo(k === i ? 50 : 0, 10);
      expect(response.extremes('moment').max.value).toBeCloseTo(0, 9);
    }
  });

  test('measures an overhang from its support, turning of the support included', () => {
    // The loaded span lifts the unloaded overhang: slope wl³/24 at the support times its length.
    const response = solveBeam(beam([100], { right: 30 })).respond([line(0, 100, 2)]);
    expect(response.deflectionAt(130)).toBeCloseTo((-30 * 2 * 100 ** 3) / 24, 4);
  });

  test('takes a line load too short to tell its ends apart for the force that it comes to, wherever it lies', () => {
    // From 1e-16 to 1e-6 of the length; ends of any sizes, so that its growth per inch has no bounds.
    const narrow = anyBeam.chain((on) =>
      fc.record({
        on: fc.constant(on),
        place: fc.oneof(
          fc.double({ min: 0, max: 1, noNaN: true }).map((part) => part * beamLength(on)),
          fc.constantFrom(...supportPlaces(on), beamLength(on)),
        ),
        away: fc.constantFrom(-1e-9, -1e-10, -1e-13, 0, 1e-13, 1e-10, 1e-9),
        exponent: fc.double({ min: -16, max: -6, noNaN: true }),
        start: fc.integer({ min: -50, max: 50 }),
        end: fc.integer({ min: -50, max: 50 }),
      }),
    );
    fc.assert(
      fc.property(narrow, ({ on, place, away, exponent, start, end }) => {
        const length = beamLength(on);
        const to = Math.min(length, Math.max(0, place + away * length));
        const from = Math.max(0, to - 10 ** exponent * length);
        fc.pre(from < to);
        const solution = solveBeam(on);
        const load = line(from, to, start, end);
        const one = solution.respond([load, line(0, length, 1)]);
        const two = solution.respond([point(total(load).force, (from + to) / 2), line(0, length, 1)]);
        // Its force moved within its own length; and 50 lb/in at most on what its ends may move to meet an edge.
        const slack = 50 * ((to - from) ** 2 + 4e-10 * length ** 2);
        for (const x of places(on)) {
          expect(Math.abs(one.momentAt(x) - two.momentAt(x))).toBeLessThanOrEqual(slack);
        }
        const shortest = Math.min(...on.spans);
        one.reactions.forEach((reaction, i) => {
          expect(Math.abs(reaction - two.reactions[i]!)).toBeLessThanOrEqual((10 * slack) / shortest);
        });
        const { max, min } = one.extremes('moment');
        expect(Math.max(max.value, -min.value)).toBeLessThanOrEqual(1.001 * length ** 2);
      }),
      RUNS,
    );
  });

  test('says at the end of each piece what its polynomials come to there', () => {
    fc.assert(
      fc.property(anyLoadedBeam, ({ on, loads }) => {
        const { grid, states } = solveBeam(on).respond(loads);
        const force = gross(loads);
        const length = beamLength(on);
        const ends = [
          [LOAD, QE, 1 / length],
          [SHEAR, V1, 1],
          [MOMENT, M1, length],
          [SLOPE, S1, length ** 2],
          [DEFLECTION, Y1, length ** 3],
        ] as const;
        for (let p = 0; p < grid.count; p++) {
          const h = grid.edges[p + 1]! - grid.edges[p]!;
          for (const [order, end, size] of ends) {
            const off = states.data[STRIDE * p + end]! - pieceValue(states.data, STRIDE * p, order, h);
            expect(Math.abs(off)).toBeLessThanOrEqual(1e-11 * force * size);
          }
        }
      }),
      RUNS,
    );
  });

  // Handbook cases, from memory: wl²/8 over the middle of two equal spans, wl²/12 at fixed ends, wl²/2 of a cantilever.
  test('has the moments of the handbooks over supports and at fixed ends', () => {
    expect(
      solveBeam(beam([120, 120]))
        .respond([line(0, 240, 5)])
        .momentAt(120),
    ).toBeCloseTo((-5 * 120 ** 2) / 8, 6);
    const both = solveBeam(beam([120], { fixed: 'both' }));
    const held = fixedMoments(both, both.respond([line(0, 120, 5)]));
    expect(held.left).toBeCloseTo((-5 * 120 ** 2) / 12, 6);
    expect(held.right).toBeCloseTo((5 * 120 ** 2) / 12, 6);
    const arm = solveBeam(beam([120], { cantilever: true })).respond([line(0, 120, 5)]);
    expect(arm.momentAt(0)).toBeCloseTo((-5 * 120 ** 2) / 2, 6);
    expect(arm.extremes('moment', 0).max.value).toBeCloseTo(0, 6);
  });

  test('lists fields left to right', () => {
    expect(
      beamFields(beam([100, 50], { left: 10, right: 20 })).map((f) => [f.kind, f.start, f.length]),
    ).toEqual([
      ['overhang', 0, 10],
      ['span', 10, 100],
      ['span', 110, 50],
      ['overhang', 160, 20],
    ]);
    expect(beamFields(beam([100], { cantilever: true }))).toEqual([
      { kind: 'overhang', start: 0, length: 100 },
    ]);
  });

  test('answers for one load without minding that the beam was solved for others before', () => {
    const on = beam([90, 110], { right: 30 });
    fc.assert(
      fc.property(fc.array(anyLoad(on), { minLength: 2, maxLength: 2 }), ([a, b]) => {
        const shared = solveBeam(on);
        shared.respond([a!]);
        expect(shared.respond([b!]).reactions).toEqual(solveBeam(on).respond([b!]).reactions);
      }),
      { numRuns: 50 },
    );
  });
});
