import { describe, expect, test } from 'vitest';
import {
  conditionRefusal,
  mayBeIncised,
  mayBeWet,
  mayLieFlat,
} from '../../../src/timber/checks/forbidden.ts';
import {
  deepestNotch,
  notchAllowed,
  notchCapacity,
  notchPlaceFault,
  notchRefusal,
} from '../../../src/timber/checks/notch.ts';
import { PRODUCTS, type Product } from '../../../src/timber/member.ts';
import { memberOf, simpleSpan, stockOf } from '../member-of.ts';

// NDS 2018 by the clause each sentence names, from memory.
const VALUES = { Fb: 2400, Fv: 200, Fcperp: 600, E: 1.8e6, Emin: 0.93e6, G: 0.5 };
const LVL = stockOf('LVL', '', 'typical 2.0E');
const GLULAM = stockOf('glulam', 'Western species', '24F-1.8E');
const typed = (stock: typeof LVL) => ({ ...stock, values: VALUES, valuesFrom: 'report 7' });
const flat = { width: 1.75, depth: 11.875, plies: 1, flat: true };

describe('what a product may be', () => {
  test('incised: dimension lumber and MSR', () => {
    expect(PRODUCTS.filter(mayBeIncised)).toEqual(['dimension lumber', 'machine stress rated']);
  });

  test('wet: all but LVL without its own values', () => {
    for (const product of PRODUCTS) expect(mayBeWet(stockOf(product, '', ''))).toBe(product !== 'LVL');
    expect(mayBeWet(typed(LVL))).toBe(true);
  });

  test('laid flat: all but glulam and LVL without their own values', () => {
    for (const product of PRODUCTS)
      expect(mayLieFlat(stockOf(product, '', ''))).toBe(product !== 'LVL' && product !== 'glulam');
    expect(mayLieFlat(typed(LVL))).toBe(true);
    expect(mayLieFlat(typed(GLULAM))).toBe(true);
  });

  test.each([
    [{ incised: true }, null],
    [
      { incised: true, stock: GLULAM },
      'incised: glulam has no incising factor, only dimension lumber may be incised: NDS 5.3, Table 5.3.1',
    ],
    [
      { incised: true, stock: LVL },
      'incised: LVL has no incising factor, only dimension lumber may be incised: NDS Table 8.3.1',
    ],
    [
      { incised: true, stock: stockOf('timber', 'Hem-Fir', 'No.1') },
      'incised: timber has no incising factor, only dimension lumber may be incised: NDS 4.3.8',
    ],
    [{ service: 'wet' as const }, null],
    [
      { service: 'wet' as const, stock: LVL },
      'wet: LVL is for dry use (under 16 % moisture) unless the maker’s report says otherwise: NDS 8.1.4; type its values then',
    ],
    [{ service: 'wet' as const, stock: typed(LVL) }, null],
    [
      { section: flat, stock: LVL },
      'flat: LVL laid flat needs its values about the weak axis typed (the maker’s report, NDS 8.2)',
    ],
    [
      { section: flat, stock: GLULAM },
      'flat: glulam laid flat needs its values about the weak axis typed (Fby, NDS 5.2, Table 5A)',
    ],
    [{ section: flat, stock: typed(GLULAM) }, null],
    [{ section: { ...flat, flat: false }, stock: GLULAM }, null],
  ])('its conditions are refused with the clause (%#)', (parts, refusal) => {
    expect(conditionRefusal(memberOf(parts))).toBe(refusal);
  });
});

describe('a notch', () => {
  test('is at most d/4 of sawn wood, d/10 of glued, and 3 in of glulam deep', () => {
    const deepest: [Product, number, number][] = [
      ['dimension lumber', 10, 2.5],
      ['machine stress rated', 10, 2.5],
      ['timber', 10, 2.5],
      ['glulam', 10, 1],
      ['glulam', 40, 3],
      ['LVL', 40, 4],
      ['custom', 40, 0],
    ];
    for (const [product, d, notch] of deepest) {
      expect(deepestNotch(product, d)).toBeCloseTo(notch, 12);
      expect(notchAllowed(product, d, notch)).toBe(true);
      expect(notchAllowed(product, d, notch + 1e-6)).toBe(false);
    }
  });

  test.each([
    ['dimension lumber', 3, 'notch 3 in is deeper than d/4 = 2.813 in: NDS 4.4.3'],
    ['glulam', 1.2, 'notch 1.2 in is deeper than d/10 and 3 in, 1.125 in: NDS 5.4.5'],
    ['LVL', 1.2, 'notch 1.2 in is deeper than d/10 = 1.125 in: NDS 8.4.1'],
    [
      'custom',
      0.5,
      'notches of a custom product are not covered: no clause of NDS 4.4.3, 5.4.5, 8.4.1 applies',
    ],
  ] as const)('in %s, %d in deep, is refused with the clause', (product, notch, refusal) => {
    for (const side of ['left', 'right'] as const) {
      const member = memberOf({
        stock: stockOf(product, '', ''),
        notch: { left: 0, right: 0, [side]: notch },
      });
      expect(notchRefusal(member, 11.25)).toBe(refusal);
    }
    expect(notchRefusal(memberOf({ stock: stockOf(product, '', '') }), 11.25)).toBeNull();
  });

  test('stands at a simple end bearing alone', () => {
    const beam = simpleSpan(120);
    const fault = (parts: object, notch = { left: 1, right: 0 }) =>
      notchPlaceFault(memberOf({ beam: { ...beam, ...parts }, notch }));
    const only =
      'notch.left: a notch on the tension face is allowed at a simple end bearing only, NDS 4.4.3, 5.4.5';
    expect(fault({})).toBeNull();
    expect(fault({ supports: 'cantilever' })).toBe(only);
    expect(fault({ fixed: { left: true, right: false } })).toBe(only);
    expect(fault({ fixed: { left: false, right: true } })).toBeNull();
    expect(fault({ fixed: { left: false, right: true } }, { left: 0, right: 1 })).toBe(
      only.replace('left', 'right'),
    );
    expect(fault({ overhangs: { left: 12, right: 0 } })).toBe(
      'notch.left: with an overhang this end has no bearing, and notches are allowed there only, NDS 4.4.3, 5.4.5',
    );
    expect(fault({ overhangs: { left: 0, right: 12 } })).toBeNull();
    expect(
      notchRefusal(
        memberOf({ beam: { ...beam, supports: 'cantilever' }, notch: { left: 1, right: 0 } }),
        11.25,
      ),
    ).toBe(only);
  });

  // Vr' = (2/3) Fv' b dn (dn/d)²: NDS 3.4.3.2.
  test('carries the shear of the clause', () => {
    expect(notchCapacity(180, 1.5, 10, 2)).toBeCloseTo((2 / 3) * 180 * 1.5 * 8 * 0.64, 9);
    expect(notchCapacity(180, 1.5, 10, 0)).toBeCloseTo((2 / 3) * 180 * 1.5 * 10, 9);
  });
});
