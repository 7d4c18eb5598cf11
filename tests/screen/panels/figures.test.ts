import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { showChange, showExponent, showRatio } from '../../../src/screen/panels/figures.ts';
import { cellOf, limitCell } from '../../../src/screen/panels/scale.ts';
import { unicode } from './support.ts';

describe('showRatio', () => {
  it('never shows a failing ratio as 1.00, nor a passing one above it', () => {
    expect(showRatio(1.004, unicode)).toBe('1.01');
    expect(showRatio(1.00000001, unicode)).toBe('1.01');
    expect(showRatio(1.016, unicode)).toBe('1.02');
    expect(showRatio(0.999, unicode)).toBe('1.00');
    // The contract's pass is ratio <= 1 + 1e-9.
    expect(showRatio(1 + 1e-10, unicode)).toBe('1.00');
    fc.assert(
      fc.property(fc.double({ min: 0.9, max: 1.1, noNaN: true }), (ratio) => {
        expect(Number(showRatio(ratio, unicode)) > 1).toBe(ratio > 1 + 1e-9);
      }),
    );
  });

  it('stays within four cells, says what it cannot show, and names what nothing ties down', () => {
    expect([12.84, 123.4, 4000, Number.POSITIVE_INFINITY].map((ratio) => showRatio(ratio, unicode))).toEqual([
      '12.8',
      '123',
      '>999',
      'untied',
    ]);
    expect([null, Number.NaN, -1].map((ratio) => showRatio(ratio, unicode))).toEqual(['—', '—', '—']);
    fc.assert(
      fc.property(
        fc.double({ min: 0, max: 1e300, noNaN: true }),
        (ratio) => showRatio(ratio, unicode).length <= 4,
      ),
    );
  });
});

describe('showChange and showExponent', () => {
  it('carry a sign of their own, a true minus', () => {
    expect(showChange(0.16, unicode)).toBe('+0.16');
    expect(showChange(-0.35, unicode)).toBe('−0.35');
    expect(showChange(-0.001, unicode)).toBe('0.00');
    expect(showChange(null, unicode)).toBe('');
    expect(showExponent(-2.96, unicode)).toBe('−2.96');
    expect(showExponent(Number.NaN, unicode)).toBe('—');
  });
});

describe('the scale of the gauges', () => {
  it('is logarithmic, so that the same factor is the same distance', () => {
    const cells = 91; // thirty cells an octave
    expect(cellOf(0.25, cells)).toBe(0);
    expect(cellOf(0.5, cells)).toBe(30);
    expect(limitCell(cells)).toBe(60);
    expect(cellOf(Math.SQRT2, cells)).toBe(75);
    expect(cellOf(2, cells)).toBe(90);
  });

  it('holds a failing ratio past the limit and a passing one before it, on bars of any length', () => {
    fc.assert(
      fc.property(fc.double({ min: 0, noNaN: true }), fc.integer({ min: 4, max: 120 }), (ratio, cells) => {
        const cell = cellOf(ratio, cells);
        expect(cell).toBeGreaterThanOrEqual(0);
        expect(cell).toBeLessThan(cells);
        expect(cell > limitCell(cells)).toBe(ratio > 1 + 1e-9);
        expect(cell).not.toBe(limitCell(cells));
      }),
    );
  });
});
