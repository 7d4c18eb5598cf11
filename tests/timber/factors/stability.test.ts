import { describe, expect, test } from 'vitest';
import {
  beamStability,
  effectiveLength,
  effectiveLengthRule,
  slendernessRatio,
  stabilityReason,
} from '../../../src/timber/factors/beam-stability.ts';
import { bearingArea, bearingAreaReason, bearingNeeded } from '../../../src/timber/factors/bearing-area.ts';
import {
  hasVolumeLength,
  type VolumeRule,
  volumeFactor,
  volumeLength,
  volumeReason,
  volumeRoot,
  volumeSection,
} from '../../../src/timber/factors/volume.ts';

describe('CL', () => {
  // NDS Table 3.3.3; from memory. d = 10 in, so that lu/d is a tenth of lu.
  test.each([
    ['uniform', 69.9, '2.06 lu', 2.06 * 69.9],
    ['uniform', 70, '1.63 lu + 3d', 1.63 * 70 + 30],
    ['uniform', 200, '1.63 lu + 3d', 1.63 * 200 + 30],
    ['point at mid-span', 69.9, '1.80 lu', 1.8 * 69.9],
    ['point at mid-span', 70, '1.37 lu + 3d', 1.37 * 70 + 30],
    ['point at mid-span', 200, '1.37 lu + 3d', 1.37 * 200 + 30],
    ['other', 69.9, '2.06 lu', 2.06 * 69.9],
    ['other', 70, '1.63 lu + 3d', 1.63 * 70 + 30],
    ['other', 143, '1.63 lu + 3d', 1.63 * 143 + 30],
    ['other', 143.1, '1.84 lu', 1.84 * 143.1],
  ] as const)('of %s, lu %d, has le = %s', (load, lu, rule, le) => {
    expect(effectiveLength(load, lu, 10)).toBeCloseTo(le, 9);
    expect(effectiveLengthRule(load, lu, 10)).toBe(rule);
  });

  test('has RB = sqrt(le d / b²) (NDS 3.3.3.6)', () => {
    expect(slendernessRatio(200, 2, 8)).toBeCloseTo(20, 12);
  });

  test('follows the curve of NDS 3.3.3.8', () => {
    for (const [FbStar, Emin, RB] of [
      [1200, 580_000, 8],
      [2400, 850_000, 20],
      [900, 470_000, 49],
    ] as const) {
      const F = (1.2 * Emin) / RB ** 2 / FbStar;
      const half = (1 + F) / 1.9;
      expect(beamStability(FbStar, Emin, RB)).toBeCloseTo(half - Math.sqrt(half ** 2 - F / 0.95), 10);
    }
    // It goes to 1 for a stocky beam.
    expect(beamStability(1000, 5.8e5, 1)).toBeGreaterThan(0.999);
  });

  test('says why', () => {
    expect(stabilityReason('uniform', 96, 11.25, 12.3456, 'us')).toBe(
      'lu 96 in, lu/d 8.53, le = 1.63 lu + 3d, RB 12.35, NDS 3.3.3',
    );
    expect(stabilityReason('other', 33.337, 11.25, 7, 'si')).toBe(
      'lu 846.8 mm, lu/d 2.96, le = 2.06 lu, RB 7, NDS 3.3.3',
    );
    expect(stabilityReason('other', 33.337, 11.25, 7, 'us')).toContain('lu 33.34 in,');
  });
});

