import { expect, test } from 'vitest';
import { beamStability, effectiveLength, slendernessRatio } from '../../src/timber/factors/beam-stability.ts';
import { bearingArea } from '../../src/timber/factors/bearing-area.ts';
import { flatUse } from '../../src/timber/factors/flat-use.ts';
import { incising } from '../../src/timber/factors/incising.ts';
import { repetitiveFactor } from '../../src/timber/factors/repetitive.ts';
import { sizeFactor } from '../../src/timber/factors/size.ts';
import { temperatureFactor } from '../../src/timber/factors/temperature.ts';
import { volumeFactor, volumeLength, volumeSection } from '../../src/timber/factors/volume.ts';
import { wetService } from '../../src/timber/factors/wet-service.ts';
import { lookUp } from '../../src/timber/look-up.ts';
import { isRefusal } from '../../src/timber/reference-values.ts';
import { stockOf } from './member-of.ts';

// NDS 2018 and its Supplement, by the clause each title names, from memory.
const EPS = 1e-9;

test('the effective length of a uniform load changes at lu/d 7 (Table 3.3.3)', () => {
  expect(effectiveLength('uniform', 69.999, 10)).toBeCloseTo(2.06 * 69.999, 9);
  expect(effectiveLength('uniform', 70, 10)).toBeCloseTo(1.63 * 70 + 30, 9);
  expect(effectiveLength('uniform', 200, 10)).toBeCloseTo(1.63 * 200 + 30, 9);
});

test('the effective length of a load at mid-span changes at lu/d 7 (Table 3.3.3)', () => {
  expect(effectiveLength('point at mid-span', 69.999, 10)).toBeCloseTo(1.8 * 69.999, 9);
  expect(effectiveLength('point at mid-span', 70, 10)).toBeCloseTo(1.37 * 70 + 30, 9);
});

test('the effective length of any other load changes at lu/d 7 and again over 14.3 (Table 3.3.3)', () => {
  expect(effectiveLength('other', 69.999, 10)).toBeCloseTo(2.06 * 69.999, 9);
  expect(effectiveLength('other', 70, 10)).toBeCloseTo(1.63 * 70 + 30, 9);
  expect(effectiveLength('other', 143, 10)).toBeCloseTo(1.63 * 143 + 30, 9);
  expect(effectiveLength('other', 143.001, 10)).toBeCloseTo(1.84 * 143.001, 9);
});

test('CL is the root of the clause as it is written, and goes to 1 for a stocky beam', () => {
  for (const [Fb, Emin, RB] of [
    [1000, 5.8e5, 10],
    [2400, 8.5e5, 20],
    [1500, 6.9e5, 35],
    [900, 5.8e5, 50],
  ] as const) {
    const F = (1.2 * Emin) / RB ** 2 / Fb;
    const written = (1 + F) / 1.9 - Math.sqrt(((1 + F) / 1.9) ** 2 - F / 0.95);
    expect(beamStability(Fb, Emin, RB)).toBeCloseTo(written, 12);
  }
  expect(beamStability(1000, 5.8e5, 1)).toBeGreaterThan(0.999);
  expect(slendernessRatio(2500, 1, 1)).toBe(50);
});

test('lumber of Fb x CF 1150 psi and less is not weakened in bending by wet service, above it is (Table 4A)', () => {
  expect(wetService(true, 'lumber', 'Fb', 1150)).toBe(1);
  expect(wetService(true, 'lumber', 'Fb', 1150 + 1e-6)).toBe(0.85);
  expect(wetService(false, 'lumber', 'Fb', 5000)).toBe(1);
});

test.each([
  ['lumber', 0.97, 0.67, 0.9],
  ['timber', 1, 0.67, 1],
  ['southern pine timber', 1, 1, 1],
  ['glulam', 0.875, 0.53, 0.833],
] as const)('wet %s has the CM of its table for Fv, Fc-perp and E', (rule, Fv, Fcperp, E) => {
  expect(wetService(true, rule, 'Fv', 0)).toBe(Fv);
  expect(wetService(true, rule, 'Fcperp', 0)).toBe(Fcperp);
  expect(wetService(true, rule, 'E', 0)).toBe(E);
});

test('timbers have a size factor over 12 in deep, and none at 12 (NDS 4.3.6.3)', () => {
  expect(sizeFactor('timber', 5.5, 12)).toBe(1);
  expect(sizeFactor('timber', 5.5, 12 + EPS)).toBeLessThan(1);
});

test('a depth off the stock takes the size factor of the next larger nominal depth', () => {
  expect(sizeFactor('lumber', 1.5, 9.25)).toBe(1.1);
  expect(sizeFactor('lumber', 1.5, 9.3)).toBe(1.0);
  expect(sizeFactor('lumber', 1.5, 9)).toBe(1.1);
  expect(sizeFactor('lumber', 1.5, 7)).toBe(1.2);
  expect(sizeFactor('lumber', 1.5, 20)).toBe(0.9);
});

test('lumber dressed in whole millimetres counts as the stock size that it is', () => {
  expect(sizeFactor('lumber', 38 / 25.4, 286 / 25.4)).toBe(1.0);
  expect(sizeFactor('lumber', 38 / 25.4, 235 / 25.4)).toBe(1.1);
  expect(sizeFactor('lumber', 38 / 25.4, 140 / 25.4)).toBe(1.3);
  expect(sizeFactor('lumber', 89 / 25.4, 235 / 25.4)).toBe(1.2);
});

