import fc from 'fast-check';
import { expect, test } from 'vitest';
import { LOAD_KINDS } from '../../src/loads/kinds.ts';
import type { AppliedLoad } from '../../src/loads/loading.ts';
import {
  adjusted,
  gradesOf,
  prepare,
  rackSizes,
  rate,
  refusal,
  reportMember,
  speciesOf,
  woodOf,
} from '../../src/timber/index.ts';
import type { Member } from '../../src/timber/member.ts';
import { CHECK_IDS, type CheckId, roomForRatios } from '../../src/timber/report.ts';
import { memberOf, NO_AREA, plf, psf, simpleSpan, stockOf } from './member-of.ts';

const near = (from: number, to: number) => fc.double({ min: from, max: to, noNaN: true });

const wood = fc
  .constantFrom(
    'dimension lumber' as const,
    'machine stress rated' as const,
    'timber' as const,
    'glulam' as const,
    'LVL' as const,
  )
  .chain((product) =>
    fc.constantFrom(...(product === 'LVL' ? [''] : speciesOf(product))).chain((species) =>
      fc.constantFrom(...gradesOf(product, species)).chain((grade) =>
        fc.constantFrom(...rackSizes(product, species, grade)).map((size) => ({
          stock: stockOf(product, species, grade),
          section: { width: size.width, depth: size.depth, plies: size.plies, flat: false },
        })),
      ),
    ),
  );

const bracing = fc.oneof(fc.constant('continuous' as const), fc.constant('ends' as const), near(6, 120));

const member: fc.Arbitrary<Member> = fc
  .record({
    wood,
    spans: fc.array(near(48, 240), { minLength: 1, maxLength: 3 }),
    left: fc.oneof(fc.constant(0), near(12, 48)),
    right: fc.oneof(fc.constant(0), near(12, 48)),
    cantilever: fc.boolean(),
    area: fc.tuple(...LOAD_KINDS.map(() => fc.oneof(fc.constant(0), near(1, 60)))),
    point: fc.record({ kind: fc.constantFrom(...LOAD_KINDS), place: near(0, 1), load: near(10, 2000) }),
    line: fc.record({
      kind: fc.constantFrom(...LOAD_KINDS),
      a: near(0, 1),
      b: near(0, 1),
      start: near(1, 100),
      end: near(0, 100),
    }),
    bracing,
    bracingBottom: bracing,
    wet: fc.boolean(),
    temperature: fc.constantFrom('normal' as const, '100-125 F' as const, '125-150 F' as const),
    seasoned: fc.boolean(),
    repetitive: fc.boolean(),
    shearAt: fc.constantFrom('support' as const, 'd' as const),
    creep: fc.constantFrom('half dead' as const, 'Kcr' as const),
    notch: fc.oneof(fc.constant(0), near(0.1, 0.5)),
    selfWeight: fc.boolean(),
    slope: fc.oneof(fc.constant(0), near(0.1, 1)),
    tiedDown: fc.boolean(),
  })
  .map((r) => {
    const cantilever = r.cantilever && r.spans.length === 1;
    const beam: Member['beam'] = {
      spans: r.spans,
      overhangs: cantilever ? { left: 0, right: 0 } : { left: r.left, right: r.right },
      supports: cantilever ? 'cantilever' : 'bearings',
      fixed: { left: cantilever, right: false },
    };
    const length = beam.overhangs.left + r.spans.reduce((sum, span) => sum + span, 0) + beam.overhangs.right;
    const [from, to] = [Math.min(r.line.a, r.line.b) * length, Math.max(r.line.a, r.line.b) * length];
    const loads: AppliedLoad[] = [
      { type: 'point', kind: r.point.kind, at: r.point.place * length, load: r.point.load },
    ];
    if (to - from > 1) {
      loads.push({
        type: 'line',
        kind: r.line.kind,
        from,
        to,
        start: plf(r.line.start),
        end: plf(r.line.end),
      });
    }
    return memberOf({
      ...r.wood,
      beam,
      loads,
      area: Object.fromEntries(LOAD_KINDS.map((kind, i) => [kind, psf(r.area[i]!)])) as Member['area'],
      bracing: r.bracing,
      bracingBottom: r.bracingBottom,
      service: r.wet && r.wood.stock.product !== 'LVL' ? 'wet' : 'dry',
      temperature: r.temperature,
      seasoned: r.seasoned,
      repetitive: r.repetitive,
      shearAt: r.shearAt,
      creep: r.creep,
      notch: { left: !cantilever && beam.overhangs.left === 0 ? r.notch : 0, right: 0 },
      selfWeight: r.selfWeight,
      slope: r.slope,
      tiedDown: r.tiedDown ? Array.from({ length: 4 }, () => 1000) : null,
    });
  });

