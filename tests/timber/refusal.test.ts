import { expect, test } from 'vitest';
import {
  checkStock,
  isRefusal,
  lookUp,
  prepare,
  rate,
  refusal,
  reportMember,
  stockFault,
  woodOf,
} from '../../src/timber/index.ts';
import type { Member, Stock } from '../../src/timber/member.ts';
import { CHECK_IDS, roomForRatios } from '../../src/timber/report.ts';
import { memberOf, simpleSpan, stockOf } from './member-of.ts';

const GLULAM = stockOf('glulam', 'Western species', '24F-1.8E');
const LVL = stockOf('LVL', '', 'typical 2.0E');
const one = (width: number, depth: number) => ({ width, depth, plies: 1, flat: false });
const ALL = { Fb: 2400, Fv: 200, Fcperp: 600, E: 1.8e6, Emin: 0.93e6, G: 0.5 };

const CASES: readonly (readonly [string, Partial<Member>, string, RegExp])[] = [
  [
    'a grade the species lacks',
    { stock: stockOf('dimension lumber', 'Hem-Fir', 'No.4') },
    'stock.grade',
    /Hem-Fir has no grade "No\.4".*"No\.[123]"/,
  ],
  [
    'a misspelt species',
    { stock: stockOf('dimension lumber', 'Douglas Fir', 'No.2') },
    'stock.species',
    /"Douglas Fir".*"Douglas Fir-/,
  ],
  [
    'a species of another product',
    { stock: stockOf('machine stress rated', 'Western Cedars', '1650f-1.5E') },
    'stock.species',
    /machine stress rated/,
  ],
  [
    'an unknown stress class',
    { stock: stockOf('glulam', '', '24F-1.9E') },
    'stock.grade',
    /24F-1\.[78]E|26F/,
  ],
  [
    'a class of Southern Pine in another species',
    { stock: stockOf('glulam', 'Western species', '28F-2.1E SP') },
    'stock.grade',
    /Southern Pine only/,
  ],
  [
    'an unknown LVL without its values',
    { stock: stockOf('LVL', '', 'Brand 2.2E') },
    'stock.values',
    /Fb, Fv, Fcperp, E, Emin, G/,
  ],
  [
    'custom without values',
    { stock: stockOf('custom', '', 'oak') },
    'stock.values',
    /custom needs typed values/,
  ],
  [
    'typed values from nowhere',
    { stock: { ...stockOf('custom', '', 'oak'), values: ALL } },
    'stock.values',
    /where they were read/,
  ],
  [
    'a negative typed value',
    { stock: { ...stockOf('custom', '', 'oak'), values: { ...ALL, Fv: -1 }, valuesFrom: 'x' } },
    'stock.values',
    /Fv must be more than 0/,
  ],
  ['a size too thick for the table', { section: one(5.5, 11.25) }, 'section', /2-4 in thick.*Table 4A/],
  ['a size too thin for the table', { section: one(1, 5.5) }, 'section', /2-4 in thick.*Table 4A/],
  [
    'Construction deeper than 4 in',
    { stock: stockOf('dimension lumber', 'Hem-Fir', 'Construction'), section: one(1.5, 5.5) },
    'section',
    /2-4 in wide.*Table 4A/,
  ],
  [
    'MSR thicker than 2 in',
    { stock: stockOf('machine stress rated', 'Hem-Fir', '1650f-1.5E'), section: one(3.5, 9.25) },
    'section',
    /Table 4C/,
  ],
  [
    'a timber under 5 in',
    { stock: stockOf('timber', 'Hem-Fir', 'No.1'), section: one(3.5, 9.5) },
    'section',
    /Table 4D/,
  ],
  ['wet LVL', { stock: LVL, section: one(1.75, 11.875), service: 'wet' }, 'wet', /NDS 8/],
  ['incised glulam', { stock: GLULAM, section: one(5.125, 12), incised: true }, 'incised', /NDS 5/],
  [
    'an incised timber',
    { stock: stockOf('timber', 'Hem-Fir', 'No.1'), section: one(5.5, 9.5), incised: true },
    'incised',
    /NDS 4\.3\.8/,
  ],
  ['glulam laid flat', { stock: GLULAM, section: { ...one(5.125, 12), flat: true } }, 'flat', /Fby/],
  ['a sawn notch deeper than d/4', { notch: { left: 2.82, right: 0 } }, 'notch', /d\/4.*NDS 4\.4\.3/],
  [
    'a glulam notch deeper than d/10',
    { stock: GLULAM, section: one(5.125, 12), notch: { left: 0, right: 1.21 } },
    'notch',
    /NDS 5\.4\.5/,
  ],
  [
    'a glulam notch deeper than 3 in',
    { stock: GLULAM, section: one(5.125, 36), notch: { left: 0, right: 3.01 } },
    'notch',
    /NDS 5\.4\.5/,
  ],
  [
    'an LVL notch deeper than d/10',
    { stock: LVL, section: one(1.75, 14), notch: { left: 1.41, right: 0 } },
    'notch',
    /NDS 8\.4\.1/,
  ],
  [
    'a notch in custom',
    {
      stock: { ...stockOf('custom', '', 'oak'), values: ALL, valuesFrom: 'x' },
      notch: { left: 0.1, right: 0 },
    },
    'notch',
    /NDS/,
  ],
  [
    'a notch at a free end',
    { beam: { ...simpleSpan(120), overhangs: { left: 24, right: 0 } }, notch: { left: 1, right: 0 } },
    'notch',
    /overhang.*NDS 4\.4\.3/,
  ],
  [
    'a notch at a fixed end',
    { beam: { ...simpleSpan(120), fixed: { left: true, right: false } }, notch: { left: 1, right: 0 } },
    'notch',
    /NDS 4\.4\.3/,
  ],
];

