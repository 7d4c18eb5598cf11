import fc from 'fast-check';
import { LOAD_KINDS, type LoadKind } from '../../src/loads/kinds.ts';
import type { AppliedLoad, Link, Loading } from '../../src/loads/loading.ts';
import type { Beam } from '../../src/statics/beam.ts';
import { beamFields, beamLength } from '../../src/statics/beam.ts';

/** A level member with nothing on it, to which tests add what they are about. Lengths in, loads lb and lb/in. */
export function member(
  beam: Partial<Beam>,
  more: Partial<Omit<Loading, 'area'>> & { area?: Partial<Loading['area']> } = {},
): Loading {
  const whole: Beam = {
    spans: [168],
    overhangs: { left: 0, right: 0 },
    supports: 'bearings',
    fixed: { left: false, right: false },
    ...beam,
  };
  return {
    beam: whole,
    tributary: 72,
    loads: [],
    selfWeight: false,
    combinations: 'ASCE 7-16',
    liveReduction: null,
    slope: 0,
    bearing: [...whole.spans, 0].map(() => 3.5),
    shearAt: 'support',
    ...more,
    area: { dead: 0, live: 0, roofLive: 0, snow: 0, rain: 0, wind: 0, windUp: 0, ...more.area },
  };
}

/** psf to psi */
export const PSF = 1 / 144;

/** Beams of every arrangement: spans, overhangs, fixed ends, cantilevers. */
export function anyBeam(mostSpans: number): fc.Arbitrary<Beam> {
  const length = fc.integer({ min: 40, max: 240 });
  const overhang = fc.oneof(fc.constant(0), fc.integer({ min: 10, max: 80 }));
  const held = fc.oneof({ weight: 3, arbitrary: fc.constant(false) }, fc.constant(true));
  const bearings = fc.record({
    spans: fc.array(length, { minLength: 1, maxLength: mostSpans }),
    overhangs: fc.record({ left: overhang, right: overhang }),
    supports: fc.constant('bearings' as const),
    fixed: fc.record({ left: held, right: held }),
  });
  const cantilever = length.map(
    (span): Beam => ({
      spans: [span],
      overhangs: { left: 0, right: 0 },
      supports: 'cantilever',
      fixed: { left: false, right: false },
    }),
  );
  return fc.oneof({ weight: 6, arbitrary: bearings }, cantilever);
}

/** Such members that carry the reactions of a few others, pressing, lifting or either by the pattern. */
export function anyCarrier(mostSpans: number, mostLinks: number): fc.Arbitrary<Loading> {
  return anyMember(mostSpans, 1).chain((on) => {
    const length = beamLength(on.beam);
    const place = fc.integer({ min: 0, max: 1000 }).map((k) => (k / 1000) * length);
    const force = fc.integer({ min: -400, max: 900 });
    const range = fc.tuple(force, force).map(([a, b]) => ({ max: Math.max(a, b), min: Math.min(a, b) }));
    const whole = force.map((figure) => ({ max: figure, min: figure }));
    const bears = fc
      .record({ dead: whole, windUp: whole, kind: fc.constantFrom('live', 'roofLive', 'snow'), range })
      .map(({ kind, range: of, ...more }) => ({ ...more, [kind]: of }));
    const named = { member: 'J1', end: 'left' } as const;
    const point = fc.record({ at: place, bears }).map((more): Link => ({ ...named, ...more, type: 'point' }));
    const line = fc
      .record({ a: place, b: place, bears, every: fc.integer({ min: 12, max: 96 }) })
      .filter(({ a, b }) => Math.abs(a - b) > 1)
      .map(({ a, b, ...more }): Link => {
        return { ...named, ...more, type: 'line', from: Math.min(a, b), to: Math.max(a, b) };
      });
    const links = fc.array(fc.oneof(point, line), { minLength: 1, maxLength: mostLinks });
    return links.map((list) => ({ ...on, links: list }));
  });
}

/** Members with area loads of up to four kinds and a few line and point loads of any of them. */
export function anyMember(mostSpans: number, mostLoads: number): fc.Arbitrary<Loading> {
  return anyBeam(mostSpans).chain((beam) => {
    const length = beamLength(beam);
    const place = fc.integer({ min: 0, max: 1000 }).map((k) => (k / 1000) * length);
    const size = fc.integer({ min: 0, max: 20 });
    const kinds = fc.subarray([...LOAD_KINDS], { minLength: 1, maxLength: 4 });
    return kinds.chain((some) => {
      const kind = fc.constantFrom(...some);
      const line = fc
        .record({ kind, a: place, b: place, start: size, end: size })
        .filter(({ a, b }) => Math.abs(a - b) > 1)
        .map(({ kind: k, a, b, start, end }): AppliedLoad => {
          return { kind: k, type: 'line', from: Math.min(a, b), to: Math.max(a, b), start, end };
        });
      const point = fc
        .record({ kind, at: place, load: fc.integer({ min: 1, max: 900 }) })
        .map(({ kind: k, at, load }): AppliedLoad => ({ kind: k, type: 'point', at, load }));
      const area = fc.record(
        Object.fromEntries(
          some.map((k) => [k, fc.integer({ min: 0, max: 60 }).map((psf) => psf * PSF)]),
        ) as Record<LoadKind, fc.Arbitrary<number>>,
      );
      return fc
        .record({
          area,
          loads: fc.array(fc.oneof(line, point), { maxLength: mostLoads }),
          selfWeight: fc.boolean(),
          slope: fc.constantFrom(0, 0, 1 / 3),
          combinations: fc.constantFrom('ASCE 7-16' as const, 'ASCE 7-22' as const),
          bearing: fc.constant([...beamFields(beam), 0].map(() => 3.5)),
        })
        .map((more) => member(beam, more));
    });
  });
}
