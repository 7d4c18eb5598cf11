import fc from 'fast-check';
import { LOAD_KINDS } from '../../src/loads/kinds.ts';
import type { AppliedLoad } from '../../src/loads/loading.ts';
import { type Beam, beamLength, supportPlaces } from '../../src/statics/beam.ts';
import {
  ASSUMED_KEYS,
  FACTOR_SYMBOLS,
  LIMITS_BY_USE,
  type Member,
  type Stock,
} from '../../src/timber/member.ts';

const double = (min: number, max: number) => fc.double({ min, max, noNaN: true }).map((value) => value + 0);
/** Chosen values as well as any double. */
const length = (min: number, max: number) =>
  fc.oneof(
    double(min, max),
    fc.integer({ min: Math.ceil(min * 16), max: Math.floor(max * 16) }).map((n) => n / 16),
  );
const orNull = <T>(of: fc.Arbitrary<T>) => fc.option(of, { nil: null });

const beam: fc.Arbitrary<Beam> = fc.oneof(
  fc.record({
    spans: fc.array(length(12, 400), { minLength: 1, maxLength: 6 }),
    overhangs: fc.record({ left: fc.oneof(fc.constant(0), length(1, 60)), right: fc.constant(0) }),
    supports: fc.constant('bearings' as const),
    fixed: fc.record({ left: fc.boolean(), right: fc.boolean() }),
  }),
  fc.record({
    spans: fc.array(length(12, 200), { minLength: 1, maxLength: 1 }),
    overhangs: fc.constant({ left: 0, right: 0 }),
    supports: fc.constant('cantilever' as const),
    fixed: fc.constant({ left: false, right: false }),
  }),
);

function loadOn(whole: number): fc.Arbitrary<AppliedLoad> {
  const kind = fc.constantFrom(...LOAD_KINDS);
  const part = double(0, 1);
  return fc.oneof(
    fc
      .record({ kind, a: part, b: part, start: double(-50, 50), end: double(-50, 50), even: fc.boolean() })
      .filter(({ a, b }) => a !== b)
      .map(({ kind, a, b, start, end, even }) => ({
        type: 'line' as const,
        kind,
        from: Math.min(a, b) * whole,
        to: Math.max(a, b) * whole,
        start,
        end: even ? start : end,
      }))
      .filter(({ from, to }) => from < to),
    fc.record({
      type: fc.constant('point' as const),
      kind,
      at: part.map((p) => p * whole),
      load: double(-5000, 5000),
    }),
  );
}

const table = (product: Stock['product'], species: string, grade: string): Stock => ({
  product,
  species,
  grade,
  values: null,
  valuesFrom: null,
});

/** Woods that may stand on a rack beside the member's own. */
const rackWood = fc.constantFrom(
  table('dimension lumber', 'Hem-Fir', 'No.1'),
  table('timber', 'Douglas Fir-Larch', 'No.1'),
  table('glulam', 'Western species', '24F-1.8E'),
  table('LVL', '', 'typical 2.0E'),
  { ...table('LVL', '', 'typical 2.0E'), values: { Fb: 2850 }, valuesFrom: 'report in hand' },
);

const typedFactors = fc
  .dictionary(
    fc.constantFrom(...FACTOR_SYMBOLS),
    fc.record({ value: double(0.01, 10), reason: fc.constantFrom('blocked at mid-span', 'by "test"') }),
  )
  // A plain object, as it is read.
  .map((typed) => ({ ...typed }));

