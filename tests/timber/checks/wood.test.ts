import { describe, expect, test } from 'vitest';
import { flatRule, sizeRule, sizeWood, type WoodRules, woodOf } from '../../../src/timber/checks/wood.ts';
import type { Member, Section, Stock } from '../../../src/timber/member.ts';
import { memberOf, stockOf } from '../member-of.ts';

const VALUES = { Fb: 2400, Fv: 200, Fcperp: 600, E: 1.8e6, Emin: 0.93e6, G: 0.5 };
const CUSTOM: Stock = { ...stockOf('custom', '', 'oak'), values: VALUES, valuesFrom: 'a report' };
const one = (width: number, depth: number, flat = false): Section => ({ width, depth, plies: 1, flat });

/** The wood of a member at its size. */
function at(parts: Partial<Member>) {
  const member = memberOf(parts);
  const wood = woodOf(member);
  expect(sizeWood(wood, member.section)).toBe(true);
  return wood.at;
}

describe('the rules of the factors that a stock follows', () => {
  // NDS 4.3, 5.3, 8.3 and the notes of the Supplement's tables, from memory.
  test.each<[Stock, WoodRules]>([
    [
      stockOf('dimension lumber', 'Hem-Fir', 'No.2'),
      { wet: 'lumber', repetitive: 'lumber', volume: 'none', notchedShear: 1 },
    ],
    [
      stockOf('machine stress rated', 'Hem-Fir', '1650f-1.5E'),
      { wet: 'lumber', repetitive: 'lumber', volume: 'none', notchedShear: 1 },
    ],
    [
      stockOf('timber', 'Hem-Fir', 'No.1'),
      { wet: 'timber', repetitive: 'none', volume: 'none', notchedShear: 1 },
    ],
    [
      stockOf('timber', 'Southern Pine', 'No.1'),
      { wet: 'southern pine timber', repetitive: 'none', volume: 'none', notchedShear: 1 },
    ],
    [
      stockOf('glulam', 'Western species', '24F-1.8E'),
      { wet: 'glulam', repetitive: 'none', volume: 'glulam western', notchedShear: 0.72 },
    ],
    [
      stockOf('glulam', 'Southern Pine', '24F-1.8E'),
      { wet: 'glulam', repetitive: 'none', volume: 'glulam pine', notchedShear: 0.72 },
    ],
    [
      stockOf('LVL', '', 'typical 2.0E'),
      { wet: 'as typed', repetitive: 'LVL', volume: 'LVL', notchedShear: 1 },
    ],
    [CUSTOM, { wet: 'as typed', repetitive: 'none', volume: 'none', notchedShear: 1 }],
  ])('are those of its table (%#)', (stock, rules) => {
    expect(woodOf(memberOf({ stock })).rules).toEqual(rules);
  });

  test('CF goes by product, species and grade', () => {
    const lumber = (species: string, grade: string) =>
      sizeRule(stockOf('dimension lumber', species, grade), grade);
    expect(lumber('Hem-Fir', 'No.2')).toBe('lumber');
    expect(lumber('Hem-Fir', 'Select Structural')).toBe('lumber');
    expect(lumber('Hem-Fir', 'Stud')).toBe('stud');
    expect(lumber('Hem-Fir', 'Utility')).toBe('utility');
    expect(lumber('Hem-Fir', 'Construction')).toBe('light framing');
    expect(lumber('Hem-Fir', 'Standard')).toBe('light framing');
    expect(lumber('Southern Pine', 'Stud')).toBe('southern pine');
    expect(sizeRule(stockOf('timber', 'Hem-Fir', 'No.1'), 'No.1')).toBe('timber');
    expect(sizeRule(stockOf('glulam', 'Western species', '24F-1.8E'), '24F-1.8E')).toBe('none');
    expect(sizeRule(stockOf('machine stress rated', 'Hem-Fir', '1650f-1.5E'), '1650f-1.5E')).toBe('none');
  });

  test('Cfu is one of lumber, and of timbers more than 2 in deeper than wide', () => {
    const timber = stockOf('timber', 'Hem-Fir', 'No.1');
    expect(flatRule(timber, 5.5, 7.5)).toBe('none');
    expect(flatRule(timber, 5.5, 9.5)).toBe('timber');
    expect(flatRule(stockOf('dimension lumber', 'Hem-Fir', 'No.2'), 1.5, 9.25)).toBe('lumber');
    expect(flatRule(stockOf('machine stress rated', 'Hem-Fir', '1650f-1.5E'), 1.5, 9.25)).toBe('lumber');
    expect(flatRule(stockOf('glulam', 'Western species', '24F-1.8E'), 5.125, 12)).toBe('none');
    expect(flatRule(CUSTOM, 1.5, 9.25)).toBe('none');
  });
});

