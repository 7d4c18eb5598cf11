import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { QUANTITY_KINDS } from '../../src/quantity/kinds.ts';
import { parseQuantity } from '../../src/quantity/parse.ts';
import { tidyQuantity } from '../../src/quantity/tidy.ts';
import { fromUnit } from '../../src/quantity/units.ts';
import { writeQuantity } from '../../src/quantity/write.ts';

const kinds = fc.constantFrom(...QUANTITY_KINDS);
const systems = fc.constantFrom('us' as const, 'si' as const);

describe('writeQuantity', () => {
  test('any finite double of any kind is read back as exactly the same double', () => {
    fc.assert(
      fc.property(
        kinds,
        systems,
        fc.double({ noNaN: true, noDefaultInfinity: true }),
        (kind, units, value) => {
          const text = writeQuantity(kind, value, units);
          expect(parseQuantity(kind, text)).toEqual({ ok: true, value: value + 0 });
        },
      ),
      { numRuns: 2000 },
    );
  });

  test('every sixteenth of an inch is written without a long decimal and read back', () => {
    fc.assert(
      fc.property(fc.integer({ min: 0, max: 40_000 }), (sixteenths) => {
        const text = writeQuantity('length', sixteenths / 16, 'us');
        expect(text.length).toBeLessThan(16);
        expect(parseQuantity('length', text)).toEqual({ ok: true, value: sixteenths / 16 });
      }),
    );
  });

  test('a value typed in either system is written as short as it was typed', () => {
    const units: readonly (readonly [(typeof QUANTITY_KINDS)[number], string])[] = [
      ['length', 'ft'],
      ['length', 'm'],
      ['length', 'mm'],
      ['areaLoad', 'psf'],
      ['areaLoad', 'kPa'],
      ['lineLoad', 'plf'],
      ['lineLoad', 'kN/m'],
      ['pointLoad', 'lb'],
      ['pointLoad', 'kN'],
      ['stress', 'psi'],
      ['stress', 'MPa'],
      ['area', 'ft2'],
      ['area', 'm2'],
    ];
    fc.assert(
      fc.property(
        fc.constantFrom(...units),
        systems,
        fc.integer({ min: 1, max: 99_999 }),
        ([kind, unit], system, n) => {
          const value = fromUnit(kind, n / 100, unit);
          expect(writeQuantity(kind, value, system).length).toBeLessThan(18);
        },
      ),
    );
  });

  test.each([
    ['length', 168, 'us', '14 ft'],
    ['length', 174.5, 'us', `14'-6 1/2"`],
    ['length', 168.5, 'us', `14'-0 1/2"`],
    ['length', -174, 'us', `-14'-6"`],
    ['length', 11.25, 'us', '11.25 in'],
    ['length', 16, 'us', '16 in'],
    ['length', 24, 'us', '24 in'],
    ['length', 36, 'us', '3 ft'],
    ['length', 0, 'us', '0 in'],
    ['length', (4.42 * 10_000) / 254, 'us', '4.42 m'],
    ['length', (4.42 * 10_000) / 254, 'si', '4.42 m'],
    ['length', 1400 / 254, 'si', '140 mm'],
    ['areaLoad', 40 / 144, 'us', '40 psf'],
    ['areaLoad', 0, 'si', '0 kPa'],
    ['lineLoad', 5, 'us', '60 plf'],
    ['pointLoad', 850, 'us', '850 lb'],
    ['stress', 1_600_000, 'us', '1600000 psi'],
    ['area', 600 * 144, 'us', '600 ft2'],
    ['number', 0.0000001, 'us', '0.0000001'],
  ] as const)('%s %d in %s is written %s', (kind, value, units, text) => {
    expect(writeQuantity(kind, value, units)).toBe(text);
  });

  test('what is not finite cannot be written', () => {
    for (const value of [Number.NaN, Infinity, -Infinity]) {
      expect(() => writeQuantity('length', value, 'us')).toThrow(RangeError);
    }
  });
});

describe('tidyQuantity', () => {
  test('a run of nudges in base units ends on the value that its shown text would be read as', () => {
    fc.assert(
      fc.property(fc.integer({ min: 0, max: 200 }), fc.integer({ min: 1, max: 30 }), (start, steps) => {
        let value = start / 144;
        for (let i = 0; i < steps; i++) value = tidyQuantity('areaLoad', value + 5 / 144, 'us');
        expect(value).toBe((start + 5 * steps) / 144);
        expect(writeQuantity('areaLoad', value, 'us')).toBe(`${start + 5 * steps} psf`);
      }),
    );
  });

  test('a value that is no short decimal is left alone', () => {
    expect(tidyQuantity('length', 100 / 3, 'us')).toBe(100 / 3);
    expect(tidyQuantity('length', Math.PI, 'si')).toBe(Math.PI);
  });
});
