import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { scaleLengths, scaleLoads } from '../../src/explore/scale.ts';
import { readSession } from '../../src/session/index.ts';
import { beamFields } from '../../src/statics/beam.ts';
import { prepare, rate, woodOf } from '../../src/timber/index.ts';
import type { Member, Stock } from '../../src/timber/member.ts';
import { CHECK_IDS, type CheckId, roomForRatios } from '../../src/timber/report.ts';
import { memberOf, NO_AREA, psf, simpleSpan, stockOf } from './member-of.ts';
import { mirrored } from './mirrored.ts';
import { member as anyMember } from './workings/any-member.ts';

// What mechanics demands of any rules of design, whatever their numbers: no source but that.

type Ratios = Readonly<Record<CheckId, number>>;

/** 0 where a check does not apply or asks no more than rounding does. */
function ratiosOf(member: Member): Ratios {
  const out = roomForRatios();
  rate(prepare(member), woodOf(member), member.section, out);
  const size = (ratio: number) => (Number.isNaN(ratio) || Math.abs(ratio) < 1e-9 ? 0 : ratio);
  return Object.fromEntries(CHECK_IDS.map((id, at) => [id, size(out[at]!)])) as Ratios;
}

function expectAlike(one: Ratios, other: Ratios, apart: readonly CheckId[] = []): void {
  for (const id of CHECK_IDS) {
    if (apart.includes(id)) continue;
    if (!Number.isFinite(one[id])) expect(other[id], id).toBe(one[id]);
    // Near to nothing rounding of larger forces is what is left.
    else expect(Math.abs(one[id] - other[id]), id).toBeLessThanOrEqual(1e-8 * one[id] + 1e-8);
  }
}

/** That no ratio falls, but for rounding. */
function expectNoLess(less: Ratios, more: Ratios, ids: readonly CheckId[] = CHECK_IDS): void {
  for (const id of ids) expect(more[id], id).toBeGreaterThanOrEqual(less[id] * (1 - 1e-9));
}

const TYPED: Stock = {
  product: 'custom',
  species: '',
  grade: '',
  values: { Fb: 1500, FbNeg: 1300, Fv: 180, Fcperp: 500, E: 1.6e6, Emin: 0.85e6, G: 0.5 },
  valuesFrom: 'report in hand',
};
const STOCKS = [
  TYPED,
  stockOf('glulam', 'Western species', '24F-1.8E'),
  stockOf('glulam', 'Southern Pine', '24F-1.8E'),
  stockOf('LVL', '', 'typical 2.0E'),
] as const;

const size = (least: number, most: number) => fc.double({ min: least, max: most, noNaN: true });

/** Simple spans under loads that all press down, of woods that may be had at any size. */
const pressed = fc
  .record({
    stock: fc.constantFrom(...STOCKS),
    span: size(60, 400),
    area: fc.tuple(size(0, 20), size(0, 60), size(0, 30), size(0, 60), size(0, 20), size(0, 30)),
    typed: fc.array(
      fc.record({
        kind: fc.constantFrom('dead', 'live', 'snow'),
        at: size(0.05, 0.95),
        load: size(0, 2000),
      }),
      { maxLength: 2 },
    ),
    width: size(1.75, 8),
    depth: size(5.5, 24),
    bracing: fc.constantFrom('continuous' as const, 'ends' as const),
    shearAt: fc.constantFrom('support' as const, 'd' as const),
    selfWeight: fc.boolean(),
    notch: fc.constantFrom(0, 0.5),
  })
  .map(({ stock, span, area, typed, width, depth, bracing, shearAt, selfWeight, notch }): Member => {
    const [dead, live, roofLive, snow, rain, wind] = area.map(psf) as [
      number,
      number,
      number,
      number,
      number,
      number,
    ];
    return memberOf({
      beam: simpleSpan(span),
      area: { ...NO_AREA, dead, live, roofLive, snow, rain, wind },
      loads: typed.map(({ kind, at, load }) => ({ type: 'point', kind, at: at * span, load })),
      stock,
      section: { width, depth, plies: 1, flat: false },
      bracing,
      shearAt,
      selfWeight,
      notch: { left: notch, right: 0 },
    });
  });

