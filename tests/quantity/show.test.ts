import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { parseQuantity } from '../../src/quantity/parse.ts';
import {
  showInches,
  showMoment,
  showQuantity,
  showRatio,
  showSmall,
  showSpan,
  showSpanDown,
  showStress,
  showWeight,
} from '../../src/quantity/show.ts';

describe('lengths for people', () => {
  test.each([
    [180, `15'-0"`],
    [174.5, `14'-6 1/2"`],
    [168.5, `14'-0 1/2"`],
    [48, `4'-0"`],
    [3.5, `0'-3 1/2"`],
    [179.99, `15'-0"`],
    [-174, `-14'-6"`],
  ])('a span of %d in is shown as %s', (inches, text) => {
    expect(showSpan(inches, 'us')).toBe(text);
  });

  test('a span in metres is shown to the millimetre', () => {
    expect(showSpan((4.42 * 10_000) / 254, 'si')).toBe('4.42 m');
    expect(showSpan((4.575 * 10_000) / 254, 'si')).toBe('4.575 m');
    expect(showSpan((4 * 10_000) / 254, 'si')).toBe('4.00 m');
  });

  test('a section size is shown in inches and sixteenths, or whole millimetres', () => {
    expect(showInches(11.25, 'us')).toBe('11 1/4"');
    expect(showInches(5.5 - 1 / 16, 'us')).toBe('5 7/16"');
    expect(showInches(0, 'us')).toBe('0"');
    expect(showInches(0.5, 'us')).toBe('1/2"');
    expect(showInches(-0.5, 'us')).toBe('-1/2"');
    expect(showInches(11.25, 'si')).toBe('286 mm');
  });

  test('any length shown on the 1/16 in grid is read back as the same length', () => {
    fc.assert(
      fc.property(fc.integer({ min: -40_000, max: 40_000 }), (sixteenths) => {
        const inches = sixteenths / 16;
        for (const text of [
          showSpan(inches, 'us'),
          showInches(inches, 'us'),
          showQuantity('length', inches, 'us'),
        ]) {
          expect(parseQuantity('length', text)).toEqual({ ok: true, value: inches });
        }
      }),
    );
  });

  test('a span rounded down is never longer than it is, and less than a quarter inch shorter', () => {
    fc.assert(
      fc.property(fc.double({ min: 1, max: 2400, noNaN: true }), (inches) => {
        const shown = parseQuantity('length', showSpanDown(inches, 'us'));
        if (!shown.ok) throw new Error(shown.fault);
        expect(shown.value).toBeLessThanOrEqual(inches + 1e-8);
        expect(shown.value).toBeGreaterThan(inches - 0.25 - 1e-8);
        const metric = parseQuantity('length', showSpanDown(inches, 'si'));
        if (!metric.ok) throw new Error(metric.fault);
        expect(metric.value).toBeLessThanOrEqual(inches + 1e-6);
        expect(metric.value).toBeGreaterThan(inches - 0.2);
      }),
    );
    expect(showSpanDown(159.24, 'us')).toBe(`13'-3"`);
    expect(showSpanDown(159.25, 'us')).toBe(`13'-3 1/4"`);
    expect(showSpanDown(180, 'us')).toBe(`15'-0"`);
  });

  test('a length of no stated style is in feet and inches over 24 in, in inches up to it', () => {
    expect(showQuantity('length', 24, 'us')).toBe('24"');
    expect(showQuantity('length', 25, 'us')).toBe(`2'-1"`);
    expect(showQuantity('length', 3.5, 'us', 'span')).toBe(`0'-3 1/2"`);
    expect(showQuantity('length', 0.318, 'us', 'small')).toBe('0.32 in');
  });

  test('a deflection is shown with decimals', () => {
    expect(showSmall(0.318, 'us')).toBe('0.32 in');
    expect(showSmall(0.318, 'si')).toBe('8.1 mm');
    expect(showSmall(-0.001, 'us')).toBe('0.00 in');
  });
});

describe('loads, stresses, moments and ratios for people', () => {
  test.each([
    ['areaLoad', 12 / 144, 'us', '12 psf'],
    ['areaLoad', 12.5 / 144, 'us', '12.5 psf'],
    ['areaLoad', 40 / 144, 'si', '1.92 kPa'],
    ['lineLoad', 18, 'us', '216 plf'],
    ['lineLoad', 18, 'si', '3.15 kN/m'],
    ['pointLoad', 1680, 'us', '1680 lb'],
    ['pointLoad', 1680, 'si', '7.47 kN'],
    ['area', 600 * 144, 'us', '600 ft2'],
    ['area', 600 * 144, 'si', '55.7 m2'],
    ['stress', 900, 'us', '900 psi'],
    ['number', 360, 'us', '360'],
  ] as const)('%s of %d in %s is shown as %s', (kind, value, units, text) => {
    expect(showQuantity(kind, value, units)).toBe(text);
  });

  test('large stresses lose their decimals', () => {
    expect(showStress(900, 'si')).toBe('6.21 MPa');
    expect(showStress(1_600_000, 'si')).toBe('11032 MPa');
  });

  test('a moment is shown in ft-lb or kN-m, a weight in lb/ft or kg/m', () => {
    expect(showMoment(70_560, 'us')).toBe('5880 ft-lb');
    expect(showMoment(70_560, 'si')).toBe('7.97 kN-m');
    expect(showWeight(0.65, 'us')).toBe('7.8 lb/ft');
    expect(showWeight(0.65, 'si')).toBe('11.6 kg/m');
  });

  test('no failing ratio is ever shown as 1.00, and no passing one as more', () => {
    expect(showRatio(1)).toBe('1.00');
    expect(showRatio(1 + 1e-10)).toBe('1.00');
    expect(showRatio(1.0000001)).toBe('1.01');
    expect(showRatio(1.004)).toBe('1.01');
    expect(showRatio(1.284)).toBe('1.28');
    expect(showRatio(Infinity)).toBe('untied');
    fc.assert(
      fc.property(fc.double({ min: 0, max: 5, noNaN: true }), (ratio) => {
        expect(Number(showRatio(ratio)) > 1).toBe(ratio > 1 + 1e-9);
      }),
    );
  });
});
