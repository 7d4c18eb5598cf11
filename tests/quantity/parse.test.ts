import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { parseQuantity } from '../../src/quantity/parse.ts';

const value = (kind: Parameters<typeof parseQuantity>[0], text: string, bare?: string) => {
  const parsed = parseQuantity(kind, text, bare);
  if (!parsed.ok) throw new Error(parsed.fault);
  return parsed.value;
};
const fault = (kind: Parameters<typeof parseQuantity>[0], text: string, bare?: string) => {
  const parsed = parseQuantity(kind, text, bare);
  if (parsed.ok) throw new Error(`${text} was read as ${parsed.value}`);
  return parsed.fault;
};

describe('lengths', () => {
  test.each([
    [`14'-6 1/2"`, 174.5],
    [`14'-6-1/2"`, 174.5],
    [`14' 6 1/2"`, 174.5],
    [`14'6`, 174],
    [`14'-6`, 174],
    ['14-6', 174],
    ['14-6 1/2', 174.5],
    ['14 - 6', 174],
    ['14-6.25', 174.25],
    ['14 ft 6 in', 174],
    ['14ft6in', 174],
    ['14 feet 6 inches', 174],
    ['14.5 ft', 174],
    ['14 1/2 ft', 174],
    [`14'`, 168],
    [`6"`, 6],
    [`6''`, 6],
    ['174 in', 174],
    ['174in.', 174],
    [`3 1/2"`, 3.5],
    [`3-1/2"`, 3.5],
    [`1/2"`, 0.5],
    ['3½ in', 3.5],
    ['14’-6 ½”', 174.5],
    ['14′ 6″', 174],
    ['14’-6’’', 174],
    ['4.42 m', (4.42 * 10_000) / 254],
    ['442 cm', 44_200 / 254],
    ['140mm', 1400 / 254],
    ['140 MM', 1400 / 254],
    ['1,200 ft', 14400],
    ['.5 in', 0.5],
    ['5. in', 5],
    ['  9.25\u00a0in ', 9.25],
    ['-3 ft', -36],
    ['−3 ft', -36],
    [`-14'-6"`, -174],
    ['+3 ft', 36],
    [`0'-0 1/2"`, 0.5],
    ['0 ft', 0],
  ])('%s is read as %d inches', (text, inches) => {
    expect(value('length', text)).toBe(inches);
  });

  test('a bare number is refused without a unit to take, and taken as that unit with one', () => {
    expect(fault('length', '14')).toContain('no unit');
    expect(value('length', '14', 'ft')).toBe(168);
    expect(value('length', '9 1/4', 'in')).toBe(9.25);
    expect(value('length', '3-1/2', 'in')).toBe(3.5);
    expect(value('length', '3-1/2', 'ft')).toBe(42);
    expect(value('length', '4.4', 'm')).toBe((4.4 * 10_000) / 254);
  });

  test('a dash between whole numbers is feet and inches whatever the bare unit', () => {
    for (const bare of [undefined, 'ft', 'in', 'mm']) expect(value('length', '14-6', bare)).toBe(174);
  });

  test('minus zero is read as zero', () => {
    expect(Object.is(value('length', '-0 ft'), 0)).toBe(true);
  });

  test.each([
    ['', 'missing'],
    ['   ', 'missing'],
    ['NaN', 'plain number'],
    ['Infinity ft', 'plain number'],
    ['0x10 ft', 'plain decimal'],
    ['1e3 ft', 'plain decimal'],
    ['1E+3 ft', 'plain decimal'],
    ['4,42 m', 'plain decimal'],
    ['1.2.3 ft', 'plain decimal'],
    ['1,2345 ft', 'plain decimal'],
    ['--3 ft', 'plain number'],
    ['ft', 'plain number'],
    ['14 fot', 'unknown unit "fot"'],
    ['40 psf', 'an area load'],
    ['1/0 in', 'fraction over zero'],
    [`14'-1/0"`, 'fraction over zero'],
    [`14'-12"`, 'under 12'],
    ['14-13', 'under 12'],
    [`14.5'-6"`, 'whole'],
    [`14'-`, 'unknown unit'],
    [`14'-6" 3`, 'unknown unit'],
    ['14\n6', 'no'],
    [`${'9'.repeat(400)} ft`, 'too large'],
    [`${'9'.repeat(5000)} ft`, 'too long'],
  ])('%j is refused with the reason', (text, reason) => {
    expect(fault('length', text)).toContain(reason);
  });

  test('a fault names the text, what is wrong and what would be right', () => {
    expect(fault('length', '14 fot')).toBe(
      `"14 fot" is not a length: unknown unit "fot"; write 14 ft, 14'-6 1/2", 9.25 in or 4.42 m`,
    );
  });

  test('a fault is one short line without control characters, whatever the text', () => {
    fc.assert(
      fc.property(fc.string({ unit: 'binary', maxLength: 400 }), (text) => {
        const parsed = parseQuantity('length', text);
        if (parsed.ok) return;
        expect(parsed.fault).not.toMatch(/[\p{Cc}\p{Cf}\p{Zl}\p{Zp}]/u);
        expect(parsed.fault.length).toBeLessThan(1400);
      }),
    );
    expect(fault('length', '\u001b[2Jx\u202e')).toContain('\\u{1b}[2Jx\\u{202e}');
    expect(fault('length', 'x'.repeat(900)).length).toBeLessThan(200);
  });

  test('a hostile text takes no long time', () => {
    const start = performance.now();
    for (const text of ['1'.repeat(1000), '1 '.repeat(500), '1-'.repeat(500), `${'1,111'.repeat(200)}x`]) {
      parseQuantity('length', text);
    }
    expect(performance.now() - start).toBeLessThan(10_000);
  });
});