describe('of a simple span under downward loads', () => {
  test('more load of any kind lowers no ratio', () => {
    fc.assert(
      fc.property(
        pressed,
        fc.constantFrom('dead', 'live', 'roofLive', 'snow', 'rain', 'wind'),
        size(1, 3),
        (member, kind, by) => {
          const more = {
            ...member,
            area: { ...member.area, [kind]: member.area[kind] * by },
            loads: member.loads.map((load) =>
              load.type === 'point' && load.kind === kind ? { ...load, load: load.load * by } : load,
            ),
          };
          expectNoLess(ratiosOf(member), ratiosOf(more));
          expectNoLess(ratiosOf(member), ratiosOf(scaleLoads(member, by)));
        },
      ),
      { numRuns: 150 },
    );
  });

  test('a longer span lowers no ratio', () => {
    fc.assert(
      fc.property(pressed, size(1, 1.5), (member, by) => {
        // Only where nothing braces it does Table 3.3.3 come in, whose rows do not meet: see below.
        const held = { ...member, bracing: 'continuous' as const };
        expectNoLess(ratiosOf(held), ratiosOf(scaleLengths(held, by)));
      }),
      { numRuns: 150 },
    );
  });

  test('but for a hair where the rows of NDS Table 3.3.3 meet: 2.06 lu is more at lu/d 7 than 1.63 lu + 3d', () => {
    const at = (slenderness: number) =>
      ratiosOf(
        memberOf({
          stock: TYPED,
          beam: simpleSpan(slenderness * 24),
          bracing: 'ends',
          section: { width: 2, depth: 24, plies: 1, flat: false },
        }),
      );
    const [under, over] = [at(7 - 1e-6), at(7)];
    expect((2.06 * 7) / (1.63 * 7 + 3)).toBeGreaterThan(1);
    expect(over.slenderness / under.slenderness).toBeCloseTo(Math.sqrt((1.63 * 7 + 3) / (2.06 * 7)), 6);
    expect(over.slenderness).toBeLessThan(under.slenderness);
    fc.assert(
      fc.property(pressed, size(1, 1.5), (member, by) => {
        const free = { ...member, bracing: 'ends' as const };
        const [less, more] = [ratiosOf(free), ratiosOf(scaleLengths(free, by))];
        for (const id of CHECK_IDS) expect(more[id], id).toBeGreaterThanOrEqual(less[id] * (1 - 1e-3));
      }),
      { numRuns: 150 },
    );
  });

  test('lower design values of the wood lower no ratio', () => {
    const values = ['Fb', 'Fv', 'Fcperp', 'E', 'Emin'] as const;
    fc.assert(
      fc.property(pressed, fc.constantFrom(...values), size(0.5, 1), (member, value, by) => {
        const own = { ...member, stock: TYPED };
        const weaker = {
          ...own,
          stock: { ...TYPED, values: { ...TYPED.values, [value]: TYPED.values![value]! * by } },
        };
        expectNoLess(ratiosOf(own), ratiosOf(weaker));
      }),
      { numRuns: 150 },
    );
  });

  test('but for wet lumber weaker than 1150 psi in bending, which Table 4A spares what it takes from stronger', () => {
    // Table 4A: CM 0.85 on Fb, 1.0 where Fb x CF is 1150 psi and less: common practice as written in its note.
    const wet = (Fb: number) =>
      ratiosOf(
        memberOf({
          service: 'wet',
          section: { width: 1.5, depth: 11.25, plies: 1, flat: false },
          stock: {
            ...stockOf('dimension lumber', 'Douglas Fir-Larch', 'No.2'),
            values: { Fb },
            valuesFrom: 'x',
          },
        }),
      ).bending;
    expect(wet(1150)).toBeLessThan(wet(1151));
    expect(wet(1150) / wet(1151)).toBeCloseTo((0.85 * 1151) / 1150, 9);
  });

  test('a wider member has no larger ratio, own weight of the wider one among its loads', () => {
    fc.assert(
      fc.property(pressed, size(1, 2), (member, by) => {
        // Something beside its own weight: see below.
        const { area } = member;
        const loaded = { ...member, area: { ...area, dead: area.dead + psf(5) } };
        const wider = { ...loaded, section: { ...member.section, width: member.section.width * by } };
        expectNoLess(ratiosOf(wider), ratiosOf(loaded));
      }),
      { numRuns: 150 },
    );
  });

  test('but for a glulam that carries little but itself: its own weight is as wide as it is, and CV falls with width', () => {
    // NDS 5.3.6: own weight and section modulus both go with the width, CV with its tenth root.
    const bare = (width: number) =>
      ratiosOf(
        memberOf({
          area: NO_AREA,
          beam: simpleSpan(480),
          stock: stockOf('glulam', 'Western species', '24F-1.8E'),
          section: { width, depth: 36, plies: 1, flat: false },
        }),
      ).bending;
    expect(bare(10) / bare(8)).toBeCloseTo((10 / 8) ** (1 / 10), 9);
  });

  test('a deeper one that is held throughout has none in shear, bending and deflection', () => {
    const ids = ['shear', 'bending', 'deflection-live', 'deflection-total'] as const;
    fc.assert(
      fc.property(pressed, size(1, 2), (member, by) => {
        const held = { ...member, bracing: 'continuous' as const, notch: { left: 0, right: 0 } };
        const deeper = { ...held, section: { ...member.section, depth: member.section.depth * by } };
        expectNoLess(ratiosOf(deeper), ratiosOf(held), ids);
      }),
      { numRuns: 150 },
    );
  });

  test('but its own weight bears harder on its bearings, as it adds depth and no width', () => {
    const at = (depth: number) =>
      ratiosOf(memberOf({ stock: TYPED, section: { width: 3, depth, plies: 1, flat: false } }));
    expect(at(24).bearing).toBeGreaterThan(at(12).bearing);
  });

  test('one more ply raises no ratio', () => {
    fc.assert(
      fc.property(pressed, fc.integer({ min: 1, max: 3 }), (member, plies) => {
        const lumber = { ...member, stock: stockOf('dimension lumber', 'Douglas Fir-Larch', 'No.2') };
        const of = (count: number) =>
          ratiosOf({ ...lumber, section: { width: 1.5, depth: 11.25, plies: count, flat: false } });
        expectNoLess(of(plies + 1), of(plies));
      }),
      { numRuns: 60 },
    );
  });
});