test.each([
  ['stud', 3.5, 1.1],
  ['stud', 5.5, 1.0],
  ['light framing', 3.5, 1.0],
  ['utility', 3.5, 1.0],
  ['utility', 2.5, 0.4],
  ['lumber', 3.5, 1.5],
  ['lumber', 4.5, 1.4],
  ['lumber', 5.5, 1.3],
  ['lumber', 7.25, 1.2],
  ['lumber', 13.25, 0.9],
  ['none', 7.25, 1],
] as const)('%s %d in deep has its own size factor, %d (Table 4A)', (rule, depth, CF) => {
  expect(sizeFactor(rule, 1.5, depth)).toBe(CF);
});

test('a thickness between 3 and 4 in nominal takes the lesser size factor', () => {
  expect(sizeFactor('lumber', 3, 9.25)).toBe(1.1);
  expect(sizeFactor('lumber', 3.5, 9.25)).toBe(1.2);
});

test.each([
  [1.5, 3.5, 1.1],
  [1.5, 5.5, 1.15],
  [1.5, 7.25, 1.15],
  [1.5, 9.25, 1.2],
  [1.5, 13.25, 1.2],
  [2.5, 2.5, 1.0],
  [3.5, 3.5, 1.0],
  [3.5, 5.5, 1.05],
  [3.5, 9.25, 1.1],
])('flat lumber %d x %d in has Cfu %d (Table 4A)', (thick, wide, Cfu) => {
  expect(flatUse('lumber', true, thick, wide, 'No.2')).toBe(Cfu);
  expect(flatUse('lumber', false, thick, wide, 'No.2')).toBe(1);
});

test('three plies in contact are repetitive, two only when said so, and timbers and glulam never (NDS 4.3.9, 8.3.7)', () => {
  expect(repetitiveFactor('lumber', false, 2)).toBe(1);
  expect(repetitiveFactor('lumber', false, 3)).toBe(1.15);
  expect(repetitiveFactor('lumber', true, 1)).toBe(1.15);
  expect(repetitiveFactor('LVL', false, 3)).toBe(1.04);
  expect(repetitiveFactor('none', true, 4)).toBe(1);
});

test('incising takes from strength and stiffness, not from bearing (NDS Table 4.3.8)', () => {
  expect(['Fb', 'Fv', 'E', 'Fcperp'].map((key) => incising(true, key as 'Fb'))).toEqual([0.8, 0.8, 0.95, 1]);
});

test('sustained heat takes more from wet wood than from dry (NDS Table 2.3.3)', () => {
  expect(temperatureFactor('normal', true, 'Fb')).toBe(1);
  expect(temperatureFactor('100-125 F', false, 'Fb')).toBe(0.8);
  expect(temperatureFactor('100-125 F', true, 'Fv')).toBe(0.7);
  expect(temperatureFactor('125-150 F', false, 'Fcperp')).toBe(0.7);
  expect(temperatureFactor('125-150 F', true, 'Fb')).toBe(0.5);
  expect(temperatureFactor('125-150 F', true, 'E')).toBe(0.9);
});

test('CV is never above 1 and leaves it just beyond the base size (NDS 5.3.6)', () => {
  const of = (feet: number, d: number) =>
    volumeFactor(volumeLength('glulam western', 12 * feet), volumeSection('glulam western', 5.125, d));
  expect(of(21, 12)).toBe(1);
  expect(of(10, 9)).toBe(1);
  expect(of(21 * (1 + 1e-6), 12)).toBeLessThan(1);
  expect(of(21, 12 * (1 + 1e-6))).toBeLessThan(1);
});

test('a glulam wider than 10 3/4 in counts as that wide in CV (NDS 5.3.6)', () => {
  expect(volumeSection('glulam western', 12.25, 24)).toBe(volumeSection('glulam western', 10.75, 24));
  expect(volumeSection('glulam western', 10.7, 24)).toBeGreaterThan(
    volumeSection('glulam western', 10.75, 24),
  );
});

test('LVL has its depth law from 12 in, not above 1', () => {
  expect(volumeFactor(1, volumeSection('LVL', 1.75, 12))).toBe(1);
  expect(volumeFactor(1, volumeSection('LVL', 1.75, 9.5))).toBe(1);
  expect(volumeFactor(1, volumeSection('LVL', 1.75, 18))).toBeCloseTo((12 / 18) ** (1 / 9), 12);
});

test('Cb needs a bearing under 6 in and 3 in of wood beyond it (NDS 3.10.4)', () => {
  expect(bearingArea(5.999, 100, 200)).toBeGreaterThan(1);
  expect(bearingArea(6, 100, 200)).toBe(1);
  expect(bearingArea(4, 5, 200)).toBeCloseTo(4.375 / 4, 12);
  expect(bearingArea(4, 4.99, 200)).toBe(1);
  expect(bearingArea(4, 195.01, 200)).toBe(1);
});

test('a timber is a post up to 2 in deeper than wide, and a beam beyond (NDS 4.1.3)', () => {
  const stock = stockOf('timber', 'Douglas Fir-Larch', 'No.1');
  const Fb = (width: number, depth: number) => {
    const values = lookUp(stock, { width, depth, plies: 1, flat: false });
    return isRefusal(values) ? values.refused : values.Fb;
  };
  expect(Fb(5.5, 5.5)).toBe(1200);
  expect(Fb(5.5, 7.5)).toBe(1200);
  expect(Fb(5.5, 7.501)).toBe(1350);
  expect(Fb(5.5, 9.5)).toBe(1350);
});

test('Stud 8 in and deeper takes the values and the size factor of No.3 (Table 4A)', () => {
  const of = (grade: string, depth: number) =>
    lookUp(stockOf('dimension lumber', 'Douglas Fir-Larch', grade), {
      width: 1.5,
      depth,
      plies: 1,
      flat: false,
    });
  expect(of('Stud', 5.5)).toMatchObject({ Fb: 700 });
  expect(of('Stud', 7.25)).toEqual(of('No.3', 7.25));
});
