import { describe, expect, test } from 'vitest';
import { areaToLine } from '../../src/loads/area-to-line.ts';
import { liveReductionFactor } from '../../src/loads/reduction.ts';
import { member, PSF } from './members.ts';

/** ft² to in² */
const FT2 = 144;
const factor = (psf: number, area: number, KLL: number) =>
  liveReductionFactor(psf * PSF, { area: area * FT2, KLL });

// ASCE 7-16 §4.7.2, eq. 4.7-1: L = Lo (0.25 + 15/sqrt(KLL AT)). The rows are the equation worked by hand.
describe('liveReductionFactor', () => {
  test('takes an interior beam of 600 ft² from 50 to 34.2 psf: KLL AT = 1200, 0.25 + 15/34.64 = 0.683', () => {
    expect(50 * factor(50, 600, 2)).toBeCloseTo(34.151, 3);
  });

  test.each([
    [40, 199, 2, 1, 'KLL AT below 400 ft²'],
    [40, 200, 2, 1, 'KLL AT of 400 ft² exactly, where the equation gives 1'],
    [40, 450, 2, 0.75, 'KLL AT = 900'],
    [40, 900, 1, 0.75, 'KLL AT = 900 by area alone'],
    [40, 1800, 2, 0.5, 'KLL AT = 3600, where the equation gives 0.5'],
    [40, 9000, 2, 0.5, 'never below half'],
    [100, 450, 2, 0.75, '100 psf may still be reduced'],
    [125, 450, 2, 1, 'above 100 psf never'],
  ])('of %i psf on %i ft² with KLL %i is %f (%s)', (psf, area, KLL, expected) => {
    expect(factor(psf, area, KLL)).toBeCloseTo(expected, 12);
  });

  test('is 1 where no reduction is asked for', () => {
    expect(liveReductionFactor(40 * PSF, null)).toBe(1);
  });

  test('touches the floor live area load only', () => {
    const loading = member(
      {},
      {
        area: { dead: 10 * PSF, live: 40 * PSF, snow: 30 * PSF },
        liveReduction: { area: 450 * FT2, KLL: 2 },
      },
    );
    expect(areaToLine(loading, 'live')).toBeCloseTo(0.75 * 40 * PSF * 72, 12);
    expect(areaToLine(loading, 'dead')).toBeCloseTo(10 * PSF * 72, 12);
    expect(areaToLine(loading, 'snow')).toBeCloseTo(30 * PSF * 72, 12);
  });
});