/** Without loads that are next to nothing: what counts as none is a moment in lb.in, which does not grow with a member. */
function heavy(member: Member): Member {
  const felt = (load: number) => (Math.abs(load) < 1e-3 ? 0 : load);
  return {
    ...member,
    tributary: felt(member.tributary),
    area: Object.fromEntries(
      Object.entries(member.area).map(([kind, load]) => [kind, felt(load)]),
    ) as Member['area'],
    loads: member.loads.filter((load) =>
      load.type === 'point'
        ? felt(load.load)
        : felt((Math.abs(load.start) + Math.abs(load.end)) * (load.to - load.from)),
    ),
  };
}

describe('of any member', () => {
  test('the mirror image has the same ratios', () => {
    fc.assert(
      fc.property(
        anyMember.filter(({ beam }) => beam.supports === 'bearings'),
        (member) => {
          expectAlike(ratiosOf(member), ratiosOf(mirrored(member)));
        },
      ),
      { numRuns: 100 },
    );
  });

  test('one that is so many times as large in all its lengths, under loads that go with them, has the same ratios', () => {
    // Similitude: stresses are as the area loads, deflections as the lengths. Own weight and Cb have lengths of their own.
    fc.assert(
      fc.property(anyMember, size(0.5, 2), (member, by) => {
        const { beam, limits, bracing, bracingBottom } = member;
        const likewise = (held: Member['bracing']) => (typeof held === 'number' ? held * by : held);
        const free: Member = {
          ...heavy(member),
          stock: TYPED,
          selfWeight: false,
          service: 'dry',
          incised: false,
          liveReduction: null,
          // Whether an untied support lifts at all is judged by a force that does not grow.
          tiedDown: member.bearing.map((_, i) => member.tiedDown?.[i] || 1000),
          limits: { ...limits, liveMax: null },
          typedFactors: { ...member.typedFactors, Cb: { value: 1, reason: 'has a length in it' } },
        };
        // An edge counts as pressed by a moment in lb.in that does not grow: where next to nothing presses one, hold it.
        const asked = ratiosOf(free);
        const small: Member = {
          ...free,
          bracing: asked.bending < 1e-6 ? 'continuous' : bracing,
          bracingBottom: asked['bending-hogging'] < 1e-6 ? 'continuous' : bracingBottom,
        };
        // Fields of several lengths: one that hardly anything presses may have the longest.
        const several = beamFields(beam).length > 1;
        const apart = several && [small.bracing, small.bracingBottom].includes('ends');
        const large: Member = {
          ...scaleLengths(small, by),
          tributary: small.tributary * by,
          bearing: member.bearing.map((length) => length * by),
          loads: scaleLengths(small, by).loads.map((load) =>
            load.type === 'point'
              ? { ...load, load: load.load * by * by }
              : { ...load, start: load.start * by, end: load.end * by },
          ),
          section: { ...small.section, width: small.section.width * by, depth: small.section.depth * by },
          tiedDown: small.tiedDown!.map((force) => force * by * by),
          bracing: likewise(small.bracing),
          bracingBottom: likewise(small.bracingBottom),
        };
        expect(large.beam.spans.length).toBe(beam.spans.length);
        expectAlike(ratiosOf(small), ratiosOf(large), apart ? ['slenderness'] : []);
      }),
      { numRuns: 100 },
    );
  });
});

