import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { normalBelow } from '../../../src/explore/scatter/normal.ts';
import { scatterCOV, scatterOf } from '../../../src/explore/scatter/scatter.ts';
import { memberOf } from '../../support/session.ts';

describe('the normal distribution', () => {
  it.each([
    // Tables of the standard normal distribution, from memory.
    [0, 0.5],
    [1, 0.8413447460685429],
    [-1.645, 0.0499849055391214],
    [1.96, 0.9750021048517795],
    [-3, 0.0013498980316301],
    [-6, 9.865876450377e-10],
  ])('has at %d standard deviations %d below it', (z, share) => {
    expect(Math.abs(normalBelow(z) / share - 1)).toBeLessThan(1e-11);
  });

  it('is symmetric and rises', () => {
    fc.assert(
      fc.property(
        fc.double({ min: 0, max: 8, noNaN: true }),
        fc.double({ min: 1e-3, max: 1, noNaN: true }),
        (z, more) => {
          expect(normalBelow(z) + normalBelow(-z)).toBeCloseTo(1, 14);
          expect(normalBelow(-z)).toBeGreaterThan(normalBelow(-z - more));
        },
      ),
    );
  });
});

describe('scatter of a deflection ratio', () => {
  it('is a band from E (1 + 1.645 COV) to E (1 - 1.645 COV), that of visually graded lumber 0.71 to 1.70 of the ratio', () => {
    // 1/(1 + 1.645 x 0.25) and 1/(1 - 1.645 x 0.25).
    const { stiff, soft } = scatterOf(0.8, 0.25);
    expect(stiff / 0.8).toBeCloseTo(0.70859, 5);
    expect(soft / 0.8).toBeCloseTo(1.69851, 5);
  });

  it('has half of the members over the limit where the mean one is just at it, and one in twenty at the soft end', () => {
    expect(scatterOf(1, 0.25).over).toBe(0.5);
    fc.assert(
      fc.property(fc.double({ min: 0.01, max: 0.5, noNaN: true }), (COV) => {
        expect(scatterOf(1 - 1.645 * COV, COV).over).toBeCloseTo(0.05, 4);
      }),
    );
  });

  it('without scatter is the ratio itself', () => {
    expect(scatterOf(0.9, 0)).toEqual({ COV: 0, stiff: 0.9, soft: 0.9, over: 0 });
    expect(scatterOf(1.1, 0).over).toBe(1);
    expect(() => scatterOf(1, 0.7)).toThrow(RangeError);
  });

  it('goes by the COV of the wood: 0.25 visually graded, 0.11 MSR, 0.10 glulam (NDS Appendix F), typed, or not known', () => {
    const of = (stock: Record<string, unknown>) =>
      scatterCOV(memberOf({ stock, section: { width: '1.5 in', depth: '9.25 in' } }));
    expect(of({ product: 'dimension lumber', species: 'Hem-Fir', grade: 'No.2' })).toBe(0.25);
    expect(of({ product: 'machine stress rated', species: 'Hem-Fir', grade: '1650f-1.5E' })).toBe(0.11);
    expect(of({ product: 'glulam', grade: '24F-1.8E' })).toBe(0.1);
    const values = {
      Fb: '2000 psi',
      Fv: '200 psi',
      Fcperp: '500 psi',
      E: '1500000 psi',
      Emin: '700000 psi',
      G: 0.5,
    };
    expect(of({ product: 'custom', values, valuesFrom: 'a report' })).toBeNull();
    expect(of({ product: 'custom', values: { ...values, COV: 0.15 }, valuesFrom: 'a report' })).toBe(0.15);
  });
});
