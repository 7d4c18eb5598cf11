import { expect, test } from 'vitest';
import { bearingArea } from '../../src/timber/factors/bearing-area.ts';
import { sizeFactor } from '../../src/timber/factors/size.ts';
import { adjusted, density, prepare, reportMember, woodOf } from '../../src/timber/index.ts';
import type { Member } from '../../src/timber/member.ts';
import { memberOf, NO_AREA, psf, simpleSpan, stockOf } from '../timber/member-of.ts';

function valuesOf(member: Member, duration: number) {
  return adjusted(prepare(member), woodOf(member), member.section, duration, 0)!;
}

function check(member: Member, id: string) {
  return reportMember(member).checks.find((each) => each.id === id)!;
}

const DF_L = (grade: string) => stockOf('dimension lumber', 'Douglas Fir-Larch', grade);
const one = (width: number, depth: number, plies = 1) => ({ width, depth, plies, flat: false });

test("a 2x8 of No.1 Douglas Fir-Larch in wet service under dead and snow has Fb' = 1173 psi and Fv' = 201 psi", () => {
  // CE 479 wood design example, university course notes, Fall 2006.
  const member = memberOf({
    stock: DF_L('No.1'),
    section: one(1.5, 7.25),
    service: 'wet',
    area: { ...NO_AREA, dead: psf(15), snow: psf(30) },
  });
  const values = valuesOf(member, 1.15);
  expect(Math.round(values.Fb)).toBe(1173);
  expect(Math.round(values.Fv)).toBe(201);
  const bending = check(member, 'bending');
  expect(bending.combination).toBe('D+S');
  expect(Math.round(bending.capacity)).toBe(1173);
});

test('a 4x16 of Select Structural Hem-Fir, 20 ft, one load at mid-span, held at its ends: RB 21.6, CL 0.84', () => {
  // AWC Structural Wood Design Solved Example Problems, example 1.1, from memory:
  // le = 1.37 lu + 3d = 375 in, RB = 21.6, FbE / Fb* = 1.07, CL = 0.84.
  const member = memberOf({
    beam: simpleSpan(240),
    stock: stockOf('dimension lumber', 'Hem-Fir', 'Select Structural'),
    section: one(3.5, 15.25),
    bracing: 'ends',
    selfWeight: false,
    area: NO_AREA,
    loads: [{ type: 'point', kind: 'live', at: 120, load: 2000 }],
  });
  const CL = check(member, 'bending').factors.find(({ symbol }) => symbol === 'CL')!;
  expect(CL.value).toBeCloseTo(0.84, 2);
  expect(CL.reason).toContain('le = 1.37 lu + 3d');
  expect(check(member, 'slenderness').demand).toBeCloseTo(21.6, 1);
  expect(check(member, 'bending').capacity).toBeCloseTo(1400 * 0.8416, 0);
});

test('the size factors of timbers over 12 in deep are those of the published list', () => {
  // Size factors for 12 in and deeper timbers, as printed in lumber use manuals, from memory.
  const list = [
    [11.5, 1],
    [13.5, 0.987],
    [15.5, 0.972],
    [17.5, 0.959],
    [19.5, 0.947],
    [21.5, 0.937],
    [23.5, 0.928],
  ];
  for (const [depth, CF] of list) expect(sizeFactor('timber', 7.5, depth!)).toBeCloseTo(CF!, 3);
});

test('a 6x16 of No.1 Douglas Fir-Larch has the size factor of its depth on the beams & stringers value', () => {
  // NDS 4.3.6.3 worked by hand: 1350 (12/15.5)^(1/9) = 1312 psi.
  const member = memberOf({ stock: stockOf('timber', 'Douglas Fir-Larch', 'No.1'), section: one(5.5, 15.5) });
  expect(check(member, 'bending').capacity).toBeCloseTo(1312.1, 0);
});

