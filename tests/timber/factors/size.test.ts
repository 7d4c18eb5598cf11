import { describe, expect, test } from 'vitest';
import { flatUse, flatUseReason, flatUseStiffness } from '../../../src/timber/factors/flat-use.ts';
import { type SizeRule, sizeFactor, sizeReason } from '../../../src/timber/factors/size.ts';

/** Dressed sizes, in, of the nominal ones (NDS Supplement Table 1B). */
const DRESSED = { 2: 1.5, 3: 2.5, 4: 3.5, 5: 4.5, 6: 5.5, 8: 7.25, 10: 9.25, 12: 11.25, 14: 13.25 } as const;
type Nominal = keyof typeof DRESSED;

// NDS Supplement Table 4A, size factors on Fb: 2 and 3 in thick, then 4 in thick; from memory.
const TABLE_4A: readonly [SizeRule, Nominal, number, number][] = [
  ['lumber', 2, 1.5, 1.5],
  ['lumber', 3, 1.5, 1.5],
  ['lumber', 4, 1.5, 1.5],
  ['lumber', 5, 1.4, 1.4],
  ['lumber', 6, 1.3, 1.3],
  ['lumber', 8, 1.2, 1.3],
  ['lumber', 10, 1.1, 1.2],
  ['lumber', 12, 1.0, 1.1],
  ['lumber', 14, 0.9, 1.0],
  ['stud', 3, 1.1, 1.1],
  ['stud', 4, 1.1, 1.1],
  ['stud', 5, 1.0, 1.0],
  ['stud', 6, 1.0, 1.0],
  // Deeper ones as No.3.
  ['stud', 8, 1.2, 1.3],
  ['stud', 12, 1.0, 1.1],
  ['light framing', 3, 1.0, 1.0],
  ['light framing', 4, 1.0, 1.0],
  ['utility', 2, 0.4, 0.4],
  ['utility', 3, 0.4, 0.4],
  ['utility', 4, 1.0, 1.0],
];

// Table 4B: the table holds the size effect up to 12 in; from memory.
const TABLE_4B: readonly [SizeRule, Nominal, number, number][] = [
  ['southern pine', 4, 1, 1],
  ['southern pine', 6, 1, 1],
  ['southern pine', 8, 1, 1.1],
  ['southern pine', 12, 1, 1.1],
  ['southern pine', 14, 0.9, 0.99],
];

describe('CF', () => {
  test.each([...TABLE_4A, ...TABLE_4B])(
    'of %s, nominal %i in deep, is %d, 4 in thick %d',
    (rule, deep, thin, four) => {
      expect(sizeFactor(rule, DRESSED[2], DRESSED[deep])).toBe(thin);
      expect(sizeFactor(rule, DRESSED[3], DRESSED[deep])).toBe(thin);
      expect(sizeFactor(rule, DRESSED[4], DRESSED[deep])).toBeCloseTo(four, 12);
    },
  );

  test('of a depth off the stock is that of the next larger one', () => {
    expect(sizeFactor('lumber', 1.5, 7.25)).toBe(1.2);
    // Whole millimetres name the same piece.
    expect(sizeFactor('lumber', 1.5, 184.5 / 25.4)).toBe(1.2);
    expect(sizeFactor('lumber', 38 / 25.4, 286 / 25.4)).toBe(1);
    expect(sizeFactor('lumber', 38 / 25.4, 140 / 25.4)).toBe(1.3);
    expect(sizeFactor('lumber', 1.5, 7.3)).toBe(1.1);
    expect(sizeFactor('lumber', 1.5, 20)).toBe(0.9);
  });

  test('of a thickness off the stock is that of the thinner column', () => {
    expect(sizeFactor('lumber', 3, 9.25)).toBe(1.1);
    expect(sizeFactor('lumber', 89 / 25.4, 9.25)).toBe(1.2);
  });

  test('of timbers is (12/d)^(1/9) over 12 in (NDS 4.3.6.3)', () => {
    expect(sizeFactor('timber', 5.5, 12)).toBe(1);
    expect(sizeFactor('timber', 5.5, 12 + 1e-9)).toBeLessThan(1);
    expect(sizeFactor('timber', 5.5, 11.5)).toBe(1);
    expect(sizeFactor('timber', 5.5, 15.5)).toBeCloseTo((12 / 15.5) ** (1 / 9), 12);
  });

  test('is none of MSR, glulam and LVL', () => {
    expect(sizeFactor('none', 1.5, 13.25)).toBe(1);
  });

  test.each<[SizeRule, number, number, string, string]>([
    ['lumber', 1.5, 9.25, 'nominal 10 in deep, Table 4A', '235 mm (nominal 10 in) deep, Table 4A'],
    [
      'lumber',
      3.5,
      9.25,
      'nominal 10 in deep, 4 in thick, Table 4A',
      '235 mm (nominal 10 in) deep, nominal 4 in thick, Table 4A',
    ],
    ['stud', 1.5, 5.5, 'Stud, nominal 6 in deep, Table 4A', 'Stud, 139.7 mm (nominal 6 in) deep, Table 4A'],
    [
      'utility',
      1.5,
      3.5,
      'Utility, nominal 4 in deep, Table 4A',
      'Utility, 88.9 mm (nominal 4 in) deep, Table 4A',
    ],
    [
      'light framing',
      1.5,
      3.5,
      'Construction and Standard, 4 in and less deep, Table 4A',
      'Construction and Standard, nominal 4 in and less deep, Table 4A',
    ],
    [
      'southern pine',
      1.5,
      11.25,
      'the size effect is in the table, Table 4B',
      'the size effect is in the table, Table 4B',
    ],
    [
      'southern pine',
      3.5,
      5.5,
      'the size effect is in the table, Table 4B',
      'the size effect is in the table, Table 4B',
    ],
    [
      'southern pine',
      3.5,
      7.25,
      'nominal 8 in deep, 4 in thick, Table 4B',
      '184.2 mm (nominal 8 in) deep, nominal 4 in thick, Table 4B',
    ],
    [
      'southern pine',
      1.5,
      13.25,
      'nominal 14 in deep, over the 12 in row, Table 4B',
      '336.6 mm (nominal 14 in) deep, over the nominal 12 in row, Table 4B',
    ],
    [
      'southern pine',
      3.5,
      13.25,
      'nominal 14 in deep, 4 in thick, over the 12 in row, Table 4B',
      '336.6 mm (nominal 14 in) deep, nominal 4 in thick, over the nominal 12 in row, Table 4B',
    ],
    ['timber', 5.5, 11.5, 'not over 12 in deep, NDS 4.3.6.3', 'not over 304.8 mm deep, NDS 4.3.6.3'],
    [
      'timber',
      5.5,
      15.5,
      '(12/d)^(1/9) for d 15.5 in over 12 in, NDS 4.3.6.3',
      '(304.8 mm/d)^(1/9) for d 393.7 mm over 304.8 mm, NDS 4.3.6.3',
    ],
    [
      'none',
      3.5,
      12,
      'no size factor for this product, NDS 4.3.6, 5.3.6',
      'no size factor for this product, NDS 4.3.6, 5.3.6',
    ],
  ])('of %s %d x %d says why', (rule, thick, wide, us, si) => {
    expect(sizeReason(rule, thick, wide, 'us')).toBe(us);
    expect(sizeReason(rule, thick, wide, 'si')).toBe(si);
  });
});

