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