function rated(each: Member) {
  const ratios = roomForRatios();
  const passes = rate(prepare(each), woodOf(each), each.section, ratios);
  return { ratios, passes };
}

function ratioOf(each: Member, id: CheckId): number {
  return rated(each).ratios[CHECK_IDS.indexOf(id)]!;
}

test('the report has the ratios of the rating to the last bit, and each is its demand over its capacity', () => {
  fc.assert(
    fc.property(member, (each) => {
      const { ratios, passes } = rated(each);
      const report = reportMember(each);
      expect(report.passes).toBe(passes);
      if (report.refused !== null) {
        expect([...ratios].every((ratio) => ratio === Number.POSITIVE_INFINITY)).toBe(true);
        return;
      }
      const byId = new Map(report.checks.map((check) => [check.id, check]));
      CHECK_IDS.forEach((id, at) => {
        const check = byId.get(id);
        if (Number.isNaN(ratios[at]!)) expect(check).toBeUndefined();
        else {
          expect(check!.ratio).toBe(ratios[at]);
          expect(check!.demand / check!.capacity).toBe(check!.ratio);
        }
      });
    }),
    { numRuns: 120 },
  );
});

test('the factors that are listed for bending multiply up to its capacity, but for the greater of CL and CV', () => {
  fc.assert(
    fc.property(member, (each) => {
      const report = reportMember(each);
      const bending = report.checks.find(({ id }) => id === 'bending');
      if (!bending) return;
      const of = (symbol: string) => bending.factors.find((factor) => factor.symbol === symbol)?.value;
      const CL = of('CL')!;
      const CV = of('CV') ?? 1;
      const others = bending.factors.filter(({ symbol }) => symbol !== 'CL' && symbol !== 'CV');
      const product = others.reduce((sum, { value }) => sum * value, Math.min(CL, CV));
      const Fb = woodOf(each).candidates;
      const values = Fb.map((candidate) => candidate.values.Fb * product);
      expect(values.some((value) => Math.abs(value / bending.capacity - 1) < 1e-12)).toBe(true);
    }),
    { numRuns: 60 },
  );
});

test('a section heavier than was searched for is rated as if it had been', () => {
  fc.assert(
    fc.property(member, (each) => {
      const light = roomForRatios();
      const heavy = roomForRatios();
      rate(prepare(each, { heaviest: 0.01 }), woodOf(each), each.section, light);
      rate(prepare(each, { heaviest: 40 }), woodOf(each), each.section, heavy);
      CHECK_IDS.forEach((id, at) => {
        if (Number.isFinite(heavy[at]!)) expect(light[at]! / heavy[at]!, id).toBeCloseTo(1, 9);
      });
    }),
    { numRuns: 30 },
  );
});

test('a uniform load on a simple span gives the power laws of shear, bending and deflection', () => {
  // Closed forms of any beam table: V = wl/2, M = wl²/8, deflection 5wl⁴/384EI.
  const [w, l, b, d] = [10, 150, 1.5, 9.25];
  const each = memberOf({
    beam: simpleSpan(l),
    section: { width: b, depth: d, plies: 1, flat: false },
    selfWeight: false,
    tributary: 1,
    area: { ...NO_AREA, live: w },
  });
  expect(ratioOf(each, 'shear')).toBeCloseTo((((0.75 * w) / b) * (l / d)) / 180, 12);
  expect(ratioOf(each, 'bending')).toBeCloseTo((((0.75 * w) / b) * (l / d) ** 2) / (900 * 1.1), 12);
  const slope = ((0.15625 * w) / (b * 1.6e6)) * (l / d) ** 3;
  expect(ratioOf(each, 'deflection-live')).toBeCloseTo(slope * 360, 12);
});