test.each(CASES)(
  '%s is refused in one line, with the key and the clause or the nearest name',
  (_, parts, path, words) => {
    const member = memberOf(parts);
    const fault = stockFault(member)!;
    expect(fault.reason).toMatch(words);
    expect(fault.reason).not.toContain('\n');
    expect(fault.path.startsWith(path)).toBe(true);
    expect(checkStock(member)).toBe(fault.reason);
    const report = reportMember(member);
    expect(report).toMatchObject({ passes: false, refused: fault.reason, governing: null, checks: [] });
  },
);

const ALLOWED: readonly (readonly [string, Partial<Member>])[] = [
  ['a sawn notch of just d/4', { notch: { left: 2.8125, right: 0 } }],
  ['a glulam notch of just d/10', { stock: GLULAM, section: one(5.125, 12), notch: { left: 0, right: 1.2 } }],
  ['a glulam notch of just 3 in', { stock: GLULAM, section: one(5.125, 36), notch: { left: 0, right: 3 } }],
  ['an LVL notch of just d/10', { stock: LVL, section: one(1.75, 14), notch: { left: 1.4, right: 0 } }],
  [
    'a notch in a timber 4 in and thicker at its end',
    { stock: stockOf('timber', 'Hem-Fir', 'No.1'), section: one(5.5, 9.5), notch: { left: 1, right: 0 } },
  ],
  [
    'wet LVL with all values of its report typed',
    { stock: { ...LVL, values: ALL, valuesFrom: 'report 7' }, section: one(1.75, 14), service: 'wet' },
  ],
  [
    'custom with Emin left to E and its COV',
    {
      stock: {
        ...stockOf('custom', '', 'oak'),
        values: { Fb: 1, Fv: 1, Fcperp: 1, E: 1e6, G: 0.5, COV: 0.25 },
        valuesFrom: 'x',
      },
    },
  ],
  ['full-sawn 4 in lumber', { section: one(4, 10) }],
  ['lumber in whole millimetres', { section: one(38 / 25.4, 286 / 25.4) }],
];

test.each(ALLOWED)('%s is not refused', (_, parts) => {
  expect(checkStock(memberOf(parts))).toBeNull();
});

test('a refused section fails every check in the rating', () => {
  const member = memberOf({ notch: { left: 2, right: 0 } });
  const ratios = roomForRatios();
  const prepared = prepare(member);
  const wood = woodOf(member);
  expect(refusal(member, one(1.5, 7.25))).toMatch(/NDS 4\.4\.3/);
  expect(rate(prepared, wood, one(1.5, 7.25), ratios)).toBe(false);
  expect([...ratios]).toEqual(CHECK_IDS.map(() => Number.POSITIVE_INFINITY));
  expect(refusal(member, one(1.5, 9.25))).toBeNull();
  rate(prepared, wood, one(1.5, 9.25), ratios);
  expect(ratios.some((ratio) => ratio === Number.POSITIVE_INFINITY)).toBe(false);
});

test('typed values stand over those of the table, with where they were read', () => {
  const stock: Stock = {
    ...stockOf('dimension lumber', 'Hem-Fir', 'No.2'),
    values: { E: 1.5e6 },
    valuesFrom: 'mill certificate 4',
  };
  const values = lookUp(stock, one(1.5, 9.25));
  expect(values).toMatchObject({ E: 1.5e6, Fb: 850, Fv: 150 });
  if (isRefusal(values)) throw new Error(values.refused);
  expect(values.source).toContain('mill certificate 4');
  expect(values.status).toContain('E typed');
});

test('a typed bending value of lumber goes for both signs, that of glulam for its own sign alone', () => {
  const typed = (stock: Stock) => lookUp({ ...stock, values: { Fb: 3000 }, valuesFrom: 'x' }, one(3.5, 9.25));
  expect(typed(stockOf('dimension lumber', 'Hem-Fir', 'No.2'))).toMatchObject({ Fb: 3000, FbNeg: 3000 });
  expect(typed(GLULAM)).toMatchObject({ Fb: 3000, FbNeg: 1450 });
});

test('a custom product has just the values that were typed, and Emin from E and COV where it was not', () => {
  const stock: Stock = {
    ...stockOf('custom', '', 'oak'),
    values: { Fb: 1500, Fv: 150, Fcperp: 800, E: 1.4e6, COV: 0.2, G: 0.67 },
    valuesFrom: 'test report',
  };
  // NDS Appendix D: 1.4e6 x 1.03 x (1 - 1.645 x 0.2) / 1.66 = 582 882.
  const values = lookUp(stock, one(2, 8));
  expect(values).toMatchObject({
    Fb: 1500,
    FbNeg: 1500,
    Fv: 150,
    Fcperp: 800,
    E: 1.4e6,
    G: 0.67,
    COV: 0.2,
    source: 'test report',
    status: 'typed',
  });
  if (!isRefusal(values)) expect(values.Emin).toBeCloseTo((1.4e6 * 1.03 * (1 - 0.329)) / 1.66, 6);
});

test('typed values do not carry a stock over the sizes that its table covers', () => {
  const stock: Stock = {
    ...stockOf('machine stress rated', 'Hem-Fir', 'own grade'),
    values: ALL,
    valuesFrom: 'x',
  };
  expect(isRefusal(lookUp(stock, one(1.5, 9.25)))).toBe(false);
  expect(isRefusal(lookUp(stock, one(3.5, 9.25)))).toBe(true);
});
