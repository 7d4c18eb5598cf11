import { expect, test } from 'vitest';
import { bearingArea } from '../../src/timber/factors/bearing-area.ts';
import { sizeFactor } from '../../src/timber/factors/size.ts';
import { adjusted, density, prepare, reportMember, woodOf } from '../../src/timber/index.ts';
import type { Member } from '../../src/timber/member.ts';
import { memberOf, NO_AREA, psf, simpleSpan, stockOf } from '../timber/member-of.ts';
import { comparedWith } from './compared.ts';

function valuesOf(member: Member, duration: number) {
  return adjusted(prepare(member), woodOf(member), member.section, duration, 0)!;
}

function check(member: Member, id: string) {
  return reportMember(member).checks.find((each) => each.id === id)!;
}

const DF_L = (grade: string) => stockOf('dimension lumber', 'Douglas Fir-Larch', grade);
const nds = comparedWith('NDS 2018 and its Supplement, worked by hand');
const tables = comparedWith('NDS 2018 and its Supplement, tables of factors, from memory');
const solved = comparedWith('AWC Structural Wood Design Solved Example Problems, example 1.1, from memory');
const course = comparedWith('CE 479 wood design example, university course notes, Fall 2006');
const manual = comparedWith('size factors of deep timbers, lumber use manuals, from memory');
/** Half a unit in the last of so many decimals. */
const decimals = (count: number) => ({ within: 0.5 * 10 ** -count });
/** Floating point. */
const EXACTLY = { within: 1e-6 };

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
  course.holds(values.Fb, 1173, decimals(0));
  course.holds(values.Fv, 201, decimals(0));
  const bending = check(member, 'bending');
  expect(bending.combination).toBe('D+S');
  course.holds(bending.capacity, 1173, decimals(0));
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
  solved.holds(CL.value, 0.84, decimals(2));
  expect(CL.reason).toContain('le = 1.37 lu + 3d');
  solved.holds(check(member, 'slenderness').demand, 21.6, decimals(1));
  solved.holds(check(member, 'bending').capacity, 1400 * 0.8416, decimals(0));
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
  for (const [depth, CF] of list) manual.holds(sizeFactor('timber', 7.5, depth!), CF!, decimals(3));
});

test('a 6x16 of No.1 Douglas Fir-Larch has the size factor of its depth on the beams & stringers value', () => {
  // NDS 4.3.6.3 worked by hand: 1350 (12/15.5)^(1/9) = 1312 psi.
  const member = memberOf({ stock: stockOf('timber', 'Douglas Fir-Larch', 'No.1'), section: one(5.5, 15.5) });
  nds.holds(check(member, 'bending').capacity, 1312.1, decimals(0));
});

test('a wet-service incised 2x10 of No.2 Douglas Fir-Larch loses what Tables 4A and 4.3.8 take', () => {
  // NDS Supplement 4A and NDS 4.3.8, worked by hand. Fb CF = 990 is not over 1150, so CM of Fb is 1.
  const member = memberOf({ stock: DF_L('No.2'), section: one(1.5, 9.25), service: 'wet', incised: true });
  const values = valuesOf(member, 1);
  nds.holds(values.Fb, 900 * 1.1 * 0.8, EXACTLY);
  nds.holds(values.Fv, 180 * 0.97 * 0.8, EXACTLY);
  nds.holds(values.E, 1.6e6 * 0.9 * 0.95, decimals(3));
  nds.holds(values.Emin, 0.58e6 * 0.9 * 0.95, decimals(3));
  nds.holds(values.Fcperp, 625 * 0.67, EXACTLY);
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
  tables.holds(values.Fb, 900 * CF, EXACTLY);
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
  tables.holds(valuesOf(memberOf({ stock, section: one(width, depth) }), 1).Fb, Fb, EXACTLY);
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
  nds.holds(glulam(one(5.125, 12), 21).capacity, 2400, EXACTLY);
  nds.holds(glulam(one(6.75, 31.5), 32).capacity, 2400 * 0.8468, decimals(0));
});

test('glulam of Southern Pine takes the twentieth root in its volume factor', () => {
  // NDS 5.3.6, worked by hand: (21/32)^0.05 (12/33)^0.05 (5.125/6.75)^0.05 = 0.9182.
  const member = memberOf({
    stock: stockOf('glulam', 'Southern Pine', '24F-1.8E'),
    section: one(6.75, 33),
    beam: simpleSpan(12 * 32),
  });
  nds.holds(
    check(member, 'bending').factors.find(({ symbol }) => symbol === 'CV')!.value,
    0.9182,
    decimals(3),
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
  tables.holds(bearingArea(length, 120, 240), Cb, { within: 0.01 });
});

test('an end notch of 2 in in a 4x12 leaves the shear of NDS 3.4.3.2', () => {
  // NDS 3.4.3.2 worked by hand: (2/3)(180)(3.5)(9.25)(9.25/11.25)² = 2626.5 lb.
  const member = memberOf({ stock: DF_L('No.2'), section: one(3.5, 11.25), notch: { left: 2, right: 0 } });
  const notch = check(member, 'notch');
  nds.holds(notch.capacity, 2626.5, decimals(0));
  nds.holds(notch.demand, reportMember(member).analysed().reactions[0]!.max, EXACTLY);
});

test('a glulam notch takes 0.72 of the shear value', () => {
  // NDS Supplement Table 5A, note on notched members, from memory.
  const member = memberOf({
    stock: stockOf('glulam', 'Western species', '24F-1.8E'),
    section: one(5.125, 15),
    notch: { left: 0, right: 1.5 },
  });
  nds.holds(check(member, 'notch').capacity, (2 / 3) * 265 * 0.72 * 5.125 * 13.5 * 0.81, EXACTLY);
});

test('wood of specific gravity 0.50 weighs 33.6 lb/ft3 at 15 % moisture and 35.7 lb/ft3 at 30 %', () => {
  // NDS Supplement 3.1.3, worked by hand: 62.4 x 0.5 / 1.0675 x 1.15 and 62.4 x 0.5 / 1.135 x 1.3.
  nds.holds(density(0.5, 15), 33.61, decimals(2));
  nds.holds(density(0.5, 30), 35.74, decimals(2));
  nds.holds(density(0.5, 0), 31.2, EXACTLY);
});

test('the member that the interface is described by has the figures described', () => {
  // The description of `check --json` that other programs were written against; most of it was worked by hand.
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
  expect(report.analysed().reactions[0]).toMatchObject({ at: 0, byKind: { live: 1680 } });
  expect(report.analysed().reactions[0]!.byKind.dead).toBeCloseTo(559.1, 1);
  expect(report.analysed().reactions[0]!.max).toBeCloseTo(2239.1, 1);
  expect(report.analysed().reactions[0]!.min).toBeCloseTo(559.1, 1);
  expect(report.analysed().analysis.live!.shear).toBeCloseTo(1680, 9);
  expect(report.analysed().analysis.live!.momentMax).toBeCloseTo(70560, 6);
  expect(report.analysed().analysis.live!.momentMin).toBeCloseTo(0, 6);
  expect(report.analysed().analysis.live!.deflection).toBeCloseTo(0.364, 3);
  expect(report.assumptions).toEqual(['top edge held throughout']);
});