test('a member that carries nothing but itself does not pass and says so', () => {
  const bare = memberOf({ area: NO_AREA });
  expect(rated(bare).passes).toBe(false);
  const report = reportMember(bare);
  expect(report.passes).toBe(false);
  expect(report.cautions.map(({ id }) => id)).toContain('unloaded');
  expect(report.checks.every(({ ratio }) => ratio <= 1)).toBe(true);
});

test('uplift without a stated tie-down is without end, and with one is measured against it', () => {
  const lifted = memberOf({ area: { ...NO_AREA, dead: psf(2), windUp: psf(30) } });
  expect(ratioOf(lifted, 'uplift')).toBe(Number.POSITIVE_INFINITY);
  expect(rated(lifted).passes).toBe(false);
  const tied = { ...lifted, tiedDown: [900, 900] };
  const uplift = reportMember(tied).checks.find(({ id }) => id === 'uplift')!;
  const own = reportMember(tied).weight;
  const up = (0.6 * psf(30) * 72 - 0.6 * (psf(2) * 72 + own)) * 84;
  expect(uplift.demand).toBeCloseTo(up, 6);
  expect(uplift.ratio).toBeCloseTo(up / 900, 9);
  expect(uplift.combination).toContain('0.6D');
});

test('uplift bends the member the other way, and then the bottom edge is the one that must be held', () => {
  const lifted = memberOf({ area: { ...NO_AREA, dead: psf(2), windUp: psf(30) }, tiedDown: [2000, 2000] });
  const free = ratioOf(lifted, 'bending-hogging');
  const held = ratioOf({ ...lifted, bracingBottom: 'continuous' }, 'bending-hogging');
  expect(free).toBeGreaterThan(held * 1.1);
  expect(ratioOf(lifted, 'slenderness')).toBeGreaterThan(0);
  expect(ratioOf({ ...lifted, bracingBottom: 'continuous' }, 'slenderness')).toBeNaN();
});

test('a glulam bends upward with its negative value', () => {
  const stock = stockOf('glulam', 'Western species', '24F-1.8E');
  const cantilever = memberOf({
    stock,
    section: { width: 5.125, depth: 12, plies: 1, flat: false },
    beam: { ...simpleSpan(60), supports: 'cantilever', fixed: { left: true, right: false } },
    bracingBottom: 'continuous',
  });
  const hogging = reportMember(cantilever).checks.find(({ id }) => id === 'bending-hogging')!;
  expect(hogging.capacity).toBeCloseTo(1450, 9);
});

test('an upward load of next to nothing asks no bracing of the bottom edge', () => {
  const slender = memberOf({
    area: NO_AREA,
    selfWeight: false,
    section: { width: 1.5, depth: 11.25, plies: 1, flat: false },
  });
  const lifted = (load: number) => ({
    ...slender,
    tiedDown: [1, 1],
    loads: [{ type: 'point', kind: 'dead', at: 84, load }] as const,
  });
  expect(ratioOf(lifted(-1), 'slenderness')).toBeGreaterThan(0);
  expect(ratioOf(lifted(-1e-12), 'slenderness')).toBeNaN();
});

