import { describe, expect, test } from 'vitest';
import type { Combination } from '../../../src/loads/effects.ts';
import { incising, incisingReason } from '../../../src/timber/factors/incising.ts';
import { loadDurationReason } from '../../../src/timber/factors/load-duration.ts';
import {
  type RepetitiveRule,
  repetitiveFactor,
  repetitiveReason,
} from '../../../src/timber/factors/repetitive.ts';
import {
  temperatureFactor,
  temperatureIn,
  temperatureReason,
} from '../../../src/timber/factors/temperature.ts';
import {
  type Property,
  type WetRule,
  wetService,
  wetServiceReason,
} from '../../../src/timber/factors/wet-service.ts';

const PROPERTIES: readonly Property[] = ['Fb', 'Fv', 'Fcperp', 'E'];

describe('CM', () => {
  // NDS Supplement Tables 4A, 4D and 5A; from memory. Fb, Fv, Fc-perp, E.
  test.each<[WetRule, number, number, number, number]>([
    ['lumber', 0.85, 0.97, 0.67, 0.9],
    ['timber', 1, 1, 0.67, 1],
    ['southern pine timber', 1, 1, 1, 1],
    ['glulam', 0.8, 0.875, 0.53, 0.833],
    ['as typed', 1, 1, 1, 1],
  ])('of %s is %d, %d, %d, %d', (rule, ...values) => {
    expect(PROPERTIES.map((property) => wetService(true, rule, property, 2000))).toEqual(values);
    expect(PROPERTIES.map((property) => wetService(false, rule, property, 2000))).toEqual([1, 1, 1, 1]);
  });

  test('spares the bending of lumber whose Fb x CF is at most 1150 psi', () => {
    expect(wetService(true, 'lumber', 'Fb', 1150)).toBe(1);
    expect(wetService(true, 'lumber', 'Fb', 1150 + 1e-6)).toBe(0.85);
    expect(wetService(true, 'lumber', 'Fv', 1000)).toBe(0.97);
    expect(wetService(true, 'glulam', 'Fb', 1000)).toBe(0.8);
  });

  test('says why', () => {
    const reason = (wet: boolean, rule: WetRule, property: Property = 'Fb', FbCF = 2000) =>
      wetServiceReason(wet, rule, property, FbCF, 'us');
    expect(reason(false, 'lumber')).toBe('dry, at most 19 % moisture, NDS 4.3.3');
    expect(reason(false, 'timber')).toBe('dry, at most 19 % moisture, NDS 4.3.3');
    expect(reason(false, 'glulam')).toBe('dry, under 16 % moisture, NDS 5.3.3');
    expect(reason(true, 'as typed')).toBe('the typed values are taken as those for wet service');
    expect(reason(true, 'southern pine timber')).toBe('wet, values are tabulated wet, Table 4D');
    expect(reason(true, 'lumber')).toBe('wet service, Table 4A, NDS 4.3.3');
    expect(reason(true, 'timber')).toBe('wet service, Table 4D, NDS 4.3.3');
    expect(reason(true, 'glulam')).toBe('wet service, Table 5A, NDS 5.3.3');
    expect(reason(true, 'glulam', 'Fb', 1000)).toBe('wet service, Table 5A, NDS 5.3.3');
    expect(reason(true, 'lumber', 'Fv', 1000)).toBe('wet service, Table 4A, NDS 4.3.3');
    expect(reason(true, 'lumber', 'Fb', 1149.6)).toBe('wet, but Fb x CF 1150 is at most 1150 psi, Table 4A');
    expect(wetServiceReason(true, 'lumber', 'Fb', 1000, 'si')).toBe(
      'wet, but Fb x CF 6.89 MPa is at most 7.93 MPa, Table 4A',
    );
  });
});

