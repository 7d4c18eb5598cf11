import { expect, test } from 'vitest';
import {
  boardFeet,
  gradesOf,
  mostPlies,
  nextStockDepth,
  nextStockWidth,
  rackSizes,
  shortWood,
  sizeLabel,
  speciesOf,
  stockDepths,
  stockWidths,
  timberNominalOf,
} from '../../src/timber/index.ts';
import type { Product } from '../../src/timber/member.ts';
import { stockOf } from './member-of.ts';

const labels = (...wood: [Product, string, string]) => rackSizes(...wood).map(({ label }) => label);
const DF_L = 'Douglas Fir-Larch';

test('the rack of dimension lumber is 2x4 to 2x14 in one to four plies, 3x4 to 3x14 and 4x4 to 4x16', () => {
  const found = labels('dimension lumber', DF_L, 'No.2');
  const wanted: string[] = [];
  for (const depth of [4, 6, 8, 10, 12, 14]) {
    wanted.push(
      `2x${depth}`,
      `(2) 2x${depth}`,
      `(3) 2x${depth}`,
      `(4) 2x${depth}`,
      `3x${depth}`,
      `4x${depth}`,
    );
  }
  wanted.push('4x16');
  expect([...found].sort()).toEqual(wanted.sort());
});

test('a grade whose table stops at 4 in has only 4 in sizes on its rack', () => {
  expect(labels('dimension lumber', 'Hem-Fir', 'Construction')).toEqual([
    '2x4',
    '3x4',
    '(2) 2x4',
    '4x4',
    '(3) 2x4',
    '(4) 2x4',
  ]);
});

test('the rack of machine stress rated lumber is of 2 in lumber alone', () => {
  expect(
    labels('machine stress rated', DF_L, '1800f-1.6E').every((label) => /2x(4|6|8|10|12|14)$/.test(label)),
  ).toBe(true);
  expect(labels('machine stress rated', DF_L, '1800f-1.6E')).toHaveLength(24);
});

test('the rack of timbers runs from 5x5 to 12x24, on edge', () => {
  const found = labels('timber', DF_L, 'No.1');
  expect(found[0]).toBe('5x5');
  expect(found.at(-1)).toBe('12x24');
  expect(found).toContain('6x12');
  expect(found).not.toContain('8x6');
});

test('the rack of glulam has every listed width from 6 to 48 in deep, in laminations of its species', () => {
  const western = rackSizes('glulam', 'Western species', '24F-1.8E');
  expect(new Set(western.map(({ width }) => width))).toEqual(
    new Set([3.125, 5.125, 6.75, 8.75, 10.75, 12.25]),
  );
  expect(western.every(({ depth }) => depth >= 6 && depth <= 48 && depth % 1.5 === 0)).toBe(true);
  expect(western.map(({ label }) => label)).toContain('GL 5-1/8x15');
  expect(western).toHaveLength(6 * 29);
  const pine = rackSizes('glulam', 'Southern Pine', '28F-2.1E SP');
  expect(new Set(pine.map(({ width }) => width))).toEqual(new Set([3, 5, 6.75, 8.5, 10.5]));
  expect(pine.every(({ depth }) => depth >= 6 && depth <= 48 && depth % 1.375 === 0)).toBe(true);
  expect(pine.map(({ label }) => label)).toContain('GL 5x13-3/4');
});

test('the rack of LVL has every listed depth in one to four plies', () => {
  const found = labels('LVL', '', 'typical 2.0E');
  expect(found).toHaveLength(40);
  expect(found).toContain('(2) LVL 1-3/4x11-7/8');
  expect(found[0]).toBe('LVL 1-3/4x7-1/4');
});

test('racks stand lightest first; of equal weights the shallower first, then the fewer plies', () => {
  for (const wood of [
    ['dimension lumber', DF_L, 'No.2'],
    ['glulam', 'Southern Pine', '24F-1.8E'],
    ['LVL', '', ''],
    ['timber', 'Hem-Fir', 'No.2'],
  ] as const) {
    const sizes = rackSizes(...(wood as readonly [Product, string, string]));
    for (let at = 1; at < sizes.length; at += 1) {
      const [a, b] = [sizes[at - 1]!, sizes[at]!];
      const [wa, wb] = [a, b].map((size) => size.width * size.depth * size.plies);
      expect(
        wa! < wb! || (wa === wb && (a.depth < b.depth || (a.depth === b.depth && a.plies <= b.plies))),
      ).toBe(true);
    }
  }
});

test('an unknown wood and a custom one have an empty rack', () => {
  expect(rackSizes('dimension lumber', 'Balsa', 'No.2')).toEqual([]);
  expect(rackSizes('custom', '', '')).toEqual([]);
});

