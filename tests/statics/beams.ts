import fc from 'fast-check';
import type { Beam, BeamLoad } from '../../src/statics/beam.ts';
import { beamLength } from '../../src/statics/beam.ts';

/** A beam of these spans, and what else is said of it. */
export function beam(
  spans: number[],
  more: { left?: number; right?: number; fixed?: string; cantilever?: boolean } = {},
): Beam {
  return {
    spans,
    overhangs: { left: more.left ?? 0, right: more.right ?? 0 },
    supports: more.cantilever ? 'cantilever' : 'bearings',
    fixed: { left: /left|both/.test(more.fixed ?? ''), right: /right|both/.test(more.fixed ?? '') },
  };
}

export function point(load: number, at: number): BeamLoad {
  return { type: 'point', at, load };
}

/** A load from `start` to `end` (uniform where one size is given). */
export function line(from: number, to: number, start: number, end = start): BeamLoad {
  return { type: 'line', from, to, start, end };
}

/** Beams of one to six spans with every kind of end, and cantilevers. */
export const anyBeam: fc.Arbitrary<Beam> = fc.oneof(
  {
    weight: 7,
    arbitrary: fc.record({
      spans: fc.array(fc.integer({ min: 30, max: 300 }), { minLength: 1, maxLength: 6 }),
      overhangs: fc.record({
        left: fc.oneof(fc.constant(0), fc.integer({ min: 5, max: 90 })),
        right: fc.oneof(fc.constant(0), fc.integer({ min: 5, max: 90 })),
      }),
      supports: fc.constant('bearings' as const),
      fixed: fc.record({ left: fc.boolean(), right: fc.boolean() }),
    }),
  },
  {
    weight: 1,
    arbitrary: fc.integer({ min: 30, max: 300 }).map((span) => beam([span], { cantilever: true })),
  },
);

/** A load anywhere on a beam, up or down. */
export function anyLoad(on: Beam): fc.Arbitrary<BeamLoad> {
  const length = beamLength(on);
  const place = fc.integer({ min: 0, max: 4096 }).map((k) => (k / 4096) * length);
  const size = fc.integer({ min: -20, max: 60 });
  const lines = fc
    .tuple(place, place, size, size)
    .filter(([a, b]) => a !== b)
    .map(([a, b, start, end]) => line(Math.min(a, b), Math.max(a, b), start, end));
  return fc.oneof(
    lines,
    fc.tuple(size, place).map(([load, at]) => point(10 * load, at)),
  );
}

export const anyLoadedBeam = anyBeam.chain((on) =>
  fc.record({ on: fc.constant(on), loads: fc.array(anyLoad(on), { minLength: 1, maxLength: 6 }) }),
);