test('a wet-service incised 2x10 of No.2 Douglas Fir-Larch loses what Tables 4A and 4.3.8 take', () => {
  // NDS Supplement 4A and NDS 4.3.8, worked by hand. Fb CF = 990 is not over 1150, so CM of Fb is 1.
  const member = memberOf({ stock: DF_L('No.2'), section: one(1.5, 9.25), service: 'wet', incised: true });
  const values = valuesOf(member, 1);
  expect(values.Fb).toBeCloseTo(900 * 1.1 * 0.8, 9);
  expect(values.Fv).toBeCloseTo(180 * 0.97 * 0.8, 9);
  expect(values.E).toBeCloseTo(1.6e6 * 0.9 * 0.95, 3);
  expect(values.Emin).toBeCloseTo(0.58e6 * 0.9 * 0.95, 3);
  expect(values.Fcperp).toBeCloseTo(625 * 0.67, 9);
});

test.each([
  [7.25, 1.3],
  [9.25, 1.2],
  [11.25, 1.1],
  [13.25, 1.0],
  [15.25, 1.0],
])('4 in thick lumber %d in deep has CF %d', (depth, CF) => {
  // NDS Supplement Table 4A, from memory.
  const values = valuesOf(memberOf({ stock: DF_L('No.2'), section: one(3.5, depth) }), 1);
  expect(values.Fb).toBeCloseTo(900 * CF, 9);
});

test.each([
  ['2x4', 1.5, 3.5, 1100],
  ['2x6', 1.5, 5.5, 1000],
  ['2x8', 1.5, 7.25, 925],
  ['2x10', 1.5, 9.25, 800],
  ['2x12', 1.5, 11.25, 750],
  ['2x14', 1.5, 13.25, 750 * 0.9],
  ['4x6', 3.5, 5.5, 1000],
  ['4x8', 3.5, 7.25, 925 * 1.1],
  ['4x12', 3.5, 11.25, 750 * 1.1],
  ['4x14', 3.5, 13.25, 750 * 0.9 * 1.1],
])('No.2 Southern Pine takes its bending value from the row of its width: %s', (_, width, depth, Fb) => {
  // NDS Supplement Table 4B and its notes, from memory.
  const stock = stockOf('dimension lumber', 'Southern Pine', 'No.2');
  expect(valuesOf(memberOf({ stock, section: one(width, depth) }), 1).Fb).toBeCloseTo(Fb, 9);
});

test('the volume factor is 1 for the base size of 5 1/8 x 12 in on 21 ft, and falls by the tenth root from there', () => {
  // NDS 5.3.6: the formula's own base size; 6 3/4 x 31 1/2 in on 32 ft worked by hand, CV = 0.847.
  const glulam = (section: ReturnType<typeof one>, feet: number) =>
    check(
      memberOf({
        stock: stockOf('glulam', 'Western species', '24F-1.8E'),
        section,
        beam: simpleSpan(12 * feet),
      }),
      'bending',
    );
  expect(glulam(one(5.125, 12), 21).capacity).toBeCloseTo(2400, 6);
  expect(glulam(one(6.75, 31.5), 32).capacity).toBeCloseTo(2400 * 0.8468, 0);
});

test('glulam of Southern Pine takes the twentieth root in its volume factor', () => {
  // NDS 5.3.6, worked by hand: (21/32)^0.05 (12/33)^0.05 (5.125/6.75)^0.05 = 0.9182.
  const member = memberOf({
    stock: stockOf('glulam', 'Southern Pine', '24F-1.8E'),
    section: one(6.75, 33),
    beam: simpleSpan(12 * 32),
  });
  expect(check(member, 'bending').factors.find(({ symbol }) => symbol === 'CV')!.value).toBeCloseTo(
    0.9182,
    3,
  );
});

