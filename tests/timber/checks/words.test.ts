import { describe, expect, test } from 'vitest';
import { reportMember } from '../../../src/timber/index.ts';
import { FACTOR_SYMBOLS, type Member } from '../../../src/timber/member.ts';
import { memberOf, NO_AREA, psf, simpleSpan, stockOf } from '../member-of.ts';

const LVL = stockOf('LVL', '', 'typical 2.0E');
const GLULAM = stockOf('glulam', 'Western species', '24F-1.8E');
const one = (width: number, depth: number, flat = false) => ({ width, depth, plies: 1, flat });

/** "bending psi, D+L, NDS 3.3: CD CL CF". */
function words(parts: Partial<Member>): string[] {
  return reportMember(memberOf(parts)).checks.map(
    ({ id, unit, combination, clause, factors }) =>
      `${id} ${unit}, ${combination}, ${clause}: ${factors.map(({ symbol }) => symbol).join(' ')}`,
  );
}

function factorsOf(parts: Partial<Member>, check: string) {
  return reportMember(memberOf(parts)).checks.find(({ id }) => id === check)!.factors;
}

function reasonOf(parts: Partial<Member>, check: string, symbol: string): string {
  return factorsOf(parts, check).find((factor) => factor.symbol === symbol)!.reason;
}

