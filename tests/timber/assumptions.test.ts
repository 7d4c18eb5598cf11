import { expect, test } from 'vitest';
import { assumptionsOf } from '../../src/timber/assumptions.ts';
import { reportMember } from '../../src/timber/index.ts';
import { memberOf } from './member-of.ts';

const assumed = memberOf({
  assumed: ['bearing', 'bracingBottom', 'temperature', 'service'],
  bracingBottom: 48,
  temperature: '100-125 F',
});

test('assumptions are in inches and Fahrenheit for US units', () => {
  expect(assumptionsOf(assumed, 'us')).toEqual([
    'top edge held throughout',
    'bottom edge held every 48 in',
    'bearings 3.5 in long',
    'dry in service',
    '100-125 F in service',
  ]);
});

test('assumptions are in millimetres and Celsius for SI', () => {
  expect(assumptionsOf(assumed, 'si')).toEqual([
    'top edge held throughout',
    'bottom edge held every 1219.2 mm',
    'bearings 88.9 mm long',
    'dry in service',
    '38-52 C in service',
  ]);
});

test('reasons for factors follow the units of the report, the numbers do not', () => {
  const [us, si] = [reportMember(assumed, 'us'), reportMember(assumed, 'si')];
  expect(si.checks.map(({ ratio }) => ratio)).toEqual(us.checks.map(({ ratio }) => ratio));
  const reason = (report: typeof us) =>
    report.checks.flatMap(({ factors }) => factors).find(({ symbol }) => symbol === 'Ct')!.reason;
  expect(reason(us)).toBe('sustained 100 to 125 F, dry, NDS Table 2.3.3');
  expect(reason(si)).toBe('sustained 38 to 52 C, dry, NDS Table 2.3.3');
});

test('a live-load reduction says what stays of the load, or why nothing is taken off', () => {
  const last = (live: number, area: number, units: 'us' | 'si' = 'us') =>
    assumptionsOf(
      memberOf({ area: { ...assumed.area, live: live / 144 }, liveReduction: { area: area * 144, KLL: 2 } }),
      units,
    ).at(-1);
  // 0.25 + 15/sqrt(1200) = 0.683
  expect(last(50, 600)).toBe('floor live load taken at 0.683 of it: KLL 2, AT 600 ft2, ASCE 7 4.7');
  expect(last(50, 199)).toBe(
    'floor live load not reduced: KLL 2, AT 199 ft2, KLL AT under 400 ft2, ASCE 7 4.7.2',
  );
  expect(last(101, 600)).toBe('floor live load not reduced: over 100 psf, ASCE 7 4.7.3');
  expect(last(101, 600, 'si')).toBe('floor live load not reduced: over 4.79 kPa, ASCE 7 4.7.3');
});

test('boards near enough to share load say so where nobody has stated that they do (NDS 4.3.9)', () => {
  const told = (part: Parameters<typeof memberOf>[0]) =>
    assumptionsOf(memberOf(part)).includes('not counted as repetitive, Cr 1');
  expect(told({ spacing: 16 })).toBe(true);
  expect(told({ spacing: 24 })).toBe(true);
  expect(told({ spacing: 25 })).toBe(false);
  expect(told({ spacing: null })).toBe(false);
  expect(told({ spacing: 16, repetitive: true })).toBe(false);
});