test.each([
  ['dimension lumber', 1.5, 11.25, 1, '2x12'],
  ['dimension lumber', 1.5, 11.25, 2, '(2) 2x12'],
  ['dimension lumber', 2.5, 11, 1, '2.5 x 11 in'],
  ['dimension lumber', 1.5, 10, 3, '(3) 1.5 x 10 in'],
  ['dimension lumber', 38 / 25.4, 235 / 25.4, 1, '2x10'],
  ['timber', 5.5, 11.5, 1, '6x12'],
  ['timber', 6, 12, 1, '6 x 12 in'],
  ['glulam', 5.125, 15, 1, 'GL 5-1/8x15'],
  ['glulam', 5.2, 15, 1, 'GL 5.2 x 15 in'],
  ['LVL', 1.75, 11.875, 2, '(2) LVL 1-3/4x11-7/8'],
  ['custom', 2, 8, 1, '2 x 8 in'],
] as const)('a %s of %d x %d in, %d plies, is called "%s"', (product, width, depth, plies, label) => {
  expect(sizeLabel({ width, depth, plies, flat: false }, product)).toBe(label);
});

test('board feet go by nominal size, all plies; glulam and LVL have none', () => {
  expect(boardFeet({ width: 1.5, depth: 11.25, plies: 2, flat: false }, 'dimension lumber')).toBe(4);
  expect(boardFeet({ width: 5.5, depth: 11.5, plies: 1, flat: false }, 'timber')).toBe(6);
  expect(boardFeet({ width: 1.5, depth: 10, plies: 1, flat: false }, 'dimension lumber')).toBe(2);
  expect(boardFeet({ width: 5.125, depth: 15, plies: 1, flat: false }, 'glulam')).toBeNull();
});

test('stock depths go up and down by one size, stop at the ends, and start from off the stock', () => {
  const stock = stockOf('dimension lumber', DF_L, 'No.2');
  expect(stockDepths(stock, 1.5)).toEqual([3.5, 5.5, 7.25, 9.25, 11.25, 13.25]);
  expect(stockDepths(stock, 3.5).at(-1)).toBe(15.25);
  expect(nextStockDepth(stock, 1.5, 11.25, 1)).toBe(13.25);
  expect(nextStockDepth(stock, 1.5, 11.25, -1)).toBe(9.25);
  expect(nextStockDepth(stock, 1.5, 10, 1)).toBe(11.25);
  expect(nextStockDepth(stock, 1.5, 13.25, 1)).toBeNull();
  expect(nextStockDepth(stock, 1.5, 3.5, -1)).toBeNull();
  expect(stockWidths(stock)).toEqual([1.5, 2.5, 3.5]);
  expect(nextStockWidth(stock, 1.5, 1)).toBe(2.5);
  expect(mostPlies(stock, 1.5)).toBe(4);
  expect(mostPlies(stock, 3.5)).toBe(1);
});

test('species and grades are those of the tables, in their order', () => {
  expect(speciesOf('timber')).toEqual(['Douglas Fir-Larch', 'Hem-Fir', 'Southern Pine']);
  expect(gradesOf('dimension lumber', 'Southern Pine')).toEqual([
    'Select Structural',
    'No.1',
    'No.2',
    'No.3',
  ]);
  expect(gradesOf('timber', 'Hem-Fir')).toEqual(['Select Structural', 'No.1', 'No.2']);
  expect(gradesOf('glulam', 'Western species')).toEqual([
    '16F-1.3E',
    '20F-1.5E',
    '24F-1.7E',
    '24F-1.8E',
    '26F-1.9E',
  ]);
  expect(gradesOf('glulam', 'Southern Pine')).toHaveLength(7);
});

test.each([
  ['dimension lumber', DF_L, 'No.2', 'DF-L No.2'],
  ['dimension lumber', 'Southern Pine', 'Select Structural', 'SP SS'],
  ['machine stress rated', 'Spruce-Pine-Fir', '2100f-1.8E', 'SPF 2100f-1.8E'],
  ['glulam', 'Western species', '24F-1.8E', 'GL 24F-1.8E'],
  ['LVL', '', '', 'LVL typical 2.0E'],
  ['custom', '', 'white oak', 'white oak'],
] as const)('%s %s %s is shortly called %s', (product, species, grade, short) => {
  expect(shortWood(stockOf(product, species, grade))).toBe(short);
});

test('timbers have even nominal sizes from 6, and 5', () => {
  expect(timberNominalOf(4.5)).toBe(5);
  expect(timberNominalOf(11.5)).toBe(12);
  expect(timberNominalOf(6.5)).toBeNull();
});