describe('CV', () => {
  // NDS 5.3.6; from memory. x = 10, of Southern Pine 20.
  test.each<[VolumeRule, number]>([
    ['glulam western', 10],
    ['glulam pine', 20],
  ])('of %s has x = %i', (rule, x) => {
    expect(volumeRoot(rule)).toBe(x);
    expect(hasVolumeLength(rule)).toBe(true);
    expect(volumeLength(rule, 40 * 12)).toBeCloseTo((21 / 40) ** (1 / x), 12);
    expect(volumeSection(rule, 6.75, 24)).toBeCloseTo(((12 / 24) * (5.125 / 6.75)) ** (1 / x), 12);
    // The widest piece counts, not a wider lay-up.
    expect(volumeSection(rule, 14, 24)).toBeCloseTo(((12 / 24) * (5.125 / 10.75)) ** (1 / x), 12);
  });

  test('of LVL goes by depth alone, and of all else there is none', () => {
    expect(hasVolumeLength('LVL')).toBe(false);
    expect(hasVolumeLength('none')).toBe(false);
    expect(volumeRoot('LVL')).toBe(9);
    expect(volumeLength('LVL', 480)).toBe(1);
    expect(volumeSection('LVL', 14, 24)).toBeCloseTo((12 / 24) ** (1 / 9), 12);
    expect(volumeLength('none', 480)).toBe(1);
    expect(volumeSection('none', 14, 24)).toBe(1);
  });

  test('is never above 1, and leaves it just beyond the base size', () => {
    expect(volumeFactor(1.2, 0.9)).toBe(1);
    expect(volumeFactor(0.8, 0.9)).toBeCloseTo(0.72, 12);
    const of = (feet: number, d: number) =>
      volumeFactor(volumeLength('glulam western', 12 * feet), volumeSection('glulam western', 5.125, d));
    expect(of(21, 12)).toBe(1);
    expect(of(10, 9)).toBe(1);
    expect(of(21 * (1 + 1e-6), 12)).toBeLessThan(1);
    expect(of(21, 12 * (1 + 1e-6))).toBeLessThan(1);
  });

  test('says why', () => {
    expect(volumeReason('none', 240, 3.5, 12, 'us')).toBe('no volume factor for this product, NDS 5.3.6');
    expect(volumeReason('LVL', 240, 3.5, 16, 'us')).toBe(
      '(12/d)^(1/9), not above 1, d 16 in: typical, the maker’s report decides, NDS 8.3.6',
    );
    expect(volumeReason('LVL', 240, 3.5, 16, 'si')).toBe(
      '(304.8 mm/d)^(1/9), not above 1, d 406.4 mm: typical, the maker’s report decides, NDS 8.3.6',
    );
    expect(volumeReason('glulam western', 480, 6.75, 24, 'us')).toBe(
      '(21/L)^(1/x) (12/d)^(1/x) (5.125/b)^(1/x), not above 1, x 10, L 40 ft, d 24, b 6.75 in, NDS 5.3.6',
    );
    expect(volumeReason('glulam pine', 480, 14, 23.99999, 'si')).toBe(
      '(6.401 m/L)^(1/x) (304.8 mm/d)^(1/x) (130.2 mm/b)^(1/x), not above 1, x 20, L 12.192 m, d 609.6 mm, b 273.1 mm, NDS 5.3.6',
    );
    expect(volumeReason('glulam pine', 480, 14, 24.12345, 'us')).toContain('d 24.123, b 10.75 in');
  });
});

describe('Cb', () => {
  // NDS 3.10.4; from memory: (lb + 0.375)/lb below 6 in, 3 in or more from the end.
  test('is more than 1 for short bearings away from the ends alone', () => {
    expect(bearingArea(3, 50, 100)).toBeCloseTo(3.375 / 3, 12);
    expect(bearingArea(5.99, 50, 100)).toBeCloseTo(6.365 / 5.99, 12);
    expect(bearingArea(6, 50, 100)).toBe(1);
    expect(bearingArea(4, 5, 100)).toBeCloseTo(4.375 / 4, 12);
    expect(bearingArea(4, 4.99, 100)).toBe(1);
    expect(bearingArea(4, 95, 100)).toBeCloseTo(4.375 / 4, 12);
    expect(bearingArea(4, 95.01, 100)).toBe(1);
  });

  test('says why', () => {
    expect(bearingAreaReason(6, 50, 100, 'us')).toBe('bearing 6 in or longer, NDS 3.10.4');
    expect(bearingAreaReason(6, 50, 100, 'si')).toBe('bearing 152.4 mm or longer, NDS 3.10.4');
    expect(bearingAreaReason(4, 2, 100, 'us')).toBe('nearer than 3 in to the end of the member, NDS 3.10.4');
    expect(bearingAreaReason(4, 50, 100, 'us')).toBe(
      '(lb + 0.375)/lb, shorter than 6 in, 3 in or more from the end, NDS 3.10.4',
    );
    expect(bearingAreaReason(4, 50, 100, 'si')).toBe(
      '(lb + 9.5 mm)/lb, shorter than 152.4 mm, 76.2 mm or more from the end, NDS 3.10.4',
    );
  });

  test('gives the length that just does, with its own Cb', () => {
    // 5 in without Cb: 4.625 in with (4.625 + 0.375) / 4.625.
    expect(bearingNeeded(5, 50, 100)).toBeCloseTo(4.625, 12);
    expect(bearingNeeded(5, 1, 100)).toBe(5);
    expect(bearingNeeded(9, 50, 100)).toBe(9);
    expect(bearingNeeded(0.3, 50, 100)).toBe(0.3);
    // Longer than 6 in without Cb, but not with it.
    expect(bearingNeeded(6.2, 50, 100)).toBeCloseTo(5.825, 12);
    expect(bearingNeeded(0.375, 50, 100)).toBe(0.375);
  });
});