describe('the adjusted values of a size', () => {
  // Douglas Fir-Larch No.2: Fb 900, Fv 180, Fc-perp 625, E 1.6e6, Emin 0.58e6 psi (Supplement Table 4A, from memory).
  test('have every factor of their conditions, and of the size', () => {
    expect(at({ section: one(1.5, 11.25) })).toMatchObject({
      b: 1.5,
      d: 11.25,
      area: 16.875,
      FbSagging: 900,
      FbHogging: 900,
      Fv: 180,
      Fcperp: 625,
      E: 1.6e6,
      Emin: 0.58e6,
      EyMin: 0.58e6,
      Cfu: 1,
      volume: 1,
    });
    const { modulus, inertia } = at({ section: one(1.5, 11.25) });
    expect(modulus).toBeCloseTo((1.5 * 11.25 ** 2) / 6, 12);
    expect(inertia).toBeCloseTo((1.5 * 11.25 ** 3) / 12, 12);
  });

  test('in wet service and heat take CM and Ct; CM spares Fb x CF of 1150 psi and less, on either edge', () => {
    const hot = {
      service: 'wet',
      temperature: '125-150 F',
      incised: true,
      section: one(1.5, 11.25),
    } as const;
    const found = at(hot);
    expect(found.FbSagging).toBeCloseTo(900 * 0.5 * 0.8, 9);
    expect(found.FbHogging).toBeCloseTo(900 * 0.5 * 0.8, 9);
    expect(found.Fv).toBeCloseTo(180 * 0.97 * 0.5 * 0.8, 9);
    expect(found.Fcperp).toBeCloseTo(625 * 0.67 * 0.5, 9);
    expect(found.E).toBeCloseTo(1.6e6 * 0.9 * 0.9 * 0.95, 5);
    // 900 x 1.3 psi is above 1150.
    const small = at({ ...hot, section: one(1.5, 5.5) });
    expect(small.FbSagging).toBeCloseTo(900 * 1.3 * 0.85 * 0.5 * 0.8, 9);
    expect(small.FbHogging).toBeCloseTo(900 * 1.3 * 0.85 * 0.5 * 0.8, 9);
  });

  test('take typed factors in place of those of the standard', () => {
    const typed = (symbol: string, value: number) => ({
      typedFactors: { [symbol]: { value, reason: 'test' } },
    });
    const section = one(1.5, 11.25);
    expect(at({ section, ...typed('CF', 0.9) }).FbSagging).toBeCloseTo(810, 9);
    expect(at({ section, ...typed('Cr', 0.9) }).FbSagging).toBeCloseTo(810, 9);
    expect(at({ section, ...typed('CM', 0.9) })).toMatchObject({ FbSagging: 810, Fv: 162, Fcperp: 562.5 });
    expect(at({ section, ...typed('Ct', 0.5) })).toMatchObject({ FbSagging: 450, E: 0.8e6 });
    expect(at({ section, ...typed('Ci', 0.5) })).toMatchObject({ FbSagging: 450, E: 0.8e6 });
    expect(at({ section, ...typed('Cfu', 0.9) })).toMatchObject({ FbSagging: 900, Cfu: 0.9, E: 1.6e6 });
    expect(at({ section: one(1.5, 11.25, true), ...typed('Cfu', 0.9) }).Cfu).toBe(0.9);
    expect(at({ section: one(1.5, 11.25, true) }).Cfu).toBe(1.2);
  });

  test('of timbers laid flat have Cfu on all stiffnesses', () => {
    const stock = stockOf('timber', 'Douglas Fir-Larch', 'No.1');
    const edge = at({ stock, section: one(5.5, 11.5) });
    const flat = at({ stock, section: one(5.5, 11.5, true) });
    expect(flat.Cfu).toBe(0.74);
    expect(edge.Cfu).toBe(1);
    for (const value of ['E', 'Emin', 'EyMin'] as const)
      expect(flat[value] / edge[value]).toBeCloseTo(0.9, 12);
    expect([flat.b, flat.d]).toEqual([11.5, 5.5]);
  });

  test('of a size that its table does not cover there are none', () => {
    const member = memberOf({});
    const wood = woodOf(member);
    expect(sizeWood(wood, one(5.5, 11.5))).toBe(false);
    expect(wood.at).toMatchObject({ row: -1, area: 0 });
    expect(sizeWood(wood, one(1.5, 11.25))).toBe(true);
    expect(sizeWood(wood, one(5.5, 11.5))).toBe(false);
  });
});

describe('what is kept', () => {
  test('is one wood for one stock under the same conditions', () => {
    const member = memberOf({});
    const wood = woodOf(member);
    expect(woodOf({ ...member })).toBe(wood);
    for (const other of [
      { service: 'wet' },
      { temperature: '100-125 F' },
      { incised: true },
      { repetitive: true },
      { typedFactors: { CD: { value: 1, reason: 'test' } } },
    ] as const)
      expect(woodOf({ ...member, ...other })).not.toBe(wood);
    expect(woodOf(member)).toBe(wood);
  });

  test('is told apart where sizes share a number to be found by', () => {
    const wood = woodOf(memberOf({}));
    const taken = (section: Section) => {
      sizeWood(wood, section);
      return wood.at;
    };
    const sizes: Section[] = [
      one(1.5, 11.25),
      one(1.5, 11.25, true),
      { ...one(1.5, 11.25), plies: 2 },
      { ...one(1.5, 11.25, true), plies: 2 },
      one(2.5, 11.25),
      one(1.5, 9.25),
      // The same number as the first: 128 in wider is an inch less deep.
      one(129.5, 10.25),
    ];
    const first = sizes.map(taken);
    expect(new Set(first).size).toBe(sizes.length);
    for (const [i, section] of sizes.entries()) {
      expect(taken(section)).toMatchObject(section);
      // But where two share a number, of which the last is kept, the size is the very same.
      if (i > 0 && i < sizes.length - 1) expect(taken(section)).toBe(first[i]);
    }
  });

  test('of more conditions than are kept the oldest are worked out anew', () => {
    const member = memberOf({ stock: stockOf('dimension lumber', 'Hem-Fir', 'No.1') });
    const typed = (value: number) => ({ ...member, typedFactors: { CD: { value, reason: 'test' } } });
    const all = Array.from({ length: 40 }, (_, i) => typed(1 + i / 100));
    const woods = all.map((each) => woodOf(each));
    expect(woodOf(all.at(-1)!)).toBe(woods.at(-1));
    expect(woodOf(all[10]!)).toBe(woods[10]);
    expect(woodOf(all[0]!)).not.toBe(woods[0]);
  });
});