// The clauses of NDS 2018, ASCE 7-16 and IBC 2018, from memory.
describe('each check says its unit, its combination, its clause and the factors behind its capacity', () => {
  test('of lumber under all conditions at once', () => {
    const all: Partial<Member> = {
      beam: { ...simpleSpan(0), spans: [120, 150], overhangs: { left: 0, right: 40 } },
      area: { ...NO_AREA, dead: psf(12), live: psf(40), windUp: psf(60) },
      notch: { left: 1, right: 0 },
      service: 'wet',
      temperature: '100-125 F',
      incised: true,
      repetitive: true,
      bracing: 'ends',
    };
    expect(words(all)).toEqual([
      'shear psi, D+L, NDS 3.4.2: CD CM Ct Ci',
      'bending psi, D+L, NDS 3.3: CD CM Ct Ci CL CF Cr',
      'bending-hogging psi, D+L, NDS 3.3: CD CM Ct Ci CL CF Cr',
      'deflection-live in, D+L, IBC Table 1604.3: CM Ct Ci',
      'deflection-total in, D+L, IBC Table 1604.3 note: CM Ct Ci',
      'bearing psi, D+L, NDS 3.10.2: CM Ct Ci Cb',
      'slenderness , , NDS 3.3.3.7: ',
      'uplift lb, 0.6D+0.6Wup, ASCE 7 2.4.1: ',
      'notch lb, D+L, NDS 3.4.3.2, 4.4.3: CD CM Ct Ci',
    ]);
    expect(reportMember(memberOf(all)).checks.map(({ pattern }) => pattern)).toEqual([
      'live on spans 1, 2',
      'live on span 2',
      'live on spans 1, 2',
      'live on span 2',
      'live on span 2',
      'live on spans 1, 2',
      '',
      'all spans',
      'live on span 1 and right overhang',
    ]);
  });

  test('of a plain member, with shear at d and creep by Kcr', () => {
    expect(words({})).toEqual([
      'shear psi, D+L, NDS 3.4.2: CD',
      'bending psi, D+L, NDS 3.3: CD CL CF',
      'deflection-live in, D+L, IBC Table 1604.3: ',
      'deflection-total in, D+L, IBC Table 1604.3 note: ',
      'bearing psi, D+L, NDS 3.10.2: Cb',
    ]);
    const other = words({ shearAt: 'd', creep: 'Kcr' });
    expect(other[0]).toBe('shear psi, D+L, NDS 3.4.2, 3.4.3.1: CD');
    expect(other[3]).toBe('deflection-total in, D+L, NDS 3.5.2, IBC Table 1604.3: ');
  });

  test('of lumber and timbers laid flat', () => {
    const plies = { section: { ...one(1.5, 9.25, true), plies: 3 } };
    expect(words(plies)[1]).toBe('bending psi, D+L, NDS 3.3: CD CL CF Cfu Cr');
    expect(words(plies)[2]).toBe('deflection-live in, D+L, IBC Table 1604.3: ');
    const timber = (grade: string): Partial<Member> => ({
      stock: stockOf('timber', 'Douglas Fir-Larch', grade),
      section: one(5.5, 15.5, true),
    });
    expect(words(timber('No.1')).slice(1, 3)).toEqual([
      'bending psi, D+L, NDS 3.3: CD CL CF Cfu',
      'deflection-live in, D+L, IBC Table 1604.3: Cfu',
    ]);
    expect(factorsOf(timber('No.1'), 'deflection-live')).toEqual([
      { symbol: 'Cfu', value: 0.9, reason: 'beams & stringers loaded on the wide face, Table 4D' },
    ]);
    // Of Select Structural it is 1 on E.
    expect(factorsOf(timber('Select Structural'), 'deflection-live')).toEqual([]);
  });

  test('of glulam: CV in place of CF, the greater of CL and CV told of as not applied', () => {
    const glulam: Partial<Member> = {
      stock: GLULAM,
      section: one(5.125, 24),
      beam: simpleSpan(480),
      bracing: 96,
      notch: { left: 1, right: 0 },
      service: 'wet',
    };
    expect(words(glulam)).toEqual([
      'shear psi, D+L, NDS 3.4.2: CD CM',
      'bending psi, D+L, NDS 3.3: CD CM CL CV',
      'deflection-live in, D+L, IBC Table 1604.3: CM',
      'deflection-total in, D+L, IBC Table 1604.3 note: CM',
      'bearing psi, D+L, NDS 3.10.2: CM Cb',
      'slenderness , , NDS 3.3.3.7: ',
      'notch lb, D+L, NDS 3.4.3.2, 5.4.5: CD CM notched',
    ]);
    expect(factorsOf(glulam, 'notch')[2]).toEqual({
      symbol: 'notched',
      value: 0.72,
      reason: 'Fvx of a notched member, Table 5A note',
    });
    const other = '; not applied, the other of CL and CV is the lesser, NDS 5.3.6';
    expect(reasonOf(glulam, 'bending', 'CL').endsWith(other)).toBe(true);
    expect(reasonOf(glulam, 'bending', 'CV').endsWith('NDS 5.3.6')).toBe(true);
    expect(reasonOf(glulam, 'bending', 'CV')).not.toContain('not applied');
    // Without bracing CL is the lesser.
    const free = { ...glulam, bracing: 'ends' as const, section: one(3.125, 24) };
    expect(reasonOf(free, 'bending', 'CL')).not.toContain('not applied');
    expect(reasonOf(free, 'bending', 'CV').endsWith(other)).toBe(true);
    // At the base size neither takes anything.
    const small = {
      ...glulam,
      notch: { left: 0, right: 0 },
      beam: simpleSpan(120),
      section: one(5.125, 9),
      bracing: 'continuous' as const,
    };
    expect(reasonOf(small, 'bending', 'CL')).toBe('top edge held throughout, NDS 3.3.3');
    expect(reasonOf(small, 'bending', 'CV')).not.toContain('not applied');
  });

  test('of LVL', () => {
    expect(
      words({ stock: LVL, section: { ...one(1.75, 16), plies: 3 }, notch: { left: 1, right: 0 } }),
    ).toEqual([
      'shear psi, D+L, NDS 3.4.2: CD',
      'bending psi, D+L, NDS 3.3: CD CL CV Cr',
      'deflection-live in, D+L, IBC Table 1604.3: ',
      'deflection-total in, D+L, IBC Table 1604.3 note: ',
      'bearing psi, D+L, NDS 3.10.2: Cb',
      'notch lb, D+L, NDS 3.4.3.2, 8.4.1: CD',
    ]);
  });

  test('of typed factors: every one is listed where it acts, with its own reason', () => {
    const typedFactors = Object.fromEntries(
      FACTOR_SYMBOLS.map((symbol) => [symbol, { value: 0.9, reason: `test ${symbol}` }]),
    );
    expect(words({ typedFactors })).toEqual([
      'shear psi, D+L, NDS 3.4.2: CD CM Ct Ci',
      'bending psi, D+L, NDS 3.3: CD CM Ct Ci CL CV CF Cfu Cr',
      'deflection-live in, D+L, IBC Table 1604.3: CM Ct Ci',
      'deflection-total in, D+L, IBC Table 1604.3 note: CM Ct Ci',
      'bearing psi, D+L, NDS 3.10.2: CM Ct Ci Cb',
    ]);
    for (const { symbol, value, reason } of factorsOf({ typedFactors }, 'bending')) {
      expect({ value, reason }).toEqual({ value: 0.9, reason: `typed: test ${symbol}` });
    }
    // One alone stands beside what the standard says of the others.
    for (const symbol of ['CM', 'Ct', 'Ci', 'Cfu', 'Cr', 'CV'] as const) {
      const alone = { typedFactors: { [symbol]: { value: 0.9, reason: 'why' } } };
      const listed = factorsOf(alone, 'bending').map((factor) => factor.symbol);
      expect(listed.toSorted()).toEqual(['CD', 'CF', 'CL', symbol].toSorted());
    }
  });

  test('of edges that are held, and of sections that are not deeper than wide', () => {
    const two = { beam: { ...simpleSpan(0), spans: [144, 144] } };
    expect(reasonOf(two, 'bending', 'CL')).toBe('top edge held throughout, NDS 3.3.3');
    expect(reasonOf({ ...two, bracingBottom: 'continuous' }, 'bending-hogging', 'CL')).toBe(
      'bottom edge held throughout, NDS 3.3.3',
    );
    expect(reasonOf(two, 'bending-hogging', 'CL')).toMatch(/^lu 144 in, lu\/d 12\.8, /);
    expect(reasonOf({ bracing: 'ends', section: { ...one(1.5, 4.5), plies: 3 } }, 'bending', 'CL')).toBe(
      'not deeper than wide, NDS 3.3.3.1',
    );
  });

  test('of a notch: the shear of its own end, with the depth that is left', () => {
    const check = (left: number, right: number) =>
      reportMember(memberOf({ notch: { left, right } })).checks.find(({ id }) => id === 'notch')!;
    expect(check(1, 0)).toMatchObject({ place: 0, at: 0 });
    expect(check(0, 1)).toMatchObject({ place: 1, at: 168 });
    // Fv' b: 180 psi x 3 in; dn 10.25 of 11.25 in.
    expect(check(1, 0).capacity).toBeCloseTo((2 / 3) * 180 * 3 * 10.25 * (10.25 / 11.25) ** 2, 9);
  });
});