describe('Cfu', () => {
  // NDS Supplement Table 4A, flat use factors by width: 2 and 3 in thick, then 4 in thick; from memory.
  test.each<[Nominal, number, number]>([
    [2, 1, 1],
    [3, 1, 1],
    [4, 1.1, 1],
    [5, 1.1, 1.05],
    [6, 1.15, 1.05],
    [8, 1.15, 1.05],
    [10, 1.2, 1.1],
    [12, 1.2, 1.1],
  ])('of lumber nominal %i in wide is %d, 4 in thick %d', (wide, thin, four) => {
    expect(flatUse('lumber', true, 1.5, DRESSED[wide], 'No.2')).toBe(thin);
    expect(flatUse('lumber', true, 2.5, DRESSED[wide], 'No.2')).toBe(thin);
    expect(flatUse('lumber', true, 3.5, DRESSED[wide], 'No.2')).toBe(four);
    expect(flatUse('lumber', false, 1.5, DRESSED[wide], 'No.2')).toBe(1);
    expect(flatUse('none', true, 1.5, DRESSED[wide], 'No.2')).toBe(1);
  });

  test('of a width off the stock is that of the next smaller one', () => {
    expect(flatUse('lumber', true, 1.5, 9.2, 'No.2')).toBe(1.15);
  });

  // Table 4D, beams and stringers loaded on the wide face; from memory.
  test.each([
    ['Select Structural', 0.86, 1],
    ['Dense Select Structural', 0.86, 1],
    ['No.1', 0.74, 0.9],
    ['Dense No.1', 0.74, 0.9],
    ['No.2', 1, 1],
  ])('of timbers, %s, is %d on Fb and %d on E', (grade, Fb, E) => {
    expect(flatUse('timber', true, 5.5, 11.5, grade)).toBe(Fb);
    expect(flatUseStiffness('timber', true, grade)).toBe(E);
    expect(flatUse('timber', false, 5.5, 11.5, grade)).toBe(1);
    expect(flatUseStiffness('timber', false, grade)).toBe(1);
    expect(flatUseStiffness('lumber', true, grade)).toBe(1);
  });

  test('says why', () => {
    const reason = (
      rule: 'lumber' | 'timber' | 'none',
      flat: boolean,
      thick: number,
      units: 'us' | 'si' = 'us',
    ) => flatUseReason(rule, flat, thick, 9.25, units);
    expect(reason('lumber', false, 1.5)).toBe('on edge, NDS 4.3.7');
    expect(reason('none', true, 1.5)).toBe('no flat-use factor here, NDS 4.3.7');
    expect(reason('timber', true, 5.5)).toBe('beams & stringers loaded on the wide face, Table 4D');
    expect(reason('lumber', true, 1.5)).toBe('laid flat, nominal 10 in wide, 2 and 3 in thick, Table 4A');
    expect(reason('lumber', true, 3.5)).toBe('laid flat, nominal 10 in wide, 4 in thick, Table 4A');
    expect(reason('lumber', true, 2.5, 'si')).toBe(
      'laid flat, 235 mm (nominal 10 in) wide, 2 and 3 in nominal thick, Table 4A',
    );
    expect(reason('lumber', true, 3.5, 'si')).toBe(
      'laid flat, 235 mm (nominal 10 in) wide, 4 in nominal thick, Table 4A',
    );
  });
});