test('the slenderness limit stands at RB 50: just under passes, just over fails', () => {
  // RB = sqrt(1.63 lu d + 3 d²)/b for 7 <= lu/d; b 1.5, d 11.25 gives RB 50 at lu = (5625/11.25 - 33.75)/1.63.
  const lu = ((50 * 1.5) ** 2 / 11.25 - 3 * 11.25) / 1.63;
  const light = memberOf({
    section: { width: 1.5, depth: 11.25, plies: 1, flat: false },
    area: { ...NO_AREA, dead: psf(0.1) },
    beam: simpleSpan(lu),
  });
  const under = { ...light, bracing: lu * (1 - 1e-6) };
  const over = { ...light, bracing: lu * (1 + 1e-6) };
  expect(rated(under).passes).toBe(true);
  expect(rated(over).passes).toBe(false);
  expect(ratioOf(over, 'slenderness')).toBeGreaterThan(1);
  expect(ratioOf(over, 'slenderness')).toBeCloseTo(1, 5);
});

test('a point load at mid-span has its own effective length only where nothing braces the beam between its ends', () => {
  const point = memberOf({
    selfWeight: false,
    area: NO_AREA,
    loads: [{ type: 'point', kind: 'live', at: 84, load: 500 }],
  });
  const reason = (bracing: Member['bracing']) =>
    reportMember({ ...point, bracing })
      .checks.find(({ id }) => id === 'bending')!
      .factors.find(({ symbol }) => symbol === 'CL')!.reason;
  expect(reason('ends')).toContain('1.37 lu + 3d');
  expect(reason(90)).toContain('1.63 lu + 3d');
});

test('total deflection counts half the dead load of seasoned dry wood, all of it otherwise, or Kcr by choice', () => {
  // IBC Table 1604.3 note and NDS 3.5.2, from memory.
  const of = (parts: Partial<Member>) =>
    reportMember(memberOf({ selfWeight: false, ...parts })).checks.find(
      ({ id }) => id === 'deflection-total',
    )!.demand;
  const live = reportMember(memberOf({ selfWeight: false })).analysed().analysis.live!.deflection;
  const dead = reportMember(memberOf({ selfWeight: false })).analysed().analysis.dead!.deflection;
  expect(of({})).toBeCloseTo(0.5 * dead + live, 9);
  expect(of({ seasoned: false })).toBeCloseTo(dead + live, 9);
  expect(of({ service: 'wet' })).toBeCloseTo((dead + live) / 0.9, 9);
  expect(of({ creep: 'Kcr' })).toBeCloseTo(1.5 * dead + live, 9);
  expect(of({ creep: 'Kcr', seasoned: false })).toBeCloseTo(2 * dead + live, 9);
});

test('a live deflection limit given as a length stands beside the one by span', () => {
  const base = ratioOf(memberOf(), 'deflection-live');
  const limits = { live: 360, total: 240, liveMax: 0.25 };
  expect(ratioOf(memberOf({ limits }), 'deflection-live')).toBeCloseTo((base * (168 / 360)) / 0.25, 9);
  expect(ratioOf(memberOf({ limits: { ...limits, liveMax: 10 } }), 'deflection-live')).toBe(base);
});

test('an overhang is judged against twice its length', () => {
  // IBC Table 1604.3, note on cantilevers, from memory; tip wl⁴/8EI.
  const each = memberOf({
    beam: { ...simpleSpan(60), supports: 'cantilever', fixed: { left: true, right: false } },
    selfWeight: false,
    tributary: 1,
    area: { ...NO_AREA, live: 5 },
  });
  const EI = (1.6e6 * 3 * 11.25 ** 3) / 12;
  expect(ratioOf(each, 'deflection-live')).toBeCloseTo((5 * 60 ** 4) / (8 * EI) / (120 / 360), 9);
});

test('laid flat a member has width and depth changed places, Cfu, no CL, and the size factor of its wide face', () => {
  // NDS Supplement 4A: 2x6 flat Cfu 1.15, CF 1.3; worked by hand.
  const flat = memberOf({
    section: { width: 1.5, depth: 5.5, plies: 1, flat: true },
    beam: simpleSpan(48),
    bracing: 'ends',
    area: { ...NO_AREA, live: psf(20) },
  });
  const report = reportMember(flat);
  expect(report).toMatchObject({ label: '2x6 flat', width: 5.5, depth: 1.5 });
  const bending = report.checks.find(({ id }) => id === 'bending')!;
  expect(bending.capacity).toBeCloseTo(900 * 1.3 * 1.15, 9);
  expect(bending.factors.map(({ symbol }) => symbol)).toContain('Cfu');
  expect(report.checks.some(({ id }) => id === 'slenderness')).toBe(false);
});