// Factors: NIST SP 811, Appendix B.8 (from memory): 1 psi = 6894.757 Pa, 1 psf = 47.88026 Pa,
// 1 lb/ft = 14.59390 N/m, 1 lbf = 4.448222 N, 1 ft2 = 0.09290304 m2.
describe('loads, stresses and areas', () => {
  test.each([
    ['areaLoad', '144 psf', 1],
    ['areaLoad', '144 lb/ft²', 1],
    ['areaLoad', '0.144 ksf', 1],
    ['areaLoad', '1 psi', 1],
    ['areaLoad', '6.894757 kPa', 1],
    ['areaLoad', '0.04788026 kPa', 1 / 144],
    ['areaLoad', '6.894757 kN/m2', 1],
    ['areaLoad', '6894.757 Pa', 1],
    ['lineLoad', '12 plf', 1],
    ['lineLoad', '12 lb/ft', 1],
    ['lineLoad', '12 lbs/ft', 1],
    ['lineLoad', '1 klf', 1000 / 12],
    ['lineLoad', '1 lb/in', 1],
    ['lineLoad', '0.01459390 kN/m', 1 / 12],
    ['lineLoad', '14.59390 N/m', 1 / 12],
    ['lineLoad', '0.01459390 N/mm', 1 / 12],
    ['pointLoad', '1200 lb', 1200],
    ['pointLoad', '1.2 kip', 1200],
    ['pointLoad', '1.2kips', 1200],
    ['pointLoad', '4.448222 kN', 1000],
    ['pointLoad', '4.448222 N', 1],
    ['stress', '900 psi', 900],
    ['stress', '1.6 ksi', 1600],
    ['stress', '6.894757 MPa', 1000],
    ['stress', '6.894757 N/mm²', 1000],
    ['stress', '6.894757 GPa', 1e6],
    ['area', '1 ft2', 144],
    ['area', '1 sq ft', 144],
    ['area', '144 in2', 144],
    ['area', '0.09290304 m2', 144],
    ['number', '360', 360],
    ['number', '-1.5', -1.5],
  ] as const)('as %s, %s is %d in base units', (kind, text, base) => {
    expect(value(kind, text) / base).toBeCloseTo(1, 6);
  });

  test.each([
    ['areaLoad', '40 plf', 'a line load'],
    ['areaLoad', '40', 'no unit'],
    ['lineLoad', '40 psf', 'an area load'],
    ['pointLoad', '5 kN/m', 'a line load'],
    ['stress', '11 mm', 'a length'],
    ['area', '600 ft', 'a length'],
    ['number', '360 psf', 'no unit'],
    ['number', 'l/360', 'plain number'],
    ['number', '1e3', 'follows it'],
  ] as const)('as %s, %s is refused with the reason', (kind, text, reason) => {
    expect(fault(kind, text)).toMatch(
      new RegExp(reason === 'follows it' ? 'plain decimal|follows it' : reason),
    );
  });

  test('a bare number takes the unit that is offered', () => {
    expect(value('areaLoad', '50', 'psf')).toBe(50 / 144);
    expect(value('areaLoad', '50psf', 'kPa')).toBe(50 / 144);
  });
});