describe('Ct', () => {
  // NDS Table 2.3.3; from memory. Strength dry, strength wet, E.
  test.each([
    ['normal', 1, 1, 1],
    ['100-125 F', 0.8, 0.7, 0.9],
    ['125-150 F', 0.7, 0.5, 0.9],
  ] as const)('at %s is %d dry, %d wet, %d on E', (temperature, dry, wet, E) => {
    for (const property of ['Fb', 'Fv', 'Fcperp'] as const) {
      expect(temperatureFactor(temperature, false, property)).toBe(dry);
      expect(temperatureFactor(temperature, true, property)).toBe(wet);
    }
    expect(temperatureFactor(temperature, false, 'E')).toBe(E);
    expect(temperatureFactor(temperature, true, 'E')).toBe(E);
  });

  test('says why', () => {
    expect(temperatureReason('normal', true, 'us')).toBe('at most 100 F, NDS 2.3.3');
    expect(temperatureReason('normal', false, 'si')).toBe('at most 38 C, NDS 2.3.3');
    expect(temperatureReason('100-125 F', true, 'us')).toBe('sustained 100 to 125 F, wet, NDS Table 2.3.3');
    expect(temperatureReason('125-150 F', false, 'us')).toBe('sustained 125 to 150 F, dry, NDS Table 2.3.3');
    expect(temperatureReason('125-150 F', false, 'si')).toBe('sustained 52 to 66 C, dry, NDS Table 2.3.3');
    expect(temperatureIn('100-125 F', 'si')).toBe('38-52 C');
  });
});

describe('Ci', () => {
  test('is that of NDS Table 4.3.8 (from memory), and says why', () => {
    expect(PROPERTIES.map((property) => incising(true, property))).toEqual([0.8, 0.8, 1, 0.95]);
    expect(PROPERTIES.map((property) => incising(false, property))).toEqual([1, 1, 1, 1]);
    expect(incisingReason(true)).toBe('incised for treatment, NDS Table 4.3.8');
    expect(incisingReason(false)).toBe('not incised, NDS 4.3.8');
  });
});

describe('Cr', () => {
  // NDS 4.3.9, 8.3.7; from memory.
  test.each<[RepetitiveRule, number]>([
    ['lumber', 1.15],
    ['LVL', 1.04],
    ['none', 1],
  ])('of %s is %d where stated, and for three plies', (rule, Cr) => {
    expect(repetitiveFactor(rule, true, 1)).toBe(Cr);
    expect(repetitiveFactor(rule, false, 3)).toBe(Cr);
    expect(repetitiveFactor(rule, false, 4)).toBe(Cr);
    expect(repetitiveFactor(rule, false, 2)).toBe(1);
  });

  test('says why', () => {
    expect(repetitiveReason('none', true, 1, 'us')).toBe('no repetitive use for this product, NDS 4.3.9');
    expect(repetitiveReason('lumber', false, 3, 'us')).toBe('3 plies in contact, NDS 4.3.9');
    expect(repetitiveReason('LVL', true, 4, 'us')).toBe('4 plies in contact, NDS 8.3.7');
    expect(repetitiveReason('lumber', false, 2, 'us')).toBe('not repetitive, NDS 4.3.9');
    expect(repetitiveReason('lumber', true, 2, 'us')).toBe(
      'three or more, at most 24 in apart, sharing load, NDS 4.3.9',
    );
    expect(repetitiveReason('LVL', true, 1, 'si')).toBe(
      'three or more, at most 609.6 mm apart, sharing load, NDS 8.3.7',
    );
  });
});

describe('CD', () => {
  const combination = (label: string, duration: number, factors: Combination['factors']): Combination => ({
    label,
    duration,
    factors,
    variable: '',
  });

  test('is that of the shortest load that acts', () => {
    const reason = (label: string, duration: number, factors: Combination['factors']) =>
      loadDurationReason(combination(label, duration, factors));
    expect(reason('D', 0.9, { dead: 1 })).toBe('dead is the shortest load in D, NDS Table 2.3.2');
    expect(reason('D+L', 1, { dead: 1, live: 1 })).toBe(
      'floor live is the shortest load in D+L, NDS Table 2.3.2',
    );
    expect(reason('D+S', 1.15, { dead: 1, snow: 1 })).toBe(
      'snow is the shortest load in D+S, NDS Table 2.3.2',
    );
    expect(reason('D+Lr', 1.25, { dead: 1, roofLive: 1 })).toBe(
      'roof live is the shortest load in D+Lr, NDS Table 2.3.2',
    );
    expect(reason('D+R', 1.15, { dead: 1, rain: 1 })).toBe(
      'rain is the shortest load in D+R, NDS Table 2.3.2',
    );
    expect(reason('D+0.6W', 1.6, { dead: 1, wind: 0.6 })).toBe(
      'wind is the shortest load in D+0.6W, NDS Table 2.3.2',
    );
    expect(reason('0.6D+0.6W', 1.6, { dead: 0.6, windUp: 0.6 })).toBe(
      'wind is the shortest load in 0.6D+0.6W, NDS Table 2.3.2',
    );
    // A factor of nothing is no load.
    expect(reason('D', 1, { dead: 1, live: 0 })).toBe('D, NDS Table 2.3.2');
  });
});