/** Any member that a session may hold: dimension lumber of dressed sizes, whatever else. */
export const member: fc.Arbitrary<Member> = beam.chain((beam) => {
  const supports = supportPlaces(beam).length;
  const bearing = length(1, 12);
  return fc
    .record({
      use: fc.constantFrom(...(['floor', 'roof-plaster', 'roof-ceiling', 'roof'] as const)),
      note: fc.constantFrom('', 'deck girder', 'over the "slip"'),
      count: fc.integer({ min: 1, max: 40 }),
      bearing: fc.oneof(
        bearing.map((one) => new Array<number>(supports).fill(one)),
        fc.array(bearing, { minLength: supports, maxLength: supports }),
      ),
      spacing: orNull(length(6, 100)),
      tributary: length(0, 300),
      area: fc.tuple(...LOAD_KINDS.map(() => fc.oneof(fc.constant(0), double(0, 2)))),
      loads: fc.array(loadOn(beamLength(beam)), { maxLength: 5 }),
      flags: fc.tuple(fc.boolean(), fc.boolean(), fc.boolean(), fc.boolean(), fc.boolean()),
      combinations: fc.constantFrom('ASCE 7-16' as const, 'ASCE 7-22' as const),
      liveReduction: orNull(fc.record({ area: double(1, 1e6), KLL: fc.constantFrom(1, 2) })),
      slope: fc.oneof(fc.constantFrom(0, 4 / 12, 1 / 3, 6.5 / 12), double(0, 2)),
      grade: fc.constantFrom('No.1', 'No.2', 'Select Structural'),
      values: orNull(fc.record({ Fb: double(100, 5000), G: double(0.3, 0.8), E: double(5e5, 3e6) })),
      depth: fc.constantFrom(5.5, 7.25, 9.25, 11.25, 13.25),
      plies: fc.integer({ min: 1, max: 4 }),
      rack: orNull(fc.array(rackWood, { minLength: 1, maxLength: 5 })),
      factors: orNull(typedFactors.filter((typed) => Object.keys(typed).length > 0)),
      most: fc.tuple(orNull(length(4, 40)), orNull(length(2, 20))),
      service: fc.constantFrom('dry' as const, 'wet' as const),
      temperature: fc.constantFrom('normal' as const, '100-125 F' as const),
      bracing: fc.oneof(fc.constantFrom('continuous' as const, 'ends' as const), length(1, 400)),
      bracingBottom: fc.oneof(fc.constantFrom('continuous' as const, 'ends' as const), length(1, 400)),
      shearAt: fc.constantFrom('support' as const, 'd' as const),
      tiedDown: orNull(fc.array(double(0, 5000), { minLength: supports, maxLength: supports })),
      limits: fc.record({
        live: fc.constantFrom(null, 180, 360, 480),
        total: fc.constantFrom(null, 120, 240),
        liveMax: orNull(double(0.01, 2)),
      }),
      creep: fc.constantFrom('half dead' as const, 'Kcr' as const),
      assume: fc.tuple(...ASSUMED_KEYS.map(() => fc.boolean())),
    })
    .map((r): Member => {
      const usual = LIMITS_BY_USE[r.use];
      const [selfWeight, flat, incised, repetitive, seasoned] = r.flags;
      const stated: Member = {
        name: 'G1',
        note: r.note,
        use: r.use,
        count: r.count,
        beam,
        bearing: r.bearing,
        spacing: r.spacing,
        tributary: r.spacing ?? r.tributary,
        area: Object.fromEntries(LOAD_KINDS.map((kind, i) => [kind, r.area[i]!])) as Member['area'],
        loads: r.loads,
        selfWeight,
        combinations: r.combinations,
        liveReduction: r.liveReduction,
        slope: r.slope,
        stock: {
          product: 'dimension lumber',
          species: 'Douglas Fir-Larch',
          grade: r.grade,
          values: r.values,
          valuesFrom: r.values === null ? null : 'report in hand',
        },
        rack: r.rack,
        section: { width: 1.5, depth: r.depth, plies: r.plies, flat },
        maxDepth: r.most[0],
        maxWidth: r.most[1],
        service: r.service,
        temperature: r.temperature,
        incised,
        repetitive,
        seasoned,
        bracing: r.bracing,
        bracingBottom: r.bracingBottom,
        shearAt: r.shearAt,
        notch: { left: 0, right: 0 },
        tiedDown: r.tiedDown,
        limits: {
          live: r.limits.live ?? usual.live,
          total: r.limits.total ?? usual.total,
          liveMax: r.limits.liveMax,
        },
        creep: r.creep,
        typedFactors: r.factors,
        assumed: ASSUMED_KEYS.filter((_, i) => r.assume[i]),
      };
      // What nobody stated has its default.
      const defaults = {
        bearing: new Array<number>(supports).fill(3.5),
        bracing: 'continuous',
        bracingBottom: 'ends',
        seasoned: true,
        service: 'dry',
        temperature: 'normal',
        ...(r.spacing === null ? { tributary: 72 } : {}),
      };
      const assumed = Object.fromEntries(
        stated.assumed
          .filter((key) => key in defaults)
          .map((key) => [key, defaults[key as keyof typeof defaults]]),
      );
      return { ...stated, ...assumed, assumed: stated.assumed.filter((key) => key in defaults) };
    });
});