test.each([
  [0.5, 1.75],
  [1, 1.38],
  [1.5, 1.25],
  [2, 1.19],
  [3, 1.13],
  [4, 1.1],
  [6, 1.0],
])('a bearing %d in long away from the end has Cb %d', (length, Cb) => {
  // NDS Table 3.10.4, from memory; the table gives 1.10 where its formula gives 1.094.
  expect(Math.abs(bearingArea(length, 120, 240) - Cb)).toBeLessThan(0.01);
});

test('an end notch of 2 in in a 4x12 leaves the shear of NDS 3.4.3.2', () => {
  // NDS 3.4.3.2 worked by hand: (2/3)(180)(3.5)(9.25)(9.25/11.25)² = 2626.5 lb.
  const member = memberOf({ stock: DF_L('No.2'), section: one(3.5, 11.25), notch: { left: 2, right: 0 } });
  const notch = check(member, 'notch');
  expect(notch.capacity).toBeCloseTo(2626.5, 0);
  expect(notch.demand).toBeCloseTo(reportMember(member).reactions[0]!.max, 6);
});

test('a glulam notch takes 0.72 of the shear value', () => {
  // NDS Supplement Table 5A, note on notched members, from memory.
  const member = memberOf({
    stock: stockOf('glulam', 'Western species', '24F-1.8E'),
    section: one(5.125, 15),
    notch: { left: 0, right: 1.5 },
  });
  expect(check(member, 'notch').capacity).toBeCloseTo((2 / 3) * 265 * 0.72 * 5.125 * 13.5 * 0.81, 6);
});

test('wood of specific gravity 0.50 weighs 33.6 lb/ft3 at 15 % moisture and 35.7 lb/ft3 at 30 %', () => {
  // NDS Supplement 3.1.3, worked by hand: 62.4 x 0.5 / 1.0675 x 1.15 and 62.4 x 0.5 / 1.135 x 1.3.
  expect(density(0.5, 15)).toBeCloseTo(33.61, 2);
  expect(density(0.5, 30)).toBeCloseTo(35.74, 2);
  expect(density(0.5, 0)).toBeCloseTo(31.2, 9);
});

test('the member of the contract has the figures of the contract', () => {
  // contract.md, `check --json`, of the session interface of this program.
  const report = reportMember(memberOf());
  const byId = Object.fromEntries(report.checks.map((each) => [each.id, each]));
  expect(report).toMatchObject({
    label: '(2) 2x12',
    width: 3,
    depth: 11.25,
    passes: false,
    governing: 'bending',
  });
  expect(report.weight).toBeCloseTo(0.656, 3);
  expect(byId.bending).toMatchObject({
    combination: 'D+L',
    pattern: 'all spans',
    place: 0,
    at: 84,
    clause: 'NDS 3.3',
  });
  expect(byId.bending!.ratio).toBeCloseTo(1.651, 3);
  expect(byId.bending!.demand).toBeCloseTo(1486.1, 1);
  expect(byId.bending!.capacity).toBe(900);
  expect(byId.bending!.factors.map(({ symbol, value }) => [symbol, value])).toEqual([
    ['CD', 1],
    ['CL', 1],
    ['CF', 1],
  ]);
  expect(report.advice[0]!.value).toBeCloseTo(10.1, 1);
  expect(report.reactions[0]).toMatchObject({ at: 0, byKind: { live: 1680 } });
  expect(report.reactions[0]!.byKind.dead).toBeCloseTo(559.1, 1);
  expect(report.reactions[0]!.max).toBeCloseTo(2239.1, 1);
  expect(report.reactions[0]!.min).toBeCloseTo(559.1, 1);
  expect(report.analysis.live!.shear).toBeCloseTo(1680, 9);
  expect(report.analysis.live!.momentMax).toBeCloseTo(70560, 6);
  expect(report.analysis.live!.momentMin).toBeCloseTo(0, 6);
  expect(report.analysis.live!.deflection).toBeCloseTo(0.364, 3);
  expect(report.assumptions).toEqual(['top edge held throughout']);
});