test('a session in SI gives the ratios of the same one in US units', () => {
  // Exact: 1 in is 25.4 mm, 1 lbf 4.4482216152605 N (the international foot and pound).
  const N = 4.4482216152605;
  const FOOT = 0.3048;
  const us = {
    spans: ['14 ft', '11 ft'],
    overhangs: { right: '3 ft' },
    bearing: '3.5 in',
    tributary: '6 ft',
    area: { dead: '12 psf', live: '40 psf', snow: '25 psf' },
    loads: [
      { kind: 'live', point: '500 lb', at: '5 ft' },
      { kind: 'dead', line: ['20 plf', '60 plf'], from: '2 ft', to: '20 ft' },
    ],
    section: { width: '5.125 in', depth: '13.5 in' },
    bracing: '4 ft',
  };
  const m = (feet: number) => `${feet * FOOT} m`;
  const kPa = (load: number) => `${(load * N) / FOOT ** 2 / 1000} kPa`;
  const kN = (load: number) => `${(load * N) / FOOT / 1000} kN/m`;
  const si = {
    spans: [m(14), m(11)],
    overhangs: { right: m(3) },
    bearing: '88.9 mm',
    tributary: m(6),
    area: { dead: kPa(12), live: kPa(40), snow: kPa(25) },
    loads: [
      { kind: 'live', point: `${(500 * N) / 1000} kN`, at: m(5) },
      { kind: 'dead', line: [kN(20), kN(60)], from: m(2), to: m(20) },
    ],
    section: { width: '130.175 mm', depth: '342.9 mm' },
    bracing: m(4),
  };
  const ratios = [us, si].map((text, i) => {
    const stock = { product: 'glulam', species: 'Western species', grade: '24F-1.8E' };
    const members = [{ name: 'B1', use: 'floor', stock, ...text }];
    const read = readSession(
      JSON.stringify({ thrice: 1, title: '', units: i === 0 ? 'us' : 'si', members }),
      'x.json',
    );
    if (!read.ok) throw new Error(read.fault);
    return ratiosOf(read.session.members[0]!.member);
  });
  expect(ratios[0]!.bending).toBeGreaterThan(0.1);
  expectAlike(ratios[0]!, ratios[1]!);
});
