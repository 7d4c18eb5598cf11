import { describe, expect, test } from 'vitest';
import { combinationTable } from '../../src/loads/combinations.ts';
import type { LoadKind } from '../../src/loads/kinds.ts';

const strength = (present: LoadKind[], set: 'ASCE 7-16' | 'ASCE 7-22' = 'ASCE 7-16') =>
  combinationTable(present, set).strength.map((c) => [c.label, c.duration]);

// ASCE 7-16 §2.4.1 with CD of NDS Table 2.3.2, as domain §2 states them.
const rows: readonly (readonly [string, LoadKind[], readonly (readonly [string, number])[]])[] = [
  ['dead alone', [], [['D', 0.9]]],
  [
    'floor live',
    ['live'],
    [
      ['D', 0.9],
      ['D+L', 1],
    ],
  ],
  [
    'snow',
    ['snow'],
    [
      ['D', 0.9],
      ['D+S', 1.15],
    ],
  ],
  [
    'rain lasts as snow',
    ['rain'],
    [
      ['D', 0.9],
      ['D+R', 1.15],
    ],
  ],
  [
    'roof live',
    ['roofLive'],
    [
      ['D', 0.9],
      ['D+Lr', 1.25],
    ],
  ],
  [
    'live and snow',
    ['live', 'snow'],
    [
      ['D', 0.9],
      ['D+L', 1],
      ['D+S', 1.15],
      ['D+0.75L+0.75S', 1.15],
    ],
  ],
  [
    'three roof loads, never two of them together',
    ['live', 'roofLive', 'snow', 'rain'],
    [
      ['D', 0.9],
      ['D+L', 1],
      ['D+Lr', 1.25],
      ['D+S', 1.15],
      ['D+R', 1.15],
      ['D+0.75L+0.75Lr', 1.25],
      ['D+0.75L+0.75S', 1.15],
      ['D+0.75L+0.75R', 1.15],
    ],
  ],
  [
    'wind down',
    ['wind'],
    [
      ['D', 0.9],
      ['D+0.6W', 1.6],
      ['0.6D+0.6W', 1.6],
    ],
  ],
  [
    'wind up',
    ['windUp'],
    [
      ['D', 0.9],
      ['D+0.6Wup', 1.6],
      ['0.6D+0.6Wup', 1.6],
    ],
  ],
  [
    'wind beside live',
    ['live', 'wind'],
    [
      ['D', 0.9],
      ['D+L', 1],
      ['D+0.6W', 1.6],
      ['D+0.75L+0.45W', 1.6],
      ['0.6D+0.6W', 1.6],
    ],
  ],
  [
    'wind beside snow',
    ['snow', 'windUp'],
    [
      ['D', 0.9],
      ['D+S', 1.15],
      ['D+0.6Wup', 1.6],
      ['D+0.45Wup+0.75S', 1.6],
      ['0.6D+0.6Wup', 1.6],
    ],
  ],
  [
    'both winds, never together',
    ['live', 'snow', 'wind', 'windUp'],
    [
      ['D', 0.9],
      ['D+L', 1],
      ['D+S', 1.15],
      ['D+0.75L+0.75S', 1.15],
      ['D+0.6W', 1.6],
      ['D+0.6Wup', 1.6],
      ['D+0.75L+0.45W+0.75S', 1.6],
      ['D+0.75L+0.45Wup+0.75S', 1.6],
      ['0.6D+0.6W', 1.6],
      ['0.6D+0.6Wup', 1.6],
    ],
  ],
];

describe('combinationTable', () => {
  test.each(rows)(
    'lists for %s what ASCE 7-16 asks for, each with its shortest duration',
    (_, present, expected) => {
      expect(strength(present)).toEqual(expected);
    },
  );

  test('takes snow as 0.7S with ASCE 7-22, whose ground snow is a strength-level load', () => {
    expect(strength(['live', 'snow'], 'ASCE 7-22')).toEqual([
      ['D', 0.9],
      ['D+L', 1],
      ['D+0.7S', 1.15],
      ['D+0.75L+0.525S', 1.15],
    ]);
    expect(strength(['live', 'rain'], 'ASCE 7-22')).toEqual(strength(['live', 'rain'], 'ASCE 7-16'));
  });

  test('takes wind in deflection as 0.42W where it is alone, entry by entry beside the strength list', () => {
    const table = combinationTable(['live', 'wind', 'windUp'], 'ASCE 7-16');
    expect(table.deflection.map((c) => c.label)).toEqual([
      'D',
      'D+L',
      'D+0.42W',
      'D+0.42Wup',
      'D+0.75L+0.45W',
      'D+0.75L+0.45Wup',
      '0.6D+0.42W',
      '0.6D+0.42Wup',
    ]);
    expect(table.deflection.map((c) => c.variable)).toEqual([
      '',
      'L',
      '0.42W',
      '0.42Wup',
      '0.75L+0.45W',
      '0.75L+0.45Wup',
      '0.42W',
      '0.42Wup',
    ]);
  });

  test('holds no label twice and no combination of both winds or two roof loads, for every set of kinds', () => {
    const kinds: LoadKind[] = ['live', 'roofLive', 'snow', 'rain', 'wind', 'windUp'];
    for (let mask = 0; mask < 64; mask++) {
      const present = kinds.filter((_, i) => mask & (1 << i));
      const { strength: list, byDuration } = combinationTable(present, 'ASCE 7-16');
      expect(new Set(list.map((c) => c.label)).size).toBe(list.length);
      for (const { factors } of list) {
        expect(factors.wind && factors.windUp).toBeFalsy();
        expect([factors.roofLive, factors.snow, factors.rain].filter(Boolean).length).toBeLessThan(2);
        expect(Object.keys(factors).every((k) => k === 'dead' || present.includes(k as LoadKind))).toBe(true);
      }
      const sorted = byDuration.flatMap((group) => group.combinations).sort((a, b) => a - b);
      expect(sorted).toEqual(list.map((_, i) => i));
    }
  });
});