test('three plies are repetitive, two are not', () => {
  const of = (plies: number) =>
    reportMember(memberOf({ section: { width: 1.5, depth: 11.25, plies, flat: false } })).checks.find(
      ({ id }) => id === 'bending',
    )!.capacity;
  expect(of(2)).toBe(900);
  expect(of(3)).toBeCloseTo(900 * 1.15, 9);
});

test('bearing away from the end of the member is helped by Cb, and the length needed just does', () => {
  const two = memberOf({
    beam: { ...simpleSpan(120), spans: [120, 120] },
    area: { ...NO_AREA, dead: psf(30), live: psf(100) },
    section: { width: 1.5, depth: 11.25, plies: 1, flat: false },
  });
  const bearing = reportMember(two).checks.find(({ id }) => id === 'bearing')!;
  expect(bearing.place).toBe(1);
  expect(bearing.factors.at(-1)).toMatchObject({ symbol: 'Cb', value: (3.5 + 0.375) / 3.5 });
  const needed = bearing.bearingNeeded!;
  expect(ratioOf({ ...two, bearing: [12, needed, 12] }, 'bearing')).toBeCloseTo(1, 9);
});

test('a typed factor takes the place of the one of the standard and its reason is shown', () => {
  const typed = memberOf({ typedFactors: { CF: { value: 0.95, reason: 'tested lot, report 12' } } });
  const bending = reportMember(typed).checks.find(({ id }) => id === 'bending')!;
  expect(bending.capacity).toBeCloseTo(855, 9);
  expect(bending.factors.find(({ symbol }) => symbol === 'CF')).toEqual({
    symbol: 'CF',
    value: 0.95,
    reason: 'typed: tested lot, report 12',
  });
  expect(reportMember(typed).cautions.some(({ text }) => text.includes('tested lot'))).toBe(true);
  expect(refusal(memberOf({ typedFactors: { CF: { value: 0.95, reason: ' ' } } }))).toContain('reason');
});

test('typed load duration, stability, volume and bearing factors reach the capacities', () => {
  const typed = (symbol: 'CD' | 'CL' | 'Cb' | 'CM' | 'Ct' | 'Ci' | 'Cr', value: number) =>
    memberOf({ typedFactors: { [symbol]: { value, reason: 'test' } } });
  const base = rated(memberOf()).ratios;
  const of = (each: Member, id: CheckId) => ratioOf(each, id) / base[CHECK_IDS.indexOf(id)]!;
  expect(of(typed('CD', 0.8), 'bending')).toBeCloseTo(1 / 0.8, 9);
  expect(of(typed('CL', 0.5), 'bending')).toBeCloseTo(2, 9);
  expect(of(typed('Cb', 1.1), 'bearing')).toBeCloseTo(1 / 1.1, 9);
  expect(of(typed('CM', 0.9), 'deflection-live')).toBeCloseTo(1 / 0.9, 9);
  expect(of(typed('Ct', 0.8), 'shear')).toBeCloseTo(1 / 0.8, 9);
  expect(of(typed('Cr', 1.05), 'bending')).toBeCloseTo(1 / 1.05, 9);
});

test('adjusted values are the capacities of the checks at the same duration', () => {
  fc.assert(
    fc.property(member, (each) => {
      const report = reportMember(each);
      const shear = report.checks.find(({ id }) => id === 'shear');
      if (!shear) return;
      const CD = shear.factors[0]!.value;
      const values = adjusted(prepare(each), woodOf(each), each.section, CD, shear.place)!;
      expect(values.Fv).toBe(shear.capacity);
      expect(values.E).toBeGreaterThan(values.Emin);
    }),
    { numRuns: 60 },
  );
});
